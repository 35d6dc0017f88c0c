import { describe, expect, it } from 'vitest'
import { commonGround } from '@/lib/compute/comparison/common-ground'
import { matchElements } from '@/lib/compute/comparison/match-elements'
import { tipEffect } from '@/lib/compute/comparison/tip-effect'
import { finishInSlices } from '@/lib/in-slices'
import { compileChain } from '@/lib/urdf/compile-chain'
import type { Description } from '@/lib/urdf/description'
import { planarArm } from './describe-robot'

/** The effect between two descriptions at their tips, with what they had in common. */
async function effectOf(fromDescription: Description, toDescription: Description) {
  const { joints } = await finishInSlices(matchElements(fromDescription, toDescription))
  const from = compileChain(fromDescription)
  const to = compileChain(toDescription)
  const ground = commonGround(from, to, joints)
  return { ground, effect: await tipEffect(from, to, ground) }
}

const armWith = (change: object, joint = 2, lengths: readonly number[] = [1, 1]) => planarArm(lengths, (at) => (at === joint ? change : {}))

describe('the effect of a longer link of a planar arm', () => {
  it('is a move by the difference at every configuration, and no turn', async () => {
    // Closed form: the tip is Σ lᵢ·(cos φᵢ, sin φᵢ), so one longer link moves it by the difference, whatever the joints.
    const { effect } = await effectOf(planarArm([1, 0.8, 0.3]), planarArm([1, 0.8125, 0.3]))
    expect(effect.samples).toBe(2000)
    for (const measure of ['max', 'mean', 'p95'] as const) expect(effect.translation[measure]).toBeCloseTo(0.0125, 14)
    expect(effect.rotation).toEqual({ max: 0, mean: 0, p95: 0 })
  })

  it('with two longer links moves by |a + b·e^(iq)|, which is largest at the configuration named', async () => {
    // Closed form: a along φ₁ and b along φ₁ + q₂ add up to a length that depends on q₂ alone.
    const [a, b] = [0.003, 0.004]
    const { effect } = await effectOf(planarArm([1, 1]), planarArm([1 + a, 1 + b]))
    const length = (q: number) => Math.hypot(a + b * Math.cos(q), b * Math.sin(q))
    const worst = effect.translation.worst!
    expect(effect.translation.max).toBeCloseTo(length(worst[1]!), 14)
    // Of 2 000 elbows within ±2 rad the nearest to 0 is a thousandth away, where the cosine has lost 1e-6.
    expect(effect.translation.max).toBeGreaterThan(a + b - 1e-7)
    // The mean over a uniform q₂ in [−2, 2], by Simpson's rule.
    const steps = 2000
    const weight = (i: number) => (i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2)
    const mean = Array.from({ length: steps + 1 }, (_, i) => weight(i) * length(-2 + (4 * i) / steps)).reduce((sum, value) => sum + value, 0) / (3 * steps)
    expect(Math.abs(effect.translation.mean - mean)).toBeLessThan(3e-5)
    // 95 % of the elbows have |q₂| over 0.1.
    expect(Math.abs(effect.translation.p95 - length(0.1))).toBeLessThan(3e-6)
  })

  it('is the same to the last bit when asked again', async () => {
    const ask = () => effectOf(planarArm([1, 0.8]), planarArm([1.01, 0.79]))
    expect((await ask()).effect).toEqual((await ask()).effect)
  })
})

describe('what is compared', () => {
  it('stays within the limits that both have', async () => {
    const { ground, effect } = await effectOf(armWith({ lower: -1, upper: 1.5 }), armWith({ lower: -0.5, upper: 2 }, 2, [1, 1.1]))
    expect(ground.joints[1]).toMatchObject({ lower: -0.5, upper: 1.5 })
    expect(effect.translation.worst![1]!).toBeGreaterThanOrEqual(-0.5)
  })

  it('takes a bound where one side has none', async () => {
    const { ground } = await effectOf(armWith({ type: 'continuous' }), armWith({ lower: -0.5, upper: 2 }))
    expect(ground.joints[1]).toMatchObject({ type: 'revolute', lower: -0.5, upper: 2 })
    expect((await effectOf(armWith({ type: 'continuous' }), armWith({ type: 'continuous' }))).ground.joints[1]).toMatchObject({ type: 'continuous', lower: null, upper: null })
  })

  it('lets a joint stand at 0 that only one revision has', async () => {
    const { ground, effect } = await effectOf(armWith({ type: 'fixed' }), planarArm([1, 1]))
    expect(ground.held).toEqual([{ joint: 'j2', in: 'to', quantity: 'angle', value: 0 }])
    expect(ground.joints.map(({ name }) => name)).toEqual(['j1'])
    expect(effect.translation.max).toBe(0)
    expect((await effectOf(planarArm([1, 1]), armWith({ type: 'fixed' }))).ground.held).toEqual([{ joint: 'j2', in: 'from', quantity: 'angle', value: 0 }])
  })

  it('lets a joint stand at 0 on both sides that turns in one and slides in the other', async () => {
    const { ground } = await effectOf(planarArm([1, 1]), armWith({ type: 'prismatic' }))
    expect(ground.held).toEqual([
      { joint: 'j2', in: 'to', quantity: 'length', value: 0 },
      { joint: 'j2', in: 'from', quantity: 'angle', value: 0 },
    ])
  })

  it('lets a joint stand in the middle of the gap between ranges that do not meet', async () => {
    const { ground } = await effectOf(armWith({ lower: -2, upper: -1 }), armWith({ lower: 0.5, upper: 2 }))
    expect(ground.held).toEqual([{ joint: 'j2', in: 'both', quantity: 'angle', value: -0.25 }])
  })

  it('moves a renamed joint on both sides', async () => {
    const { ground, effect } = await effectOf(planarArm([1, 1]), armWith({ name: 'elbow' }))
    expect(ground.held).toEqual([])
    expect([ground.joints.map(({ name }) => name), ground.former]).toEqual([['j1', 'elbow'], ['j1', 'j2']])
    expect(effect.translation).toEqual({ max: 0, mean: 0, p95: 0 })
  })

  it('is one configuration where nothing moves', async () => {
    const still = (length: number) => armWith({ type: 'fixed' }, 1, [length])
    const { effect } = await effectOf(still(1), still(1.25))
    expect(effect).toMatchObject({ samples: 1, translation: { max: 0.25, mean: 0.25, p95: 0.25, worst: [] } })
  })
})
