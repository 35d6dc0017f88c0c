import { beforeAll, describe, expect, it } from 'vitest'
import { sample } from '../example-request'
import { importModel } from '../import-model'
import { resultOf, resultsOf } from './ask'
import { expectClose } from './close'

const PLANAR = { components: ['vx', 'vy'] }
const BENT = [30, 30, 30].map((value) => (value * Math.PI) / 180)
const TRUNCATED = { method: 'truncated' }
const codes = (result: { diagnosis?: { code: string }[] }) => result.diagnosis!.map(({ code }) => code)

/** The trainer with other rate limits, rad/s, as a model of its own. */
async function trainerWith(name: string, rates: readonly number[]): Promise<string> {
  let joint = 0
  const text = sample('trainer-3r.urdf').toString().replaceAll(/velocity="[^"]+"/g, () => `velocity="${rates[joint++]}"`)
  return (await importModel(name, text)).model.slug
}

let slow: string
let uneven: string
let steep: string
beforeAll(async () => {
  slow = await trainerWith('Slow trainer', [0.3, 0.3, 0.3])
  uneven = await trainerWith('Trainer with a slow elbow', [0.5, 0.45, 0.6])
  steep = await trainerWith('Trainer with a slower elbow', [0.2, 0.42, 1.5])
})

/** 1 m/s along x of the base, which these arms cannot do. */
const fast = { configurations: [BENT], task: PLANAR, twists: [[1, 0, 0, 0, 0, 0]], inverse: TRUNCATED }
const J_PLUS = [0.1715228496, -0.4686091399, -0.5313908601]

describe('rate limits', () => {
  it('slow the tool and keep its direction (METHODS.md section 15)', async () => {
    const result = await resultOf('joint-rates', slow, fast)
    expectClose(result.scale!, 0.5645561911, 1e-9)
    expectClose(result.rates, J_PLUS.map((value) => 0.5645561911 * value), 1e-9)
    expectClose(result.primaryRates, J_PLUS, 1e-9)
    expectClose(result.achievedTwist!.slice(0, 2), [0.5645561911, 0], 1e-9)
    expectClose(result.residual!.slice(0, 2), [0.5645561911 - 1, 0], 1e-9)
    expect(result.diagnosis).toMatchObject([{ code: 'rate-limited', joint: 'wrist' }])
  })

  it('change nothing where they are only to be reported', async () => {
    const result = await resultOf('joint-rates', slow, { ...fast, limits: { rates: 'report', dt: 0.01, accelerations: [1, 1, 1], previousRates: [[0, 0, 0]] } })
    expectClose(result.rates, J_PLUS, 1e-9)
    expect(result).toMatchObject({ scale: 1, secondaryScale: 1, saturated: [], diagnosis: [] })
  })

  it('are tightened by the derating', async () => {
    const { scale } = await resultOf('joint-rates', slow, { ...fast, limits: { derating: 0.5 } })
    expectClose(scale!, 0.5645561911 / 2, 1e-9)
  })

  it('starve the objectives before they slow the tool', async () => {
    const secondary = [{ objective: 'posture', posture: [0, 0, 0], gain: 100 }]
    const result = await resultOf('joint-rates', slow, { ...fast, twists: [[0.1, 0, 0, 0, 0, 0]], secondary })
    expect(result.scale).toBe(1)
    expect(result.secondaryScale).toBeGreaterThan(0)
    expect(result.secondaryScale).toBeLessThan(1)
    // As much as the limits leave: one joint is at its limit.
    expectClose(Math.max(...result.rates!.map(Math.abs)), 0.3, 1e-9)
    expectClose(result.rates, result.primaryRates!.map((value, i) => value + result.secondaryScale! * result.secondaryRates![i]!), 1e-12)
    expect(codes(result)).toEqual(['secondary-starved'])
  })

  it.each([0, -0.1, 1.01])('have no derating of %s', async (derating) => {
    await expect(resultOf('joint-rates', slow, { ...fast, limits: { derating } })).rejects.toThrow('422')
  })
})

