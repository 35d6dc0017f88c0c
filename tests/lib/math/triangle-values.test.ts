import fc from 'fast-check'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, it } from 'vitest'
import { createTriangleRoom, triangleValues } from '@/lib/math/triangle-values'
import { expectClose } from '../kinematics/expect-close'

function valuesOf(lower: readonly number[], m: number): Float64Array | null {
  const values = new Float64Array(m)
  return triangleValues(Float64Array.from(lower), m, createTriangleRoom(m), values) ? values : null
}

/** Everything above the diagonal taken away. */
const triangle = (entries: readonly number[], m: number) => entries.map((entry, i) => (i % m > Math.floor(i / m) ? 0 : entry))

describe('triangleValues', () => {
  it.each([0, 1e-6, 0.1])('are those of ml-matrix, to rounding of the largest, or are not given; with a diagonal above %s they are', (least) => {
    const entry = fc.oneof(fc.double({ min: -10, max: 10, noNaN: true }).map((value) => (Math.abs(value) < 1e-12 ? 0 : value)), fc.constantFrom(0, 1, -1, 1e-9))
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 6 }).chain((m) => fc.tuple(fc.constant(m), fc.array(entry, { minLength: m * m, maxLength: m * m }))), ([m, entries]) => {
        const lower = triangle(entries, m).map((value, i) => (i % (m + 1) === 0 ? Math.abs(value) + least : value))
        const values = valuesOf(lower, m)
        if (least === 0 && values === null) return
        const witness = new SingularValueDecomposition(Matrix.from1DArray(m, m, lower), { autoTranspose: true }).diagonal
        expectClose(values!, witness, 1e-14 * Math.max(1e-120, witness[0]!))
      }),
      { seed: 5, numRuns: 2000 },
    )
  })

  it.each([
    ['nothing', [0, 0, 0, 0], 2, [0, 0]],
    ['equal values', [2, 0, 0, 0, 2, 0, 0, 0, 2], 3, [2, 2, 2]],
    ['a diagonal in any order and sign', [1, 0, 0, 0, -3, 0, 0, 0, 2], 3, [3, 2, 1]],
    ['a row of ones', [0, 0, 0, 0, 0, 0, 1, 1, 1], 3, [Math.sqrt(3), 0, 0]],
  ])('are right of %s', (_name, lower, m, expected) => {
    expectClose(valuesOf(lower, m)!, expected, 1e-15)
  })
})
