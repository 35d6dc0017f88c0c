import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import type { Objective } from '@/lib/kinematics/objectives'
import { arm, golden, planar, rad, randomPose } from './arms'
import { askRates, EXACT, flat, PLANE } from './ask-rates'
import { expectClose } from './expect-close'

const bent = rad(30, 30, 30)

function limited(rates: readonly (number | null)[]): Chain {
  const chain = planar([1, 1, 1])
  return { ...chain, joints: chain.joints.map((joint, i) => ({ ...joint, rate: rates[i]! })) }
}

const SATURATE = { rates: 'saturate', derating: 1 } as const

describe('saturation in the null space (Flacco, De Luca & Khatib, from memory)', () => {
  it.each([
    [[0.3, 0.3, 0.3], 0.6, [0.1098076211, -0.3, -0.3], 0.5645561911],
    [[0.5, 0.45, 0.6], 1, [0.1647114317, -0.45, -0.55], 0.96],
    [[0.2, 0.42, 1.5], 1, [0.1537306696, -0.42, -0.58], 0.896],
  ])('METHODS 15: rates of at most %o do %s of the task', (rates, scale, expected, uniform) => {
    const outcome = askRates(limited(rates), bent, flat(1, 0), { task: PLANE, inverse: EXACT, limits: SATURATE })
    expect(outcome.scale).toBeCloseTo(scale, 10)
    expectClose(outcome.rates, expected, 1e-9)
    expectClose(outcome.achievedTwist.slice(0, 2), [scale, 0], 1e-10)
    expect(askRates(limited(rates), bent, flat(1, 0), { task: PLANE, inverse: EXACT }).scale).toBeCloseTo(uniform, 3)
    expect(outcome.saturated.length).toBeGreaterThan(0)
  })

  it('gives up the secondary motion first, then the even share, then speed', () => {
    const secondary: Objective[] = [{ objective: 'posture', posture: [0, 0, 0], gain: 1 }]
    const ask = (vx: number, rate: number) => askRates(limited([rate, rate, rate]), bent, flat(vx, 0), { task: PLANE, inverse: EXACT, limits: SATURATE, secondary })
    const [all, less, even, slower] = [ask(0.1, 1), ask(0.1, 0.1), ask(1, 0.51), ask(1, 0.3)]
    expect([all.scale, all.secondaryScale, all.saturated]).toEqual([1, 1, []])
    expect([less.scale, less.saturated]).toEqual([1, []])
    expect(less.secondaryScale).toBeGreaterThan(0)
    expect(less.secondaryScale).toBeLessThan(1)
    expect(even.scale).toBe(1)
    expect(even.saturated).toEqual(['joint-3'])
    expect(slower.scale).toBeLessThan(1)
    expect(slower.diagnosis.map(({ code }) => code)).toEqual(['rate-limited', 'secondary-starved'])
  })

  it('never exceeds a bound, never slows the task more than even scaling does, and keeps its direction', () => {
    const rate = fc.oneof(fc.constant(null), fc.double({ min: 0.02, max: 2, noNaN: true }))
    const part = fc.double({ min: -1, max: 1, noNaN: true })
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1e6 }), fc.array(rate, { minLength: 7, maxLength: 7 }), fc.array(part, { minLength: 6, maxLength: 6 }),
        fc.array(part, { minLength: 7, maxLength: 7 }), fc.constantFrom(0, 1, 5), fc.constantFrom(null, [1, 2, 3, 4, 5, 6, 7]),
        (seed, rates, twist, offset, gain, jointWeights) => {
          const free = golden()
          const chain = { ...free, joints: free.joints.map((joint, i) => ({ ...joint, rate: rates[i]! })) }
          const q = randomPose(chain, seed)
          const secondary: Objective[] = [{ objective: 'posture', posture: q.map((value, i) => value + offset[i]!), gain }]
          const weights = jointWeights === null ? {} : { jointWeights }
          const even = askRates(chain, q, twist, { secondary, ...weights })
          const outcome = askRates(chain, q, twist, { secondary, limits: SATURATE, ...weights })
          outcome.rates.forEach((value, i) => expect(Math.abs(value)).toBeLessThanOrEqual(rates[i] ?? Number.POSITIVE_INFINITY))
          expect(outcome.scale).toBeGreaterThanOrEqual(even.scale)
          expect(outcome.scale).toBeLessThanOrEqual(1)
          const { achievedTwist } = askRates(chain, q, twist, { secondary: [], limits: { rates: 'report', derating: 1 }, ...weights })
          const slack = 1e-9 * Math.max(1, ...outcome.rates.map(Math.abs))
          expectClose(outcome.achievedTwist, achievedTwist.map((value) => outcome.scale * value), slack)
        },
      ),
      { seed: 21, numRuns: 250 },
    )
  })

  it('takes over for a joint at its position limit, and says which', () => {
    const chain = planar([1, 1, 1], { lower: -2, upper: 2, rate: 2 })
    const q = [0.3, 0.4, 2]
    const ask = (rates: 'scale' | 'saturate') => askRates(chain, q, flat(0.3, -0.2), { task: PLANE, inverse: EXACT, limits: { rates, derating: 1, dt: 0.01, accelerations: [50, 50, 50] } })
    const evenly = ask('scale')
    expect(evenly.rates[2]).toBeGreaterThan(0)
    expect(evenly.diagnosis.map(({ code, joint }) => [code, joint])).toEqual([['at-limit', 'joint-3']])
    const relieved = ask('saturate')
    expect(relieved).toMatchObject({ scale: 1, saturated: ['joint-3'] })
    expect(relieved.rates[2]).toBe(0)
    expectClose(relieved.residual, [0, 0, 0, 0, 0, 0], 1e-14)
    expect(relieved.diagnosis).toEqual([])
  })

  it('never refuses motion back inside a limit that is violated', () => {
    const chain = planar([1], { lower: -1, upper: 1, rate: 1 })
    const back = askRates(chain, [1.5], flat(-Math.sin(1.5) * -0.4, Math.cos(1.5) * -0.4), { task: PLANE, inverse: EXACT, limits: { ...SATURATE, dt: 0.01, accelerations: [5] } })
    expect(back.rates[0]).toBeCloseTo(-0.4, 12)
    expect(back.scale).toBe(1)
    expect(back.diagnosis.map(({ code }) => code)).toEqual(['outside-limits'])
    const out = askRates(chain, [1.5], flat(-Math.sin(1.5) * 0.4, Math.cos(1.5) * 0.4), { task: PLANE, inverse: EXACT, limits: { ...SATURATE, dt: 0.01, accelerations: [5] } })
    expect(out.rates).toEqual([0])
    expect(out.scale).toBe(0)
  })

  it('runs a joint to its limit without passing it or braking harder than it can', () => {
    const chain = planar([1, 1, 1], { lower: -1, upper: 1, rate: 2 })
    const dt = 0.01
    let q = [0.2, 0.3, 0.4]
    let previousRates = [0, 0, 0]
    let reached = 0
    for (let i = 0; i < 800; i++) {
      const { rates } = askRates(chain, q, flat(-1, 0), { task: PLANE, previousRates, limits: { ...SATURATE, dt, accelerations: [5, 5, 5] } })
      rates.forEach((value, k) => expect(Math.abs(value - previousRates[k]!)).toBeLessThanOrEqual(5 * dt * (1 + 1e-9)))
      q = q.map((value, k) => value + dt * rates[k]!)
      previousRates = rates
      reached = Math.max(reached, ...q.map(Math.abs))
    }
    expect(reached).toBeGreaterThan(0.9999)
    expect(reached).toBeLessThanOrEqual(1 + 1e-12)
  })

  it('brakes as hard as it may where no speed of the task is within reach, and says so', () => {
    const chain = planar([1, 1, 1], { rate: 2 })
    const question = { task: PLANE, inverse: EXACT, previousRates: [1, 1, 1] } as const
    for (const rates of ['scale', 'saturate'] as const) {
      const { rates: braked, scale, diagnosis, saturated } = askRates(chain, bent, flat(-1, 0), { ...question, limits: { rates, derating: 1, dt: 0.01, accelerations: [5, 5, 5] } })
      braked.forEach((rate) => expect(rate).toBeCloseTo(0.95, 12))
      expect(scale).toBe(0)
      expect(saturated).toEqual(['joint-1', 'joint-2', 'joint-3'])
      expect(diagnosis.find(({ code }) => code === 'rate-limited')!.detail).toContain('each joint brakes as hard as it may')
    }
  })

  it('says at-limit where a joint comes to its limit faster than it can brake', () => {
    const chain = planar([1, 1, 1], { upper: 1, rate: 2 })
    const { diagnosis, rates } = askRates(chain, [0.1, 0.2, 0.999], flat(-0.1, 0.1), { task: PLANE, previousRates: [0, 0, 1.5], limits: { ...SATURATE, dt: 0.1, accelerations: [1, 1, 1] } })
    expect(rates[2]).toBeCloseTo(0.01, 12)
    expect(diagnosis.find(({ code }) => code === 'at-limit')).toMatchObject({ joint: 'joint-3' })
  })

  it('scales an arm that has no joint to spare evenly', () => {
    const chain = planar([1, 1], { rate: 0.1 })
    const ask = (rates: 'scale' | 'saturate') => askRates(chain, [0.3, 0.8], flat(1, 0), { task: PLANE, inverse: EXACT, limits: { rates, derating: 1 } })
    expect(ask('saturate').scale).toBeCloseTo(ask('scale').scale, 12)
  })

  it('refuses limits of another length', () => {
    const chain = arm([{ rate: 1 }])
    const wrong = (limits: object, previousRates?: number[]) => () =>
      askRates(chain, [0], flat(0, 0), { limits: { ...SATURATE, ...limits }, ...(previousRates === undefined ? {} : { previousRates }) })
    expect(wrong({ derating: [1, 1] })).toThrow('1 deratings are needed, 2 were given')
    expect(wrong({ accelerations: [] })).toThrow('1 accelerations are needed, 0 were given')
    expect(wrong({}, [1, 2])).toThrow('1 previous rates are needed, 2 were given')
  })
})
