import type { z } from 'zod'
import { bare } from './bare-schema'
import type { ResultWriter } from './result-writer'

/** Which entries and fields some result has at one place of it. */
interface Shape {
  /** In the order of the schema. */
  readonly fields: ReadonlyMap<string, Shape> | null
  readonly entry: z.ZodType | null
  readonly entries: Shape[]
  /** Some result has something here. */
  seen: boolean
}

/** The empty shape of a place that the schema describes. */
function shapeOf(schema: z.ZodType): Shape {
  const { object, element } = bare(schema)
  return {
    fields: object && new Map(Object.entries(object.shape as Record<string, z.ZodType>).map(([name, field]) => [name, shapeOf(field)])),
    entry: element,
    entries: [],
    seen: false,
  }
}

const fieldOf = (value: unknown, name: string | number): unknown => (typeof value === 'object' && value !== null ? (value as Record<string | number, unknown>)[name] : undefined)

function grow(shape: Shape, value: unknown): void {
  if (value === undefined) return
  shape.seen = true
  if (shape.fields !== null) for (const [name, inner] of shape.fields) grow(inner, fieldOf(value, name))
  if (shape.entry === null || !Array.isArray(value)) return
  while (shape.entries.length < value.length) shape.entries.push(shapeOf(shape.entry))
  for (let i = 0; i < value.length; i++) grow(shape.entries[i]!, value[i])
}

/** What a place has beneath it that has a column of its own. */
const within = ({ fields, entries }: Shape): [string | number, Shape][] =>
  fields === null ? entries.map((entry, i) => [i, entry]) : [...fields].filter(([, inner]) => inner.seen)

/** A place with nothing beneath it in any result has one column by its own name. */
function namesOf(shape: Shape, path: string): string[] {
  const inner = within(shape)
  return inner.length === 0 ? [path] : inner.flatMap(([name, below]) => namesOf(below, path === '' ? String(name) : `${path}.${name}`))
}

/** A text cell. A spreadsheet would compute one that begins like a formula; the apostrophe keeps it text. */
function textCell(text: string): string {
  const guarded = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text
  return /[",\r\n]/.test(guarded) ? `"${guarded.replaceAll('"', '""')}"` : guarded
}

const cellOf = (value: unknown): string =>
  typeof value === 'number' || typeof value === 'boolean' ? String(value) : typeof value === 'string' ? textCell(value) : ''

function putCells(shape: Shape, value: unknown, cells: string[]): void {
  const { fields, entries } = shape
  if (fields === null ? entries.length === 0 : !hasSeen(fields)) cells.push(cellOf(value))
  else if (fields === null) for (let i = 0; i < entries.length; i++) putCells(entries[i]!, fieldOf(value, i), cells)
  else for (const [name, inner] of fields) if (inner.seen) putCells(inner, fieldOf(value, name), cells)
}

function hasSeen(fields: ReadonlyMap<string, Shape>): boolean {
  for (const { seen } of fields.values()) if (seen) return true
  return false
}

/** Writes results as CSV (RFC 4180): a header, then one record each. Columns are named by the path in the JSON result and stand in the order
 *  of the schema, lists from their first entry on: all that some result has, and at least one for each of the `fields`. item: the
 *  schema of a result. */
export function csvWriter(fields: readonly string[], item: z.ZodObject): ResultWriter {
  const shape = shapeOf(item)
  for (const field of fields) shape.fields!.get(field)!.seen = true
  const kept: unknown[] = []
  return {
    take(result) {
      grow(shape, result)
      kept.push(result)
    },
    *finish() {
      const chunks = [`${namesOf(shape, '').join(',')}\r\n`]
      for (const result of kept) {
        const cells: string[] = []
        putCells(shape, result, cells)
        chunks.push(`${cells.join(',')}\r\n`)
        yield
      }
      return { headers: {}, chunks }
    },
  }
}
