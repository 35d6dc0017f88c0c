import { beforeAll, describe, expect, it } from 'vitest'
import { sample } from '../example-request'
import { importModel } from '../import-model'
import { resultOf } from './ask'
import { expectClose } from './close'

const PLANAR = { components: ['vx', 'vy'] }
const BENT = [30, 30, 30].map((value) => (value * Math.PI) / 180)
const TRUNCATED = { method: 'truncated' }
/** 0.1 m/s along x of the base. */
const ALONG_X = [0.1, 0, 0, 0, 0, 0]
const at = { configurations: [BENT], task: PLANAR, twists: [ALONG_X] }
const codes = (result: { diagnosis?: { code: string }[] }) => result.diagnosis!.map(({ code }) => code)

describe('the inverse', () => {
  it('truncated is the pseudo-inverse (METHODS.md section 6)', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED })
    expectClose(result.rates, [0.017152285, -0.046860914, -0.053139086], 1e-10)
    expectClose(result.achievedTwist!.slice(0, 2), [0.1, 0], 1e-12)
    expectClose(result.residual, [0, 0, 0, 0, 0, 0], 1e-12)
    expectClose(result.toolSpeed!, 0.1, 1e-12)
    expect(result).toMatchObject({ scale: 1, secondaryScale: 1, rank: 2, nullity: 1, damping: 0, saturated: [], secondaryRates: [0, 0, 0], diagnosis: [] })
  })

  it('damped loses the published part (METHODS.md section 7)', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: { method: 'damped', damping: 0.1 } })
    expectClose(result.rates, [0.016065653, -0.0459218829, -0.0518023200], 1e-10)
    expectClose(result.achievedTwist!.slice(0, 2), [0.0994819768, -0.0010148512], 1e-10)
    expectClose(result.residual!.slice(0, 2), [0.0994819768 - 0.1, -0.0010148512], 1e-10)
    expect(result.damping).toBe(0.1)
    expect(codes(result)).toContain('near-singular')
  })

  it('damped by nothing is the truncated one', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: { method: 'damped', damping: 0 } })
    expectClose(result.rates, [0.017152285, -0.046860914, -0.053139086], 1e-10)
  })

  it('is adaptive-damped when left out, which damps only near a singular pose', async () => {
    expectClose((await resultOf('joint-rates', 'trainer-3r', at)).rates, [0.017152285, -0.046860914, -0.053139086], 1e-10)
    // Smallest singular value under the threshold of 0.02: lambda² = (1 - (sigma / 0.02)²) 0.05² (METHODS.md section 8).
    const near = await resultOf('joint-rates', 'trainer-3r', { ...at, configurations: [[0.3, 0.01, 0.01]] })
    const sigma = near.singularValues![1]!
    expect(sigma).toBeLessThan(0.02)
    expectClose(near.damping!, Math.sqrt(1 - (sigma / 0.02) ** 2) * 0.05, 1e-12)
    const explicit = await resultOf('joint-rates', 'trainer-3r', { ...at, configurations: [[0.3, 0.01, 0.01]], inverse: { method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 } })
    expect(explicit).toEqual(near)
  })

  it('ignores what lies outside the task', async () => {
    const wild = await resultOf('joint-rates', 'trainer-3r', { ...at, twists: [[0.1, 0, 9, 9, 9, 9]] })
    expect(wild).toEqual(await resultOf('joint-rates', 'trainer-3r', at))
  })

  it('takes the twist in the frame of the task', async () => {
    // At 30°, 30°, 30° the tool points along y of the base, so minus its y is base x.
    const tip = await resultOf('joint-rates', 'trainer-3r', { ...at, task: { ...PLANAR, frame: 'tip' }, twists: [[0, -0.1, 0, 0, 0, 0]] })
    expectClose(tip.rates, [0.017152285, -0.046860914, -0.053139086], 1e-10)
    expectClose(tip.achievedTwist!.slice(0, 2), [0, -0.1], 1e-12)
  })

  it('answers in the units of the question', async () => {
    const shop = await resultOf('joint-rates', 'trainer-3r', {
      units: { length: 'mm', angle: 'deg' }, configurations: [[30, 30, 30]], task: PLANAR, twists: [[100, 0, 0, 0, 0, 0]], inverse: TRUNCATED,
    })
    expectClose(shop.rates, [0.017152285, -0.046860914, -0.053139086].map((value) => (value * 180) / Math.PI), 1e-8)
    expectClose(shop.toolSpeed!, 100, 1e-9)
    expectClose(shop.achievedTwist![5]!, ((0.017152285 - 0.046860914 - 0.053139086) * 180) / Math.PI, 1e-8)
    // Singular values and manipulability stay SI and unscaled, whatever the characteristic length.
    const scaled = await resultOf('joint-rates', 'trainer-3r', { ...at, characteristicLength: 5 })
    expectClose(scaled.singularValues, [3.4438944967, 0.5794334462], 1e-9)
    expectClose(scaled.manipulability!, 1.9955076567, 1e-9)
  })
})

