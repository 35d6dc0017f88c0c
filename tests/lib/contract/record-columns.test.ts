import { describe, expect, it } from 'vitest'
import { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import { columnsOf, countOf, FIELD_COLUMNS, type RecordSizes } from '@/lib/contract/record-columns'
import { partsOf, widthOf } from '@/lib/contract/record-form'

const SIZES: RecordSizes = { joints: 7, linearComponents: 3, angularComponents: 2, links: 2, matrices: true }
const operations = Object.entries(KINEMATIC_OPERATIONS)

describe('the columns of binary records', () => {
  it.each(operations)('are known for every field of a result of %s, and begin with its name', (_name, { item }) => {
    for (const field of Object.keys(item.shape)) {
      const columns = FIELD_COLUMNS[field as keyof typeof FIELD_COLUMNS](SIZES)
      expect(columns.length, field).toBeGreaterThan(0)
      for (const { path, size } of columns) {
        expect(path.split('.')[0]).toBe(field)
        // A token of RFC 9651, and no more dimensions than the layout has words for.
        expect(path).toMatch(/^[A-Za-z][A-Za-z0-9.*]*$/)
        expect(size.length).toBeLessThanOrEqual(3)
      }
    }
  })

  it('leave out a list that can have no entry', () => {
    const sizes = { ...SIZES, linearComponents: 0 }
    expect(columnsOf(['translationalSingularValues', 'rotationalSingularValues'], sizes)).toEqual([{ path: 'rotationalSingularValues', size: [2], kind: 'numbers' }])
  })

  it('count a pose with its matrix as 23 numbers', () => {
    expect(columnsOf(['pose'], SIZES).reduce((sum, column) => sum + countOf(column), 0)).toBe(23)
  })
})

describe('the records of a question', () => {
  it('are the first that is declared, where nothing is said', () => {
    const { records } = KINEMATIC_OPERATIONS.jointRates
    expect(partsOf(records, {})).toEqual(['configuration', 'twist'])
    expect(partsOf(records, { record: 'pose-and-twist' }).map((part) => widthOf(part, 7))).toEqual([7, 3, 4, 6])
  })
})