describe('saturation', () => {
  const SATURATE = { rates: 'saturate' }

  it('lets other joints take over for those at their limits, and names these (METHODS.md section 15)', async () => {
    const expected = [
      [slow, 0.6, [0.1098076211, -0.3, -0.3], 0.5645561911, ['wrist']],
      [uneven, 1, [0.1647114317, -0.45, -0.55], 0.96, ['elbow']],
      [steep, 1, [0.1537306696, -0.42, -0.58], 0.896, ['elbow']],
    ] as const
    for (const [model, scale, rates, evenly, saturated] of expected) {
      const result = await resultOf('joint-rates', model, { ...fast, limits: SATURATE })
      expectClose(result.scale!, scale, 1e-9)
      expectClose(result.rates, rates, 1e-9)
      expectClose(result.achievedTwist!.slice(0, 2), [scale, 0], 1e-9)
      expect(result.saturated).toEqual(saturated)
      expectClose((await resultOf('joint-rates', model, fast)).scale!, evenly, 1e-3)
    }
  })

  it('says when the tool is slowed all the same, and by which joint', async () => {
    expect((await resultOf('joint-rates', slow, { ...fast, limits: SATURATE })).diagnosis).toMatchObject([{ code: 'rate-limited', joint: expect.stringMatching(/^(elbow|wrist)$/) }])
    expect(codes(await resultOf('joint-rates', uneven, { ...fast, limits: SATURATE }))).toEqual([])
  })

  it('answers in the units of the question', async () => {
    const shop = await resultOf('joint-rates', uneven, { ...fast, units: { length: 'mm', angle: 'deg' }, configurations: [[30, 30, 30]], twists: [[1000, 0, 0, 0, 0, 0]], limits: SATURATE })
    expectClose(shop.rates, [0.1647114317, -0.45, -0.55].map((rate) => (rate * 180) / Math.PI), 1e-7)
    expect(shop).toMatchObject({ saturated: ['elbow'] })
  })

  it('gives up the objectives first, and says so', async () => {
    const bend = (posture: number[], vx: number) =>
      resultOf('joint-rates', uneven, { ...fast, twists: [[vx, 0, 0, 0, 0, 0]], limits: SATURATE, secondary: [{ objective: 'posture', posture, gain: 1 }] })
    const [loading, relieving] = [[45, 15, 45].map((value) => (value * Math.PI) / 180), [0, 0, 0]]
    expect(await bend(loading, 0.1)).toMatchObject({ scale: 1, secondaryScale: 1, saturated: [] })
    const busy = await bend(loading, 1)
    expect(busy).toMatchObject({ scale: 1, secondaryScale: 0, saturated: ['elbow'] })
    expect(codes(busy)).toEqual(['secondary-starved'])
    // One that takes load off the elbow is kept as far as it goes, and nothing need be saturated.
    expect(await bend(relieving, 1)).toMatchObject({ scale: 1, saturated: [] })
  })

  it('slows a joint so that it can still stop at its position limit (METHODS.md section 15)', async () => {
    // The wrist alone: upper limit 2.8 rad, 2 rad/s at the most; 5 rad/s² every 10 ms.
    const wrist = { chain: { base: 'middle_link', tip: 'tool_point' }, task: { components: ['wz'] }, inverse: TRUNCATED }
    const limits = { ...SATURATE, dt: 0.01, accelerations: [5] }
    const towards = await resultsOf('joint-rates', 'trainer-3r', { ...wrist, configurations: [1, 0.1, 0.01].map((margin) => [2.8 - margin]), twists: [[0, 0, 0, 0, 0, 9]], limits })
    expect(towards.map(({ rates }) => rates!.length)).toEqual([1, 1, 1])
    expectClose(towards.map(({ rates }) => rates![0]!), [2, 0.975, 0.29166667], 1e-8)
    // Outside there is only the way back, and it stays open.
    const [out, back] = await resultsOf('joint-rates', 'trainer-3r', { ...wrist, configurations: [[2.9], [2.9]], twists: [[0, 0, 0, 0, 0, 1], [0, 0, 0, 0, 0, -1]], limits })
    expect([out!.rates, out!.scale]).toEqual([[0], 0])
    expect(codes(out!)).toContain('outside-limits')
    expectClose(back!.rates, [-1], 1e-12)
    expect(back!.scale).toBe(1)
  })
})

