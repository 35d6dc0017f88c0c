import { describe, expect, it } from 'vitest'
import { bidiagonalise, createBidiagonal, solveBidiagonal } from '@/lib/math/bidiagonal'
import { canonicalBasis, createBasisRoom, makeCanonical } from '@/lib/math/canonical-basis'
import { createSingularValues, decompose } from '@/lib/math/singular-values'
import { numbers } from '../kinematics/arms'
import { expectClose } from '../kinematics/expect-close'

describe('canonicalBasis', () => {
  it('gives the coordinate axes, in order, where nothing is taken', () => {
    expect(canonicalBasis(new Float64Array(0), 3, 0)).toEqual([
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ])
  })

  it('gives nothing where everything is taken', () => {
    expect(canonicalBasis(Float64Array.of(1, 0, 0, 1), 2, 2)).toEqual([])
  })

  it('takes the first column of at least 0.499 of the largest, and makes its component positive', () => {
    // What is left is one direction u: its projector's columns have the norms |u|.
    const of = (u: readonly [number, number]) => canonicalBasis(Float64Array.of(u[1], -u[0]), 2, 1)[0]!
    const small = Math.sqrt(1 / (1 + 1 / 0.4985 ** 2))
    const large = Math.sqrt(1 / (1 + 1 / 0.4995 ** 2))
    expect(of([-large, Math.sqrt(1 - large * large)])[0]).toBeGreaterThan(0)
    expect(of([-small, Math.sqrt(1 - small * small)])[0]).toBeLessThan(0)
    expect(of([-0.6, -0.8])[0]).toBeCloseTo(0.6, 15)
    expect(of([-0.6, -0.8])[1]).toBeCloseTo(0.8, 15)
  })

  it('leaves no trace of an earlier pivot in a later vector', () => {
    const third = 1 / Math.sqrt(3)
    const [first, second] = canonicalBasis(Float64Array.of(third, third, third), 3, 1) as [number[], number[]]
    expect(second[0]).toBe(0)
    expect(first[0]).toBeCloseTo(Math.sqrt(2 / 3), 15)
    expect(second[1]).toBeCloseTo(Math.SQRT1_2, 15)
    expect(second[2]).toBeCloseTo(-Math.SQRT1_2, 15)
  })

  it('is the same by either way: from the rows that are taken, and from rows of what is left', () => {
    const random = numbers(77)
    for (let round = 0; round < 300; round++) {
      const m = 1 + (round % 6)
      const n = m + 1 + (Math.floor(round / 6) % m)
      const a = Float64Array.from({ length: m * n }, () => 2 * random() - 1)
      const taken = createSingularValues(m, n)
      decompose(a, m, n, taken)
      const form = createBidiagonal(n)
      bidiagonalise(a, m, n, form)
      const left = new Float64Array((n - m) * n)
      solveBidiagonal(form, new Float64Array(m), new Float64Array(n), left)
      const out = new Float64Array((n - m) * n)
      makeCanonical(left, n, n - m, createBasisRoom(n, m), out)
      expectClose(out, canonicalBasis(taken.right, n, m).flat(), 1e-12)
    }
  })
})
