import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createRateBounds, fillRateBounds } from '@/lib/kinematics/rate-bounds'
import { scaleToBounds } from '@/lib/kinematics/rate-scaling'
import { planar } from './arms'

/** A chain of which only the rate limits matter. */
function limited(rates: readonly (number | null)[]): Chain {
  const chain = planar(rates.map(() => 1))
  return { ...chain, joints: chain.joints.map((joint, i) => ({ ...joint, rate: rates[i]! })) }
}

function scaled(rates: readonly (number | null)[], primary: readonly number[], secondary: readonly number[], derating = 1) {
  const bounds = createRateBounds(rates.length)
  const { joints } = limited(rates)
  fillRateBounds(bounds, joints, joints.map(() => 0), { rates: 'scale', derating })
  const out = { scale: Number.NaN, secondaryScale: Number.NaN }
  expect(scaleToBounds(bounds, Float64Array.from(primary), Float64Array.from(secondary), out)).toBe(true)
  return out
}

function keeps(rates: readonly (number | null)[], primary: readonly number[], secondary: readonly number[], a: number, b: number): boolean {
  return rates.every((rate, i) => rate === null || Math.abs(a * primary[i]! + b * secondary[i]!) <= rate)
}

describe('scaleToBounds', () => {
  it('changes nothing that is within the limits, however close', () => {
    expect(scaled([1, 2], [0.5, -1.5], [0.5, -0.5])).toEqual({ scale: 1, secondaryScale: 1 })
  })

  it('gives up the secondary motion before it slows the task', () => {
    expect(scaled([1, 1], [1, 0.2], [1, 0.1])).toEqual({ scale: 1, secondaryScale: 0 })
    expect(scaled([1, 1], [0.75, 0.2], [0.5, 0.1])).toEqual({ scale: 1, secondaryScale: 0.5 })
  })

  it('slows the task by the joint that is furthest beyond its limit', () => {
    expect(scaled([1, 1, 1], [2, -4, 1], [0, 0, 0])).toEqual({ scale: 0.25, secondaryScale: 1 })
  })

  it('keeps as much of the secondary motion as helps the task, where it opposes the joint that binds', () => {
    expect(scaled([1, 9], [2, 0], [-1, 0])).toEqual({ scale: 1, secondaryScale: 1 })
    expect(scaled([1, 9], [4, 0], [-1, 0])).toEqual({ scale: 0.5, secondaryScale: 1 })
    // The second joint lets only a quarter of it pass.
    const { scale, secondaryScale } = scaled([1, 0.25], [4, 0], [-1, 1])
    expect(scale).toBeCloseTo(0.3125, 14)
    expect(secondaryScale).toBeCloseTo(0.25, 14)
  })

  it('never stops or clamps by a rate that is not known', () => {
    expect(scaled([null, null], [1e9, -1e9], [1e9, 1])).toEqual({ scale: 1, secondaryScale: 1 })
    expect(scaled([null, 1], [1e9, 2], [1e9, 0])).toEqual({ scale: 0.5, secondaryScale: 1 })
  })

  it('lets no secondary rate decide that is lost in the rounding of the limit', () => {
    expect(scaled([0.05], [-0.05000000000000001], [-5e-324]).secondaryScale).toBeGreaterThan(1 - 1e-12)
  })

  it('multiplies each limit by the derating', () => {
    expect(scaled([1], [1], [0], 0.25)).toEqual({ scale: 0.25, secondaryScale: 1 })
  })

  it('finds what a fine grid over both factors finds, and never less', () => {
    const rate = fc.oneof(
      fc.constant(null),
      fc.integer({ min: 3, max: 300 }).map((k) => k / 97),
    )
    const part = fc.integer({ min: -400, max: 400 }).map((k) => k / 89)
    fc.assert(
      fc.property(fc.array(fc.tuple(rate, part, part), { minLength: 1, maxLength: 7 }), (joints) => {
        const rates = joints.map(([r]) => r)
        const primary = joints.map(([, p]) => p)
        const secondary = joints.map(([, , s]) => s)
        const { scale, secondaryScale } = scaled(rates, primary, secondary)
        expect(keeps(rates, primary, secondary, scale, secondaryScale)).toBe(true)
        const grid = Array.from({ length: 101 }, (_unused, i) => i / 100)
        const feasible = grid.flatMap((a) => grid.filter((b) => keeps(rates, primary, secondary, a, b)).map((b) => ({ a, b })))
        const best = Math.max(...feasible.map(({ a }) => a))
        expect(scale).toBeGreaterThanOrEqual(best - 1e-12)
        // At the scale found no grid value of the secondary factor beats the one found.
        const room = grid.filter((b) => keeps(rates, primary, secondary, scale, b))
        expect(secondaryScale).toBeGreaterThanOrEqual(Math.max(0, ...room) - 1e-9)
        // And no point a little faster is feasible, whatever the secondary factor: the optimum, not only a good point.
        if (scale < 1)
          expect(
            Array.from({ length: 2001 }, (_unused, i) => i / 2000).some((b) =>
              keeps(rates, primary, secondary, Math.min(1, scale + 1e-9 + 1e-9 * scale), b),
            ),
          ).toBe(false)
      }),
      { seed: 12, numRuns: 400 },
    )
  })

  it('keeps the limits to the last bit, also where large rates cancel', () => {
    fc.assert(
      fc.property(
        fc.array(
          fc.tuple(
            fc.double({ min: 1e-3, max: 1, noNaN: true }),
            fc.double({ min: -1e6, max: 1e6, noNaN: true }),
            fc.double({ min: -1e6, max: 1e6, noNaN: true }),
          ),
          { minLength: 1, maxLength: 9 },
        ),
        (joints) => {
          const rates = joints.map(([r]) => r)
          const primary = joints.map(([, p]) => p)
          const secondary = joints.map(([, , s]) => s)
          const { scale, secondaryScale } = scaled(rates, primary, secondary)
          expect(keeps(rates, primary, secondary, scale, secondaryScale)).toBe(true)
          expect(Math.min(scale, secondaryScale)).toBeGreaterThanOrEqual(0)
          expect(Math.max(scale, secondaryScale)).toBeLessThanOrEqual(1)
        },
      ),
      { seed: 13, numRuns: 1000 },
    )
  })
})
