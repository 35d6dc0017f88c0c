import { describe, expect, it } from 'vitest'
import { DEFAULT_INVERSE, rankTolerance } from '@/lib/kinematics/inverse'
import { createTask } from '@/lib/kinematics/task'
import { arm, planar } from './arms'
import { askRates, flat, PLANE } from './ask-rates'

const along = createTask(['vx'])

/** One sliding joint whose motion along x is `sigma` times its coordinate: a Jacobian of one known singular value. */
function slider(sigma: number) {
  const leader = { type: 'prismatic', axis: [0, 1, 0] } as const
  return arm([leader, { type: 'prismatic', axis: [1, 0, 0], mimic: { joint: 0, multiplier: sigma } }])
}

describe('adaptive damping by the smallest singular value (Chiaverini, Siciliano & Egeland 1994, from memory)', () => {
  it.each([
    [0.05, 0.0012, 13.5135],
    [0.02, 0.001536, 10.3306],
    [0, 0.0016, 0],
    [0.1, 0, 10],
    [0.2, 0, 5],
  ])('at sigma %s damps by lambda² = %s and multiplies by %s', (sigma, squared, gain) => {
    const { damping, primaryRates } = askRates(slider(sigma), [0.3], flat(1, 0), {
      task: along,
      inverse: { method: 'adaptive-damped', threshold: 0.1, maxDamping: 0.04 },
    })
    expect(damping * damping).toBeCloseTo(squared, 12)
    expect(primaryRates[0]).toBeCloseTo(gain, 4)
  })

  it('is continuous where it sets in', () => {
    const at = (sigma: number) =>
      askRates(slider(sigma), [0.3], flat(1, 0), { task: along, inverse: { method: 'adaptive-damped', threshold: 0.1, maxDamping: 0.04 } })
        .primaryRates[0]!
    expect(at(0.1 - 1e-9)).toBeCloseTo(at(0.1), 6)
  })

  it('damps from 0.02 down, by at most 0.05, where nothing is said', () => {
    expect(DEFAULT_INVERSE).toEqual({ method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 })
    expect(askRates(slider(0.021), [0], flat(1, 0), { task: along }).damping).toBe(0)
    expect(askRates(slider(0), [0], flat(1, 0), { task: along }).damping).toBe(0.05)
  })
})

describe('the truncated inverse', () => {
  it('drops each direction whose singular value is at most the tolerance times the largest, and delivers nothing of it', () => {
    const chain = planar([1, 1])
    const ask = (tolerance: number) => askRates(chain, [0, 1e-3], flat(1, 1), { task: PLANE, inverse: { method: 'truncated', tolerance } })
    expect(ask(1e-3)).toMatchObject({ rank: 1, damping: 0 })
    expect(Math.max(...ask(1e-3).rates.map(Math.abs))).toBeLessThan(1)
    expect(ask(1e-4).rank).toBe(2)
    expect(Math.max(...ask(1e-4).rates.map(Math.abs))).toBeGreaterThan(100)
  })

  it('takes a tolerance finer than rounding as rounding, so that a singular pose stays one', () => {
    const { rank, rates } = askRates(planar([1, 1]), [0.7, 0], flat(1, 1), { task: PLANE, inverse: { method: 'truncated', tolerance: 0 } })
    expect(rank).toBe(1)
    expect(Math.max(...rates.map(Math.abs))).toBeLessThan(1)
  })
})

describe('rankTolerance', () => {
  it('is the tolerance of a truncated inverse and 1e-9 for every other, damped ones included', () => {
    expect(rankTolerance({ method: 'truncated', tolerance: 0.01 })).toBe(0.01)
    expect(rankTolerance({ method: 'damped', damping: 0.1 })).toBe(1e-9)
    expect(rankTolerance(DEFAULT_INVERSE)).toBe(1e-9)
  })
})
