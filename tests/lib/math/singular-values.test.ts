import fc from 'fast-check'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import { createSingularValues, decompose } from '@/lib/math/singular-values'

function decomposed(a: readonly number[], m: number, n: number) {
  const out = createSingularValues(m, n)
  decompose(a, m, n, out)
  return out
}

/** Everything that makes a decomposition one, to rounding. */
function expectDecomposition(a: readonly number[], m: number, n: number): Float64Array {
  const { left, values, right } = decomposed(a, m, n)
  const size = Math.max(...a.map(Math.abs), Number.MIN_VALUE)
  const slack = 1e-14 * Math.sqrt(n) * 10
  for (let k = 0; k < m; k++) {
    expect(values[k]).toBeGreaterThanOrEqual(0)
    if (k > 0) expect(values[k]).toBeLessThanOrEqual(values[k - 1]! * (1 + 1e-15))
    for (let other = 0; other <= k; other++) {
      const leftDot = Array.from({ length: m }, (_e, i) => left[k * m + i]! * left[other * m + i]!).reduce((s, x) => s + x, 0)
      expect(Math.abs(leftDot - (other === k ? 1 : 0))).toBeLessThan(slack)
      // A right vector whose value is rounding of the largest is rounding too.
      if (values[k]! > 1e-13 * values[0]!) {
        const rightDot = Array.from({ length: n }, (_e, i) => right[k * n + i]! * right[other * n + i]!).reduce((s, x) => s + x, 0)
        expect(Math.abs(rightDot - (other === k ? 1 : 0))).toBeLessThan(slack)
      }
    }
  }
  for (let i = 0; i < m; i++) {
    for (let j = 0; j < n; j++) {
      let rebuilt = 0
      for (let k = 0; k < m; k++) rebuilt += (values[k]! / size) * left[k * m + i]! * right[k * n + j]!
      expect(Math.abs(rebuilt - a[i * n + j]! / size)).toBeLessThan(slack * m)
    }
  }
  return values
}

const shape = fc.tuple(fc.integer({ min: 1, max: 6 }), fc.integer({ min: 1, max: 12 }))

describe('decompose', () => {
  it('rebuilds any finite matrix from orthonormal vectors and descending values', () => {
    const entry = fc.oneof(
      fc.double({ min: -1e9, max: 1e9, noNaN: true }),
      fc.double({ min: -1, max: 1, noNaN: true }),
      fc.constantFrom(0, 1, -1, 1e9, 1e-9, 5e-324),
    )
    fc.assert(
      fc.property(
        shape.chain(([m, n]) => fc.tuple(fc.constant(m), fc.constant(n), fc.array(entry, { minLength: m * n, maxLength: m * n }))),
        ([m, n, a]) => {
          expectDecomposition(a, m, n)
        },
      ),
      { seed: 1, numRuns: 800 },
    )
  })

  it('gives the singular values that ml-matrix gives', () => {
    fc.assert(
      fc.property(
        shape.chain(([m, n]) =>
          fc.tuple(
            fc.constant(m),
            fc.constant(n),
            fc.array(fc.double({ min: -10, max: 10, noNaN: true }), { minLength: m * n, maxLength: m * n }),
          ),
        ),
        ([m, n, a]) => {
          const { values } = decomposed(a, m, n)
          const witness = new SingularValueDecomposition(Matrix.from1DArray(m, n, a), { autoTranspose: true }).diagonal
          for (let k = 0; k < Math.min(m, n); k++) expect(Math.abs(values[k]! - witness[k]!)).toBeLessThan(1e-13 * Math.max(1, witness[0]!))
        },
      ),
      { seed: 2, numRuns: 300 },
    )
  })

  it.each([
    ['zero', [0, 0, 0, 0, 0, 0], 2, 3, [0, 0]],
    ['a single number', [-7], 1, 1, [7]],
    ['equal rows', [1, 2, 3, 1, 2, 3], 2, 3, [Math.sqrt(28), 0]],
    ['more rows than columns', [3, 4], 2, 1, [5, 0]],
    ['no column at all', [], 3, 0, [0, 0, 0]],
  ])('decomposes %s', (_name, a, m, n, expected) => {
    const { values, left } = decomposed(a, m, n)
    expected.forEach((value, k) => expect(values[k]).toBeCloseTo(value, 14))
    for (let k = 0; k < m; k++)
      expect(Array.from({ length: m }, (_e, i) => left[k * m + i]! ** 2).reduce((s, x) => s + x, 0)).toBeCloseTo(1, 14)
  })

  it.each([1e-300, 1e-160, 1e-30, 1e30, 1e160, 1e300])('neither over- nor underflows at scale %s', (scale) => {
    const { values } = decomposed([3 * scale, 0, 0, 0, 4 * scale, 0], 2, 3)
    expect(values[0]! / scale).toBeCloseTo(4, 13)
    expect(values[1]! / scale).toBeCloseTo(3, 13)
  })

  it('keeps small singular values to their own digits where the rows differ in size', () => {
    // Values of diag(1, 1e-8, 1e-16) times an orthogonal matrix: a decomposition through AᵀA would lose the last two.
    const [c, s] = [Math.cos(0.7), Math.sin(0.7)]
    const { values } = decomposed([c, s, 0, -1e-8 * s, 1e-8 * c, 0, 0, 0, 1e-16], 3, 3)
    expect(values[1]! / 1e-8).toBeCloseTo(1, 13)
    expect(values[2]! / 1e-16).toBeCloseTo(1, 13)
  })

  it('decomposes the graded and badly conditioned matrices of a hundred columns', () => {
    for (const m of [1, 3, 6]) {
      const a = Array.from({ length: m * 120 }, (_e, i) => Math.sin(i * i) * 10 ** -((i % m) * 2))
      expectDecomposition(a, m, 120)
    }
  })

  it('gives the same bits again, whatever the arrays held before', () => {
    const a = Array.from({ length: 42 }, (_e, i) => Math.cos(3 * i))
    const out = createSingularValues(6, 7)
    decompose(
      a.map((x) => 1 / x),
      6,
      7,
      out,
    )
    decompose(a, 6, 7, out)
    expect(out).toEqual(decomposed(a, 6, 7))
  })

  it('ends on numbers that are not finite', () => {
    expect(() => decomposed([Number.NaN, 1, Number.POSITIVE_INFINITY, 2], 2, 2)).not.toThrow()
  })
})