describe('secondary objectives', () => {
  const posture = (values: readonly number[], gain: number) => ({ objective: 'posture', posture: values, gain })

  it('posture moves within the null space (METHODS.md section 9)', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, secondary: [posture([0, 0, 0], 1)] })
    expectClose(result.rates, [-0.0157201469, 0.0429482401, -0.1429482401], 1e-10)
    expectClose(result.secondaryRates, [-0.0328724319, 0.0898091541, -0.0898091541], 1e-10)
    expectClose(result.achievedTwist!.slice(0, 2), [0.1, 0], 1e-12)
  })

  it('mid-range follows its gradient through the projector', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, secondary: [{ objective: 'mid-range', gain: 2 }] })
    // -(1/n)(q - middle)/(range)², projected on the unit null vector of METHODS.md section 6. Ranges 6.2, 5.6, 5.6 rad, middles 0.
    const gradient = [6.2, 5.6, 5.6].map((range) => (-2 / 3) * (Math.PI / 6 / range ** 2))
    const n = [0.2505628071, -0.6845503194, 0.6845503194]
    const along = gradient.reduce((sum, value, i) => sum + value * n[i]!, 0)
    expectClose(result.secondaryRates, n.map((value) => along * value), 1e-10)
  })

  it('add up', async () => {
    const of = async (secondary: object[]) => (await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, secondary })).secondaryRates!
    const [one, two, both] = [await of([posture([0, 0, 0], 1)]), await of([{ objective: 'mid-range', gain: 3 }]), await of([posture([0, 0, 0], 1), { objective: 'mid-range', gain: 3 }])]
    expectClose(both, one.map((value, i) => value + two[i]!), 1e-12)
  })
})

