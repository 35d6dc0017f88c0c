import { z } from 'zod'
import { bare } from './bare-schema'
import { failWith, faultsIn, MOST_FAULTS } from './faults'

/** A list in a body whose entries are lists or objects: there may be thousands. */
interface LongList {
  readonly path: readonly string[]
  readonly entry: z.ZodType
}

/** A schema of a body, prepared for being applied bit by bit. */
interface Prepared {
  readonly lists: readonly LongList[]
  /** The same schema, that takes anything for an entry of those lists. */
  readonly outline: z.ZodType
}

const isMany = (element: z.ZodType) => !(element instanceof z.ZodString || element instanceof z.ZodNumber || element instanceof z.ZodEnum || element instanceof z.ZodNullable)

/** The schema with another part inside, its checks and its name for what is optional kept. */
const rebuilt = <T extends z.ZodType>(schema: T, change: object): T => z.core.clone(schema, { ...schema._zod.def, ...change })

function outlineOf(schema: z.ZodType, path: readonly string[], lists: LongList[]): z.ZodType {
  if (schema instanceof z.ZodOptional) return rebuilt(schema, { innerType: outlineOf(schema.unwrap() as z.ZodType, path, lists) })
  const { object, element } = bare(schema)
  if (object !== null && object === schema) {
    const shape = Object.entries(object.shape as Record<string, z.ZodType>).map(([name, field]) => [name, outlineOf(field, [...path, name], lists)] as const)
    return rebuilt(object, { shape: Object.fromEntries(shape) })
  }
  if (element === null || !isMany(element)) return schema
  lists.push({ path, entry: element })
  return rebuilt(schema as z.ZodArray, { element: z.unknown() })
}

const prepared = new WeakMap<z.ZodType, Prepared>()

function prepare(schema: z.ZodType): Prepared {
  const known = prepared.get(schema)
  if (known !== undefined) return known
  const lists: LongList[] = []
  const outline = outlineOf(schema, [], lists)
  const made = { outline, lists }
  prepared.set(schema, made)
  return made
}

const at = (value: unknown, path: readonly string[]): unknown =>
  path.reduce<unknown>((inner, name) => (typeof inner === 'object' && inner !== null && Object.hasOwn(inner, name) ? (inner as Record<string, unknown>)[name] : undefined), value)

/** The body with nothing but their lengths left of its long lists: holes take no time to look through. */
function outlineOfBody(body: unknown, path: readonly string[]): unknown {
  const [name, ...rest] = path
  if (name === undefined) return Array.isArray(body) ? new Array<unknown>(body.length) : body
  if (at(body, [name]) === undefined) return body
  // Not by assignment, which would take a name like __proto__ for something else.
  return Object.fromEntries(Object.entries(body as object).map(([key, value]) => [key, key === name ? outlineOfBody(value, rest) : (value as unknown)]))
}

/** Parses a JSON body as parsePart does, entry by entry of its long lists, with a pause after each. Fails with invalid-request and every
 *  fault, up to fifty. */
export function* parseBodyInSteps(schema: z.ZodObject, body: unknown): Generator<void, unknown> {
  const { outline, lists } = prepare(schema)
  const { data, faults } = faultsIn(outline, lists.reduce((rest, { path }) => outlineOfBody(rest, path), body), '')
  yield
  const entries = new Map<LongList, unknown[]>()
  for (const list of lists) {
    const given = at(body, list.path)
    if (!Array.isArray(given) || faults.some(({ pointer }) => pointer === `/${list.path.join('/')}`)) continue
    const taken: unknown[] = []
    for (let i = 0; i < given.length && faults.length < MOST_FAULTS; i++) {
      const entry = faultsIn(list.entry, given[i], `/${list.path.join('/')}/${i}`)
      faults.push(...entry.faults)
      taken.push(entry.data)
      yield
    }
    entries.set(list, taken)
  }
  if (faults.length > 0) failWith(faults)
  for (const [{ path }, taken] of entries) {
    const holder = at(data, path.slice(0, -1)) as Record<string, unknown>
    holder[path.at(-1)!] = taken
  }
  return data
}
