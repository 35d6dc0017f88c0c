import type { Fault } from '@/lib/errors'
import type { Units } from '@/lib/units'
import type { Kind } from '../si'
import { isNumberText } from './read-number'
import type { TextRecord } from './read-table'

/** A column that a table must have. kind: what its numbers measure; null is a plain number. */
export interface Column {
  readonly name: string
  readonly kind: Kind | null
}

/** For each wanted column its place in a record. */
export type ColumnPlaces = readonly number[]

const fault = (row: number, place: number, detail: string): Fault => ({ pointer: '/table', detail: `row ${row}, column ${place + 1}: ${detail}` })

/** A record in which something is no number, and which has a letter, names the columns. */
export const isHead = ({ cells }: TextRecord): boolean => cells.some((cell) => !isNumberText(cell) && /\p{L}/u.test(cell))

const WITH_UNIT = /^(.*?)\s*[[(]\s*(mm|m|deg|°|rad)\s*[\])]$/i
const UNIT_WORDS: Readonly<Record<string, string>> = { '°': 'deg' }

/** A name of the head line and the unit that stands behind it in brackets. */
function readHeading(cell: string, wanted: ReadonlySet<string>): { name: string; unit?: string } {
  if (wanted.has(cell)) return { name: cell }
  const match = WITH_UNIT.exec(cell)
  if (match === null) return { name: cell }
  const unit = match[2]!.toLowerCase()
  return { name: match[1]!, unit: UNIT_WORDS[unit] ?? unit }
}

/** Where each wanted column stands, by the head line: in any order, letters large or small, a unit in brackets behind the name, which
 *  must then be the one stated. Where two wanted columns have the same name the order is the one asked for. Answers faults instead
 *  when a column is missing, unknown, given twice, or of another unit. */
export function mapColumns({ row, cells }: TextRecord, wanted: readonly Column[], units: Units): ColumnPlaces | Fault[] {
  const plain = (name: string) => name.toLowerCase()
  const names = new Set(wanted.map(({ name }) => name))
  const headings = cells.map((cell) => readHeading(cell, names))
  const byName = (name: string, place: number) => headings[place]!.name === name || plain(headings[place]!.name) === plain(name)
  const isTwofold = new Set(wanted.map(({ name }) => plain(name))).size < wanted.length
  const faults: Fault[] = []

  const places = wanted.map(({ name }, i) => {
    if (isTwofold) return i < headings.length && byName(name, i) ? i : -1
    const found = headings.flatMap((_heading, place) => (byName(name, place) ? [place] : []))
    if (found.length > 1) faults.push(fault(row, found[1]!, `"${cells[found[1]!]}" is there twice`))
    return found[0] ?? -1
  })
  wanted.forEach(({ name, kind }, i) => {
    const place = places[i]!
    if (place === -1) {
      faults.push({ pointer: '/table', detail: `row ${row}: the column "${name}" is missing${isTwofold ? `: it has to be column ${i + 1}` : ''}` })
      return
    }
    const stated = kind === null ? undefined : units[kind]
    const { unit } = headings[place]!
    if (unit !== undefined && unit !== stated) faults.push(fault(row, place, `"${cells[place]}" says ${unit}, and ${stated ?? 'no unit'} is stated`))
  })
  headings.forEach((_heading, place) => {
    const known = places.includes(place) || wanted.some(({ name }) => byName(name, place))
    if (!known) faults.push(fault(row, place, `"${cells[place]}" is no column of this table`))
  })
  return faults.length > 0 ? faults : places
}
