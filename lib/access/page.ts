import { fail } from '@/lib/errors'

const DEFAULT_LIMIT = 50

const MOST_INT = 2 ** 31 - 1
const MOST_MILLISECONDS = 8.64e15

/** What a position may consist of; what does not fit would be refused by the database instead. */
const KINDS = {
  text: (value: unknown): value is string => typeof value === 'string' && !value.includes('\0'),
  int: (value: unknown): value is number => Number.isInteger(value) && (value as number) >= 0 && (value as number) <= MOST_INT,
  /** Milliseconds since 1970. */
  instant: (value: unknown): value is number => Number.isInteger(value) && Math.abs(value as number) <= MOST_MILLISECONDS,
}
interface Kinds {
  text: string
  int: number
  instant: number
}
type Values<K extends readonly (keyof Kinds)[]> = { [I in keyof K]: Kinds[K[I]] }

/** The position in an opaque cursor, checked to be of these kinds; undefined on the first page. Fails with invalid-request. */
export function parseCursor<const K extends readonly (keyof Kinds)[]>(cursor: string | undefined, kinds: K): Values<K> | undefined {
  if (cursor === undefined) return undefined
  const refuse = (): never =>
    fail('invalid-request', undefined, { errors: [{ pointer: '/query/cursor', detail: 'is not a cursor of this list: use nextCursor as it was answered' }] })
  let values: unknown
  try {
    values = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'))
  } catch {
    return refuse()
  }
  const list: unknown[] = Array.isArray(values) ? values : []
  const fits = list.length === kinds.length && kinds.every((kind, place) => KINDS[kind](list[place]))
  return fits ? (values as Values<K>) : refuse()
}

export interface Page<T> {
  readonly items: readonly T[]
  readonly hasMore: boolean
}

/** Reads one row more than a page holds, to know whether another page follows. */
export async function pageOf<T>(limit: number | undefined, read: (limit: number) => Promise<readonly T[]>): Promise<Page<T>> {
  const size = limit ?? DEFAULT_LIMIT
  const rows = await read(size + 1)
  return { items: rows.slice(0, size), hasMore: rows.length > size }
}

/** nextCursor of a page from the position of its last row; nothing on the last page. */
export function cursorOf<T>(page: Page<T>, positionOf: (row: T) => readonly (string | number)[]): { nextCursor?: string } {
  const last = page.items.at(-1)
  if (!page.hasMore || last === undefined) return {}
  return { nextCursor: Buffer.from(JSON.stringify(positionOf(last))).toString('base64url') }
}