describe('acceleration limits', () => {
  // Four joints, one of them sliding. Down: the quill alone moves, at 0.5 m/s.
  const down = { configurations: [[0.3, 0.4, 0.05, 0.6]], task: { components: ['vx', 'vy', 'vz', 'wz'] }, twists: [[0, 0, -0.5, 0, 0, 0]], inverse: TRUNCATED }
  const SHOP = { length: 'mm', angle: 'deg' }
  const deg = (value: number) => (value * 180) / Math.PI
  const limits = { dt: 0.01, accelerations: [10, 20, 2, 30], previousRates: [[0, 0, 0.1, 0]] }

  it('hold each joint to what it can change in a period from the rate before', async () => {
    const result = await resultOf('joint-rates', 'gannet-4', { ...down, limits })
    // 0.1 m/s and 2 m/s² for 10 ms: 0.12 of the 0.5 m/s asked.
    expectClose(result.rates, [0, 0, 0.12, 0], 1e-12)
    expectClose(result.scale!, 0.24, 1e-12)
    expect(result.diagnosis).toMatchObject([{ code: 'rate-limited', joint: 'quill_stroke', detail: expect.stringContaining('acceleration') }])
  })

  it('convert with the units of each joint', async () => {
    const shop = await resultOf('joint-rates', 'gannet-4', {
      ...down, units: SHOP, configurations: [[deg(0.3), deg(0.4), 50, deg(0.6)]], twists: [[0, 0, -500, 0, 0, 0]],
      limits: { dt: 0.01, accelerations: [deg(10), deg(20), 2000, deg(30)], previousRates: [[0, 0, 100, 0]] },
    })
    expectClose(shop.rates, [0, 0, 120, 0], 1e-9)
    expectClose(shop.scale!, 0.24, 1e-12)
    // The spindle: 90°/s before, 1000°/s² for 10 ms, where 200°/s are asked.
    const turn = { task: { components: ['wz'] }, chain: { base: 'quill', tip: 'tool_flange' } }
    const spindle = { ...turn, inverse: TRUNCATED, limits: { dt: 0.01, accelerations: [1000], previousRates: [[90]] } }
    const { rates } = await resultOf('joint-rates', 'gannet-4', { ...spindle, units: { angle: 'deg' }, configurations: [[0]], twists: [[0, 0, 0, 0, 0, 200]] })
    expectClose(rates, [100], 1e-9)
  })

  it('say nothing of a joint whose acceleration is not known, nor without the rates before', async () => {
    const unknown = await resultOf('joint-rates', 'gannet-4', { ...down, limits: { ...limits, accelerations: [10, 20, null, 30] } })
    expectClose(unknown.rates, [0, 0, 0.5, 0], 1e-12)
    const { previousRates: _none, ...without } = limits
    expectClose((await resultOf('joint-rates', 'gannet-4', { ...down, limits: without })).rates, [0, 0, 0.5, 0], 1e-12)
  })

  it('take the rates before for each configuration, or one for all', async () => {
    const three = { ...down, configurations: [0.03, 0.04, 0.05].map((stroke) => [0.3, 0.4, stroke, 0.6]) }
    const quill = async (previousRates: number[][]) => (await resultsOf('joint-rates', 'gannet-4', { ...three, limits: { ...limits, previousRates } })).map(({ rates }) => rates![2]!)
    expectClose(await quill([[0, 0, 0, 0], [0, 0, 0.2, 0], [0, 0, 0.49, 0]]), [0.02, 0.22, 0.5], 1e-12)
    expectClose(await quill([[0, 0, 0.2, 0]]), [0.22, 0.22, 0.22], 1e-12)
  })

  it('make every joint brake as hard as it may where nothing that was asked is within reach', async () => {
    // Asked to go up while the quill comes down at 1 m/s.
    const result = await resultOf('joint-rates', 'gannet-4', { ...down, twists: [[0, 0, 0.5, 0, 0, 0]], limits: { ...limits, previousRates: [[0, 0, 1, 0]] } })
    expectClose(result.rates, [0, 0, 0.98, 0], 1e-12)
    expect(result).toMatchObject({ scale: 0, saturated: ['quill_stroke'] })
    expect(result.diagnosis).toMatchObject([{ code: 'rate-limited', joint: 'quill_stroke', detail: expect.stringContaining('brakes as hard as it may') }])
  })
})