describe('rate limits', () => {
  let slow: string
  beforeAll(async () => {
    const text = sample('trainer-3r.urdf').toString().replaceAll(/velocity="[^"]+"/g, 'velocity="0.3"')
    slow = (await importModel('Slow trainer', text)).model.slug
  })
  const fast = { ...at, twists: [[1, 0, 0, 0, 0, 0]], inverse: TRUNCATED }
  const J_PLUS = [0.1715228496, -0.4686091399, -0.5313908601]

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
    const result = await resultOf('joint-rates', slow, { ...fast, limits: { rates: 'report' } })
    expectClose(result.rates, J_PLUS, 1e-9)
    expect([result.scale, result.secondaryScale]).toEqual([1, 1])
  })

  it('are tightened by the derating', async () => {
    const { scale } = await resultOf('joint-rates', slow, { ...fast, limits: { derating: 0.5 } })
    expectClose(scale!, 0.5645561911 / 2, 1e-9)
  })

  it('starve the objectives before they slow the tool', async () => {
    const secondary = [{ objective: 'posture', posture: [0, 0, 0], gain: 100 }]
    const result = await resultOf('joint-rates', slow, { ...at, inverse: TRUNCATED, secondary })
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

describe('at a singular pose (METHODS.md section 18)', () => {
  const straight = { configurations: [[0, 0, 0]], task: PLANAR, twists: [[-0.1, 0, 0, 0, 0, 0]] }

  it.each([TRUNCATED, { method: 'damped', damping: 0.05 }, undefined])('says which direction is lost with the inverse %o, and not only zero', async (inverse) => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...straight, ...(inverse && { inverse }) })
    expect(result.rates).toEqual([0, 0, 0])
    expectClose(result.residual, [0.1, 0, 0, 0, 0, 0], 1e-12)
    const [first] = result.diagnosis!
    expect(first).toMatchObject({ code: 'direction-lost', direction: [1, 0, 0, 0, 0, 0], detail: expect.stringMatching(/along x .*add a posture objective/) })
  })

  it('says that a posture frees the arm, and turns it that way', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...straight, inverse: TRUNCATED, secondary: [{ objective: 'posture', posture: [0.3, -0.6, 0.3], gain: 1 }] })
    expectClose(result.secondaryRates, [0.3, -0.6, 0.3], 1e-12)
    expect(result.diagnosis![0]).toMatchObject({ code: 'direction-lost', detail: expect.stringContaining('the spare freedom is moving the arm out of it') })
  })

  it('says nothing of a direction that was not asked for', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { ...straight, twists: [[0, 0.1, 0, 0, 0, 0]] })
    expect(codes(result)).not.toContain('direction-lost')
    expectClose(result.achievedTwist!.slice(0, 2), [0, 0.1], 1e-3)
  })

  it('has something to say to the smallest wish there is', async () => {
    const result = await resultOf('joint-rates', 'trainer-3r', { configurations: [[0.2, 0.3, 0.4]], task: { components: ['wy'] }, twists: [[0, 0, 0, 0, 5e-324, 0]] })
    expect(result.rates).toEqual([0, 0, 0])
    for (const { direction } of result.diagnosis!) expect(direction ?? []).not.toContain(null)
  })
})

describe('joint limits', () => {
  it('are named where a joint is driven outward at one, or stands outside', async () => {
    const task = { components: ['wz'] }
    const turn = async (elbow: number, wz: number) => (await resultOf('joint-rates', 'trainer-3r', { configurations: [[0.5, elbow, 0.5]], task, twists: [[0, 0, 0, 0, 0, wz]] })).diagnosis
    expect(await turn(2.8, 0.1)).toMatchObject([{ code: 'at-limit', joint: 'elbow' }])
    expect(await turn(2.8, -0.1)).toEqual([])
    expect(await turn(2.9, 0.1)).toMatchObject([{ code: 'outside-limits', joint: 'elbow', detail: expect.stringContaining('further out') }])
    expect(await turn(2.9, -0.1)).toMatchObject([{ code: 'outside-limits', joint: 'elbow', detail: expect.stringContaining('moving back') }])
  })
})

describe('a reference', () => {
  const tip = { position: [1.3660254037844386, 2.3660254037844384, 0], quaternion: [0, 0, Math.SQRT1_2, Math.SQRT1_2] }

  it('becomes feed-forward plus gain times error', async () => {
    const pose = { ...tip, position: [tip.position[0]! + 0.05, tip.position[1]!, 0] }
    const closed = await resultOf('joint-rates', 'trainer-3r', { configurations: [BENT], task: PLANAR, inverse: TRUNCATED, references: [{ pose, twist: [0.02, 0, 0, 0, 0, 0], gains: { position: 1.6 } }] })
    // 0.02 + 1.6 * 0.05 = 0.1 m/s along x.
    expectClose(closed.rates, [0.017152285, -0.046860914, -0.053139086], 1e-9)
  })

  it('turns the short way round, with gain 1 when none is given', async () => {
    const half = (degrees: number) => (degrees * Math.PI) / 360
    const pose = { ...tip, quaternion: [0, 0, -Math.sin(half(110)), -Math.cos(half(110))] }
    const { achievedTwist } = await resultOf('joint-rates', 'trainer-3r', { configurations: [BENT], task: { components: ['wz'] }, references: [{ pose }] })
    expectClose(achievedTwist![5]!, (20 * Math.PI) / 180, 1e-9)
  })

  it('at the pose asks for nothing', async () => {
    const { rates } = await resultOf('joint-rates', 'trainer-3r', { configurations: [BENT], task: PLANAR, references: [{ pose: tip }] })
    expectClose(rates, [0, 0, 0], 1e-14)
  })
})
