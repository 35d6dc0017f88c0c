import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { createRateBounds, fillRateBounds, stoppableRate, type RateLimits } from '@/lib/kinematics/rate-bounds'

function boundsOf(joint: Partial<ChainJoint>, q: number, limits: Partial<RateLimits>, before?: number) {
  const bounds = createRateBounds(1)
  const whole = { name: 'a', type: 'revolute', lower: null, upper: null, rate: null, ...joint } as const
  fillRateBounds(bounds, [whole], [q], { rates: 'saturate', derating: 1, ...limits }, before === undefined ? undefined : [before])
  return [bounds.lower[0], bounds.upper[0]]
}

describe('stoppableRate', () => {
  it.each([
    [1, 2],
    [0.1, 0.975],
    [0.01, 0.29166667],
    [0, 0],
    [-1, 0],
  ])('at a margin of %s rad, 5 rad/s² and 10 ms is %s rad/s (METHODS 15)', (margin, expected) => {
    expect(stoppableRate(margin, 2, 5, 0.01)).toBeCloseTo(expected, 8)
  })

  it('is the rate from which braking every period stops exactly at the limit, and never beyond', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 3, noNaN: true }), fc.double({ min: 0.1, max: 50, noNaN: true }), fc.double({ min: 1e-3, max: 0.1, noNaN: true }),
        (margin, acceleration, dt) => {
          let left = margin
          let rate = stoppableRate(left, 1e9, acceleration, dt)
          // The joint takes the largest rate that it may at each period: it must never have to brake harder than it can.
          for (let i = 0; i < 100_000 && left > 1e-12; i++) {
            left -= rate * dt
            const next = stoppableRate(left, 1e9, acceleration, dt)
            expect(rate - next).toBeLessThanOrEqual(acceleration * dt * (1 + 1e-9))
            rate = next
          }
          expect(left).toBeGreaterThan(-1e-12)
          expect(left).toBeLessThan(1e-9)
        },
      ),
      { seed: 8, numRuns: 100 },
    )
  })

  it('is continuous in the margin, where a further braking step comes in too', () => {
    for (const steps of [1, 3, 6, 10]) {
      const margin = steps * 5 * 0.01 * 0.01
      expect(stoppableRate(margin * (1 - 1e-12), 9, 5, 0.01)).toBeCloseTo(stoppableRate(margin * (1 + 1e-12), 9, 5, 0.01), 9)
    }
  })

  it('is finite and no larger than the rate for the smallest and largest numbers', () => {
    for (const margin of [5e-324, 1e-9, 1e9]) for (const a of [1e-9, 1, 1e9]) for (const dt of [1e-9, 1, 1e9]) {
      const rate = stoppableRate(margin, 2, a, dt)
      expect(rate).toBeGreaterThanOrEqual(0)
      expect(rate).toBeLessThanOrEqual(2)
    }
    expect(stoppableRate(1e9, Number.POSITIVE_INFINITY, 1e-9, 1e-9)).toBeCloseTo(Math.SQRT2, 9)
  })
})

describe('fillRateBounds', () => {
  it.each([null, 0, -1, Number.NaN])('never bounds a joint whose rate is %s', (rate) => {
    expect(boundsOf({ rate }, 0, {})).toEqual([Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY])
  })

  it('multiplies rate limits by one derating or by one for each joint', () => {
    expect(boundsOf({ rate: 2 }, 0, { derating: 0.25 })).toEqual([-0.5, 0.5])
    expect(boundsOf({ rate: 2 }, 0, { derating: [0.5] })).toEqual([-1, 1])
  })

  it('leaves position limits alone without a period, and when rates are only scaled', () => {
    expect(boundsOf({ upper: 1, rate: 2 }, 1, {})).toEqual([-2, 2])
    expect(boundsOf({ upper: 1, rate: 2 }, 1, { rates: 'scale', dt: 0.01 })).toEqual([-2, 2])
  })

  it('stops a joint at its limit, and leaves the way back open outside it', () => {
    expect(boundsOf({ lower: -1, upper: 1, rate: 2 }, 1, { dt: 0.01, accelerations: [5] })).toEqual([-2, 0])
    expect(boundsOf({ lower: -1, upper: 1, rate: 2 }, 1.5, { dt: 0.01, accelerations: [5] })).toEqual([-2, 0])
    expect(boundsOf({ lower: -1, upper: 1, rate: 2 }, -1.5, { dt: 0.01 })).toEqual([0, 2])
    // Without an acceleration limit the whole rest may be used up in one period.
    expect(boundsOf({ upper: 1 }, 0.99, { dt: 0.01, accelerations: [null] })[1]).toBeCloseTo(1, 12)
  })

  it('lets rates change by acceleration times period, where the rates before are known', () => {
    expect(boundsOf({ rate: 2 }, 0, { dt: 0.1, accelerations: [3] }, 1)).toEqual([0.7, expect.closeTo(1.3, 12)])
    expect(boundsOf({ rate: 2 }, 0, { dt: 0.1, accelerations: [3] })).toEqual([-2, 2])
    expect(boundsOf({ rate: 2 }, 0, { rates: 'scale', dt: 0.1, accelerations: [3] }, 1.9)).toEqual([expect.closeTo(1.6, 12), 2])
  })

  it('lets position win over the change of rate, then brakes as hard as it may', () => {
    const [low, high] = boundsOf({ upper: 1, rate: 2 }, 0.999, { dt: 0.1, accelerations: [1] }, 1.5)
    expect(low).toBe(high)
    expect(high).toBeCloseTo(0.01, 12)
  })
})
