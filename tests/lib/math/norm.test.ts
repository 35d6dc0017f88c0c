import { describe, expect, it } from 'vitest'
import { norm } from '@/lib/math/norm'
import { numericalRank } from '@/lib/math/numerical-rank'

describe('norm', () => {
  it.each([1, 1e-300, 1e-170, 1e170, 1e300])('neither over- nor underflows at scale %s', (scale) => {
    expect(norm([3 * scale, -4 * scale]) / scale).toBeCloseTo(5, 13)
  })

  it('measures a part of an array', () => {
    expect(norm([9, 3, 4, 9], 1, 2)).toBe(5)
    expect(norm([])).toBe(0)
  })

  it('says when a number is not finite', () => {
    expect(norm([1, Number.POSITIVE_INFINITY])).toBe(Number.POSITIVE_INFINITY)
    expect(norm([1, Number.NaN])).toBeNaN()
  })
})

describe('numericalRank', () => {
  it('counts the values above the tolerance times the largest', () => {
    expect(numericalRank([1, 0.1, 0.01], 3, 0.01, 3)).toBe(2)
    expect(numericalRank([1, 0.1, 0.01], 3, 0.0099, 3)).toBe(3)
    expect(numericalRank([1, 0.1, 0.01], 1, 0, 3)).toBe(1)
  })

  it('never counts rounding, nor what cannot be divided by', () => {
    expect(numericalRank([1, 3e-16], 2, 0, 6)).toBe(1)
    expect(numericalRank([1e-201, 1e-202], 2, 0, 6)).toBe(0)
    expect(numericalRank([0, 0], 2, 0, 6)).toBe(0)
    expect(numericalRank([], 0, 0, 6)).toBe(0)
  })
})
