import { describe, expect, it } from 'vitest'
import { DEFAULT_INVERSE, fillGains, rankTolerance, type Inverse } from '@/lib/kinematics/inverse'
import { createTask } from '@/lib/kinematics/task'
import { taskJacobian } from '@/lib/kinematics/task-jacobian'
import { arm, at, planar } from './arms'
import { askRates, flat, PLANE } from './ask-rates'
import { expectClose } from './expect-close'

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

describe('the filtered inverse (Maciejewski & Klein 1988, from memory)', () => {
  it('damps only the direction that vanishes (METHODS 8)', () => {
    const chain = planar([1, 1])
    const task = PLANE
    const inverse = { method: 'filtered', threshold: 0.02, damping: 0.1 } as const
    const none = { method: 'truncated', tolerance: 1e-9 } as const
    const { singularValues } = askRates(chain, [0.3, 0.01], flat(0, 0), { task, inverse })
    // The gain of a direction is the norm of the rates for a unit of it; the directions are those of the undamped answers.
    const along = (angle: number) => flat(Math.cos(angle), Math.sin(angle))
    const gain = (angle: number, how: Inverse) => Math.sqrt(askRates(chain, [0.3, 0.01], along(angle), { task, inverse: how }).primaryRates.reduce((sum, rate) => sum + rate * rate, 0))
    const angles = Array.from({ length: 20_001 }, (_unused, i) => (Math.PI * i) / 20_000)
    const vanishing = angles.reduce((best, angle) => (gain(angle, none) > gain(best, none) ? angle : best))
    expect(1 / singularValues[0]!).toBeCloseTo(0.447218962, 9)
    expect(gain(vanishing + Math.PI / 2, inverse)).toBeCloseTo(0.447218962, 4)
    expect(gain(vanishing, inverse)).toBeCloseTo(0.446318879, 4)
    expect(singularValues[1]! / (singularValues[1]! ** 2 + 0.01)).toBeCloseTo(0.446318879, 9)
  })

  it('gives the gains of METHODS 8 to the last digit printed', () => {
    const chain = planar([1, 1])
    const work = at(chain, [0.3, 0.01])
    taskJacobian(chain, work, PLANE)
    expect(fillGains(work, 2, 2, 2, { method: 'filtered', threshold: 0.02, damping: 0.1 })).toBe(0.1)
    expectClose(Array.from(work.gains.subarray(0, 2)), [0.447218962, 0.446318879], 1e-9)
  })

  it('fades to nothing at its threshold, so that the rates do not jump there', () => {
    const gain = (sigma: number) => askRates(slider(sigma), [0.3], flat(1, 0), { task: along, inverse: { method: 'filtered', threshold: 0.1, damping: 0.2 } })
    expect(gain(0.1)).toMatchObject({ damping: 0 })
    expect(gain(0.1 - 1e-9).primaryRates[0]).toBeCloseTo(10, 4)
    expect(gain(0.05).damping).toBeCloseTo(0.2, 15)
    expect(gain(0.01).damping).toBe(0.2)
    expect(gain(0).primaryRates[0]).toBe(0)
  })
})

describe('rankTolerance', () => {
  it('is the tolerance of a truncated inverse and 1e-9 for every other, damped ones included', () => {
    expect(rankTolerance({ method: 'truncated', tolerance: 0.01 })).toBe(0.01)
    expect(rankTolerance({ method: 'damped', damping: 0.1 })).toBe(1e-9)
    expect(rankTolerance(DEFAULT_INVERSE)).toBe(1e-9)
  })
})
