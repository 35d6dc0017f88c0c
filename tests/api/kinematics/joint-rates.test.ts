import { describe, expect, it } from 'vitest'
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

  it('filtered damps only the direction that vanishes (METHODS.md section 8)', async () => {
    // The arm without its last joint, its tool where that joint's link would end: two links of 1 m.
    const [q1, q2] = [0.3, 0.01]
    const twoLinks = { chain: { tip: 'middle_link' }, tool: { position: [1, 0, 0], quaternion: [0, 0, 0, 1] }, configurations: [[q1, q2]], task: PLANAR, limits: { rates: 'report' } }
    const ask = (direction: readonly number[], inverse: object) => resultOf('joint-rates', 'trainer-3r', { ...twoLinks, twists: [[...direction, 0, 0, 0, 0]], inverse })
    // The axes of the ellipse of J·Jᵀ in closed form.
    const [a, b, c, d] = [-Math.sin(q1) - Math.sin(q1 + q2), -Math.sin(q1 + q2), Math.cos(q1) + Math.cos(q1 + q2), Math.cos(q1 + q2)]
    const angle = Math.atan2(2 * (a * c + b * d), a * a + b * b - c * c - d * d) / 2
    const [strong, weak] = [[Math.cos(angle), Math.sin(angle)], [-Math.sin(angle), Math.cos(angle)]]

    const filtered = { method: 'filtered', threshold: 0.02, damping: 0.1 }
    const [whole, held] = [await ask(strong, filtered), await ask(weak, filtered)]
    expectClose([whole, held].map(({ rates }) => Math.hypot(...rates!)), [0.447218962, 0.446318879], 1e-9)
    expectClose(whole.residual!.slice(0, 2), [0, 0], 1e-12)
    expectClose([whole.damping!, held.damping!], [0.1, 0.1], 1e-15)
    expect(codes(held)).toEqual(['direction-lost', 'near-singular'])
    // An adaptive damping as large takes off the other direction too.
    const adaptive = await ask(strong, { method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.1 })
    expect(Math.hypot(...adaptive.residual!.slice(0, 2))).toBeGreaterThan(1e-3)
    // From the threshold on nothing is damped, and the whole of it is delivered.
    const undamped = await ask(weak, { method: 'filtered', threshold: 0.004, damping: 0.1 })
    expect(undamped.damping).toBe(0)
    expectClose(undamped.achievedTwist!.slice(0, 2), weak, 1e-9)
  })

  it('weighted moves the dear joints less and costs the task nothing (METHODS.md section 11)', async () => {
    const jointWeights = [1, 2, 4]
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, jointWeights })
    expectClose(result.rates, [0.0238687264, -0.0652105733, -0.0347894267], 1e-10)
    expectClose(result.residual, [0, 0, 0, 0, 0, 0], 1e-12)
    const cost = (rates: readonly number[]) => Math.sqrt(rates.reduce((sum, rate, i) => sum + jointWeights[i]! * rate * rate, 0))
    expectClose(cost(result.rates!), 0.1179651, 1e-7)
    expectClose(cost((await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED })).rates!), 0.1264165, 1e-7)
    // Weights are SI: those of an angle in degrees stay what they are.
    const shop = await resultOf('joint-rates', 'trainer-3r', { ...at, units: { angle: 'deg' }, configurations: [[30, 30, 30]], inverse: TRUNCATED, jointWeights })
    expectClose(shop.rates, result.rates!.map((rate) => (rate * 180) / Math.PI), 1e-10)
  })

  it('weighted takes its projector from the weights: what the objectives ask stays out of the task', async () => {
    const secondary = [{ objective: 'posture', posture: [0, 0, 0], gain: 1 }]
    const { secondaryRates, achievedTwist } = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, jointWeights: [1, 2, 4], secondary })
    // Along n; of all those the nearest to −q in the weights, so that Σ w·n·(−q − secondary) = 0. n is that of METHODS.md section 6.
    const n = [0.2505628071, -0.6845503194, 0.6845503194]
    const along = (vector: readonly number[]) => [1, 2, 4].reduce((sum, weight, i) => sum + weight * n[i]! * vector[i]!, 0)
    const part = along(BENT.map((value) => -value)) / along(n)
    expectClose(secondaryRates, n.map((value) => part * value), 1e-9)
    expectClose(achievedTwist!.slice(0, 2), [0.1, 0], 1e-12)
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

  it('manipulability climbs its gradient within the null space (METHODS.md section 9)', async () => {
    const secondary = [{ objective: 'manipulability', gain: 2 }]
    const result = await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, secondary })
    const gradient = [0, 1.2773882858, 1.4943820425]
    const n = [0.2505628071, -0.6845503194, 0.6845503194]
    const along = 2 * gradient.reduce((sum, value, i) => sum + value * n[i]!, 0)
    expectClose(result.secondaryRates, n.map((value) => along * value), 1e-9)
    expectClose(result.achievedTwist!.slice(0, 2), [0.1, 0], 1e-12)
    // A gain is SI: the same motion, written in degrees.
    const shop = await resultOf('joint-rates', 'trainer-3r', { ...at, units: { angle: 'deg' }, configurations: [[30, 30, 30]], inverse: TRUNCATED, secondary })
    expectClose(shop.secondaryRates, result.secondaryRates!.map((rate) => (rate * 180) / Math.PI), 1e-10)
  })

  it('manipulability asks for nothing where it is 0 and has no gradient', async () => {
    const { secondaryRates } = await resultOf('joint-rates', 'trainer-3r', { ...at, configurations: [[0.3, 0, 0]], secondary: [{ objective: 'manipulability', gain: 5 }] })
    expect(secondaryRates).toEqual([0, 0, 0])
  })

  it('add up', async () => {
    const of = async (secondary: object[]) => (await resultOf('joint-rates', 'trainer-3r', { ...at, inverse: TRUNCATED, secondary })).secondaryRates!
    const [one, two, both] = [await of([posture([0, 0, 0], 1)]), await of([{ objective: 'mid-range', gain: 3 }]), await of([posture([0, 0, 0], 1), { objective: 'mid-range', gain: 3 }])]
    expectClose(both, one.map((value, i) => value + two[i]!), 1e-12)
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

  it('is warned of from gain times period 2 on, where the loop no longer settles', async () => {
    const loop = async (gains: object, limits: object, task: object = PLANAR) =>
      codes(await resultOf('joint-rates', 'trainer-3r', { configurations: [BENT], task, references: [{ pose: tip, gains }], limits }))
    const every = { dt: 0.01 }
    expect(await loop({ position: 200 }, every)).toEqual(['gain-too-high'])
    expect(await loop({ position: 199 }, every)).toEqual([])
    expect(await loop({ position: 1e9 }, {})).toEqual([])
    // The gain of what the task does not ask for closes no loop.
    expect(await loop({ orientation: 200 }, every)).toEqual([])
    expect(await loop({ orientation: 200 }, every, { components: ['vx', 'wz'] })).toEqual(['gain-too-high'])
    expect(await loop({ position: 200, orientation: 1 }, every, { components: ['wz'] })).toEqual([])
    // A twist is no loop at all.
    expect(codes(await resultOf('joint-rates', 'trainer-3r', { ...at, limits: { dt: 1000 } }))).toEqual([])
  })

  it('at the pose asks for nothing', async () => {
    const { rates } = await resultOf('joint-rates', 'trainer-3r', { configurations: [BENT], task: PLANAR, references: [{ pose: tip }] })
    expectClose(rates, [0, 0, 0], 1e-14)
  })
})
