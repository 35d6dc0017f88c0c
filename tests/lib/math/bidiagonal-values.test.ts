import fc from 'fast-check'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import { bidiagonalValues, createValuesRoom } from '@/lib/math/bidiagonal-values'
import { expectClose } from '../kinematics/expect-close'

function valuesOf(diagonal: readonly number[], beside: readonly number[]): Float64Array | null {
  const m = diagonal.length
  const values = new Float64Array(m)
  const found = bidiagonalValues(Float64Array.from(diagonal), Float64Array.from([...beside, 0]), m, createValuesRoom(m), values)
  return found ? values : null
}

/** Row-major, lower bidiagonal. */
function whole(diagonal: readonly number[], beside: readonly number[]): Matrix {
  const m = diagonal.length
  return Matrix.from1DArray(m, m, Array.from({ length: m * m }, (_entry, at) => {
    const [row, column] = [Math.floor(at / m), at % m]
    return row === column ? diagonal[row]! : row === column + 1 ? beside[column]! : 0
  }))
}

describe('bidiagonalValues', () => {
  it.each([1e-6, 0.1])('are those of ml-matrix, to rounding of the largest, or are not given; diagonal above %s', (least) => {
    let given = 0
    const entry = fc.oneof(fc.double({ min: -10, max: 10, noNaN: true }).map((value) => (Math.abs(value) < 1e-12 ? 0 : value)), fc.constantFrom(0, 1, -1, 1e-9))
    const entries = (length: number) => fc.array(entry, { minLength: length, maxLength: length })
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 6 }).chain((m) => fc.tuple(entries(m), entries(m - 1))), ([drawn, beside]) => {
        const diagonal = drawn.map((value) => (value < 0 ? value - least : value + least))
        const values = valuesOf(diagonal, beside)
        if (values === null) return
        given++
        const witness = new SingularValueDecomposition(whole(diagonal, beside), { autoTranspose: true }).diagonal
        expectClose(values, witness, 1e-14 * Math.max(1e-120, witness[0]!))
      }),
      { seed: 5, numRuns: 3000 },
    )
    expect(given).toBeGreaterThan(2500)
  })

  it('are given wherever no entry is 0 and none is negligible', () => {
    const part = fc.double({ min: 0.01, max: 10, noNaN: true })
    const entries = (length: number) => fc.array(part, { minLength: length, maxLength: length })
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 6 }).chain((m) => fc.tuple(entries(m), entries(m - 1))), ([diagonal, beside]) => {
        expect(valuesOf(diagonal, beside)).not.toBeNull()
      }),
      { seed: 6, numRuns: 3000 },
    )
  })

  it('keep the digits of a value that is a thousand million times smaller than the largest', () => {
    // The product of the values is that of the diagonal, exactly.
    const diagonal = [3, 2, 1, 0.5, 0.25, 1e-9]
    const values = valuesOf(diagonal, [1, 1, 1, 1, 1])!
    const product = diagonal.reduce((a, b) => a * b)
    expect(Math.abs(values.reduce((a, b) => a * b) / product - 1)).toBeLessThan(1e-14)
    expect(Array.from(valuesOf(diagonal.toReversed(), [1, 1, 1, 1, 1])!).every((value) => value > 0)).toBe(true)
  })

  it.each([
    ['nothing', [0, 0], [0], [0, 0]],
    ['equal values', [2, 2, 2], [0, 0], [2, 2, 2]],
    ['a diagonal in any order and sign', [1, -3, 2], [0, 0], [3, 2, 1]],
    ['one number', [-5], [], [5]],
    ['the golden ratio', [1, 1], [1], [(1 + Math.sqrt(5)) / 2, (Math.sqrt(5) - 1) / 2]],
  ])('are right of %s', (_name, diagonal, beside, expected) => {
    expectClose(valuesOf(diagonal, beside)!, expected, 1e-15)
  })

  it('are not given of what is not a number', () => {
    expect(valuesOf([1, Number.NaN, 1], [1, 1])).toBeNull()
  })
})
