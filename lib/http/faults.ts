import type { z } from 'zod'
import { fail, type Fault } from '@/lib/errors'

/** More are not listed: a wrong unit in 10 000 rows is one fault to its sender. */
export const MOST_FAULTS = 50

const escape = (part: PropertyKey) => String(part).replaceAll('~', '~0').replaceAll('/', '~1')

/** JSON Pointer (RFC 6901) to the place that `path` leads to. prefix: '' for a JSON body, '/query' or '/form'. */
export const pointerOf = (prefix: string, path: readonly PropertyKey[]): string => prefix + path.map((part) => `/${escape(part)}`).join('')

function kindOf(value: unknown): string {
  if (value === null) return 'null'
  if (Array.isArray(value)) return 'a list'
  if (typeof value === 'number') return Number.isFinite(value) ? 'a number' : 'a number beyond binary64'
  return { string: 'text', boolean: 'true or false', object: 'an object', undefined: 'nothing' }[typeof value as string] ?? typeof value
}

const WANTED: Record<string, string> = { number: 'a number', string: 'text', boolean: 'true or false', array: 'a list', object: 'an object', int: 'a whole number' }

const COUNTED: Record<string, string> = { array: 'entries', string: 'characters' }

/** A bound that is not kept; our own words where the schema gives none. */
function describeBound(issue: z.core.$ZodIssueTooBig | z.core.$ZodIssueTooSmall): string {
  if (!/^Too (big|small)/.test(issue.message)) return issue.message
  const [bound, word] = issue.code === 'too_big' ? [issue.maximum, 'at most'] : [issue.minimum, 'at least']
  const counted = COUNTED[issue.origin]
  const amount = issue.exact ? `exactly ${bound}` : `${word} ${bound}`
  return counted === undefined ? `must be ${amount}` : `must have ${amount} ${counted}`
}

const oneOf = (values: readonly unknown[]) => (values.length === 1 ? '' : 'one of ') + values.map((value) => JSON.stringify(value)).join(', ')

/** What one issue of zod says, in our words. input: the value at the issue's path. */
function describe(issue: z.core.$ZodIssue, input: unknown): string {
  switch (issue.code) {
    case 'invalid_type':
      // Our own words, where the schema has some.
      if (!issue.message.startsWith('Invalid input')) return issue.message
      return input === undefined ? 'is missing' : `must be ${WANTED[issue.expected] ?? issue.expected}, not ${kindOf(input)}`
    case 'invalid_value':
      return `must be ${oneOf(issue.values)}`
    case 'invalid_union':
      if (input === undefined) return 'is missing'
      return 'options' in issue && issue.options !== undefined ? `must be ${oneOf(issue.options)}` : 'is not one of the values that the reference lists here'
    case 'too_big':
    case 'too_small':
      return describeBound(issue)
    case 'invalid_format':
      return issue.format === 'datetime' ? 'must be a time in UTC such as 2026-12-01T14:05:00Z' : issue.message
    default:
      return issue.message
  }
}

function valueAt(value: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>((inner, part) => (typeof inner === 'object' && inner !== null ? (inner as Record<PropertyKey, unknown>)[part] : undefined), value)
}

function faultsOf(issues: readonly z.core.$ZodIssue[], value: unknown, prefix: string): Fault[] {
  return issues.flatMap((issue): Fault[] => {
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.slice(0, MOST_FAULTS).map((key) => ({ pointer: pointerOf(prefix, [...issue.path, key]), detail: `"${key.slice(0, 80)}" is not a field of this request` }))
    }
    return [{ pointer: pointerOf(prefix, issue.path), detail: describe(issue, valueAt(value, issue.path)) }]
  })
}

/** Beyond this many values only the first fault is looked for: zod keeps an object for each, and a body has room for millions. */
const MOST_VALUES_TO_SEARCH = 10_000

/** Whether a parsed JSON value holds more than `most` values, itself included. */
function holdsMoreThan(most: number, value: unknown): boolean {
  const waiting = [value]
  for (let seen = 0; waiting.length > 0; seen++) {
    if (seen + waiting.length > most) return true
    const next = waiting.pop()
    if (typeof next === 'object' && next !== null) for (const inner of Object.values(next)) waiting.push(inner)
  }
  return false
}

interface Checked<T> {
  /** Undefined where there are faults. */
  readonly data: T | undefined
  readonly faults: Fault[]
}

/** What a schema makes of a value, and every fault it finds, of a very large value the first. prefix: pointer to the value. */
export function faultsIn<S extends z.ZodType>(schema: S, value: unknown, prefix: string): Checked<z.infer<S>> {
  // abortEarly is what zod's own validate() sets; here the issue that ended the parse is wanted as well.
  const quick = schema.safeParse(value, { abortEarly: true } as object)
  if (quick.success) return { data: quick.data, faults: [] }
  const parsed = holdsMoreThan(MOST_VALUES_TO_SEARCH, value) ? quick : schema.safeParse(value)
  return parsed.success ? { data: parsed.data, faults: [] } : { data: undefined, faults: faultsOf(parsed.error.issues, value, prefix) }
}

/** Fails with invalid-request and the first fifty of these faults, of which there is at least one. */
export function failWith(faults: readonly Fault[]): never {
  const errors = faults.slice(0, MOST_FAULTS)
  const [first] = errors
  fail('invalid-request', errors.length === 1 ? `${first!.pointer || 'The body'}: ${first!.detail}.` : `${errors.length} places are wrong; see "errors".`, { errors })
}

/** Parses one part of a request. prefix: '' for a JSON body, '/query' or '/form'. Fails with invalid-request and every fault,
 *  of a very large part with the first. */
export function parsePart<S extends z.ZodType>(schema: S, value: unknown, prefix: string): z.infer<S> {
  const { data, faults } = faultsIn(schema, value, prefix)
  return faults.length === 0 ? (data as z.infer<S>) : failWith(faults)
}
