import { describe, expect, it } from 'vitest'
import { lowDiscrepancy } from '@/lib/math/low-discrepancy'

describe('lowDiscrepancy', () => {
  it('fills every tenth of every axis alike, and every quarter of each pair of axes', () => {
    const points = Array.from({ length: 2000 }, (_unused, i) => lowDiscrepancy(8, i + 1))
    for (let d = 0; d < 8; d++) {
      for (let tenth = 0; tenth < 10; tenth++) expect(Math.abs(points.filter((p) => Math.floor(10 * p[d]!) === tenth).length - 200)).toBeLessThan(6)
      for (let e = 0; e < d; e++) {
        expect(Math.abs(points.filter((p) => p[d]! < 0.5 && p[e]! < 0.5).length - 500)).toBeLessThan(40)
      }
    }
  })

  it('stays in the unit cube and repeats itself for the same index', () => {
    for (const index of [1, 2, 1e6]) {
      expect(lowDiscrepancy(100, index)).toEqual(lowDiscrepancy(100, index))
      expect(lowDiscrepancy(100, index).every((part) => part >= 0 && part < 1)).toBe(true)
    }
  })
})
