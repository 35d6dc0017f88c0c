import type { Series } from '@/lib/access/use-case'
import { columnsOf, countOf, type RecordColumn } from '@/lib/contract/record-columns'
import { layoutField, widthOfRecord } from './record-fields'
import type { ResultWriter } from './result-writer'

const BYTES = Float64Array.BYTES_PER_ELEMENT
const CHUNK_BYTES = 64 * 1024

/** What stands at a path; at * the rest of it in each entry of a list. */
function valueAt(value: unknown, [part, ...rest]: readonly string[]): unknown {
  if (part === undefined || value === undefined || value === null) return value
  return part === '*' ? (value as readonly unknown[]).map((entry) => valueAt(entry, rest)) : valueAt((value as Record<string, unknown>)[part], rest)
}

/** A number as JSON would carry it: null and nothing are NaN, and the sign of zero is lost there as well. */
const toNumber = (value: unknown): number => (typeof value === 'number' ? value + 0 : typeof value === 'boolean' ? Number(value) : Number.NaN)

type Put = (value: number) => void

/** Writes a number, a list or a matrix into a place of the given size; what is not there is NaN. */
function putNumbers(value: unknown, [first, ...rest]: readonly number[], put: Put): void {
  if (first === undefined) return put(toNumber(value))
  const list = Array.isArray(value) ? (value as unknown[]) : []
  for (let i = 0; i < first; i++) putNumbers(list[i], rest, put)
}

interface Violation {
  readonly joint: string
  readonly value: number
  readonly lower: number | null
}

/** One way of writing a column for each kind (see RecordColumn). */
const WAYS: Readonly<Record<RecordColumn['kind'], (value: unknown, column: RecordColumn, joints: readonly string[], put: Put) => void>> = {
  numbers: (value, { size }, _joints, put) => putNumbers(value, size, put),
  code: (value, { words = [] }, _joints, put) => put(words.indexOf(value as string) + 1),
  bits: (value, { words = [] }, _joints, put) => {
    const codes = new Set((value as readonly { code: string }[]).map(({ code }) => code))
    put(words.reduce((sum, word, place) => sum + (codes.has(word) ? 2 ** place : 0), 0))
  },
  flags: (value, _column, joints, put) => joints.forEach((joint) => put(Number((value as readonly string[]).includes(joint)))),
  sides: (value, _column, joints, put) => {
    const violations = value as readonly Violation[]
    for (const joint of joints) {
      const violation = violations.find((one) => one.joint === joint)
      put(violation === undefined ? 0 : violation.lower !== null && violation.value < violation.lower ? -1 : 1)
    }
  },
}

/** Writes results as records of little-endian binary64 numbers that all have the same columns. joints: their names in chain order. */
export function binaryWriter(series: Series<unknown>, joints: readonly string[]): ResultWriter {
  const columns = columnsOf(series.fields, series.sizes).map((column) => ({ column, path: column.path.split('.'), count: countOf(column) }))
  const layout = columns.map(({ column }) => column)
  const bytes = new Uint8Array(series.count * widthOfRecord(layout) * BYTES)
  const view = new DataView(bytes.buffer)
  let at = 0
  const put = (value: number) => {
    view.setFloat64(at, value, true)
    at += BYTES
  }
  return {
    take(result) {
      for (const { column, path } of columns) WAYS[column.kind](valueAt(result, path), column, joints, put)
    },
    *finish() {
      return {
        headers: { 'record-layout': layoutField(layout) },
        chunks: Array.from({ length: Math.ceil(bytes.length / CHUNK_BYTES) }, (_, i) => bytes.subarray(i * CHUNK_BYTES, (i + 1) * CHUNK_BYTES)),
      }
    },
  }
}
