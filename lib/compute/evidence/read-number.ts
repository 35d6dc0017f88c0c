import type { Fault } from '@/lib/errors'
import type { TextRecord } from './read-table'

export type DecimalMark = '.' | ','

/** A plain number as spreadsheets and controllers write it. The minus may be the true one. */
const NUMBER = /^[+\-−]?(?:\d+(?:([.,])\d*)?|([.,])\d+)(?:e[+-]?\d+)?$/i

/** Whether a cell reads as a number, whatever its decimal mark. */
export const isNumberText = (cell: string): boolean => NUMBER.test(cell)

const markOf = (cell: string): DecimalMark | undefined => {
  const match = NUMBER.exec(cell)
  return (match?.[1] ?? match?.[2]) as DecimalMark | undefined
}

/** The value of a number cell. */
export const numberOf = (cell: string): number => Number(cell.replace(',', '.').replace('−', '-'))

/** The decimal mark that the cells use. With both in one table nobody knows what 1,234 is: then it is a fault with both places. */
export function decimalMarkOf(records: readonly TextRecord[]): DecimalMark | Fault {
  const first: Partial<Record<DecimalMark, string>> = {}
  for (const { row, cells } of records) {
    for (const [place, cell] of cells.entries()) {
      const mark = markOf(cell)
      if (mark !== undefined) first[mark] ??= `row ${row}, column ${place + 1} ("${cell}")`
    }
  }
  if (first['.'] !== undefined && first[','] !== undefined) {
    return {
      pointer: '/table',
      detail: `has decimal points, as in ${first['.']}, and decimal commas, as in ${first[',']}: use one, and no marks between thousands`,
    }
  }
  return first[','] === undefined ? '.' : ','
}
