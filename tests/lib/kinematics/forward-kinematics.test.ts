import { all, create } from 'mathjs'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { motionAxis } from '@/lib/kinematics/motion-axis'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { invertTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import { quaternionOf } from '@/lib/math/quaternion'
import { arm, at, golden, GOLDEN_POSE, numbers, planar, rad, randomArm, randomPose, screwArm, sixAxis, transform } from './arms'
import { expectClose } from './expect-close'

const math = create(all ?? {})

function poseOf(chain: Chain, q: ArrayLike<number>, tool?: ArrayLike<number>) {
  const t = at(chain, q, tool).baseFromTool
  return { p: [t[3]!, t[7]!, t[11]!], r: [0, 1, 2, 4, 5, 6, 8, 9, 10].map((i) => t[i]!), quaternion: quaternionOf(t) }
}

describe('forwardKinematics', () => {
  it('FK3 places a planar 2R arm where its closed form does', () => {
    expectClose(poseOf(planar([0.4, 0.3]), rad(30, 60)).p, [0.3464101615, 0.5, 0], 1e-10)
  })

  it('FK4 places a planar 3R arm where its closed form does', () => {
    const { p, r } = poseOf(planar([1, 1, 1]), rad(30, 30, 30))
    expectClose(p, [1.3660254038, 2.3660254038, 0], 1e-10)
    expectClose(r, [0, -1, 0, 1, 0, 0, 0, 0, 1], 1e-15)
  })

  it('FK5 gives the start pose of the closed-loop example of Siciliano et al. 2009, chapter 3 (example from memory)', () => {
    const { p, r } = poseOf(planar([0.5, 0.5, 0.5]), [Math.PI, -Math.PI / 2, -Math.PI / 2])
    expectClose(p, [0, 0.5, 0], 1e-15)
    expectClose(r, [1, 0, 0, 0, 1, 0, 0, 0, 1], 1e-15)
  })

  it('FK6 gives the pose of the space-screw example in the code library of Lynch & Park 2017, a screw with pitch among them', () => {
    const chain = screwArm(
      [
        [0, 0, 1, 4, 0, 0],
        [0, 0, 0, 0, 1, 0],
        [0, 0, -1, -6, 0, -0.1],
      ].map((s) => s as [number, number, number, number, number, number]),
      [-1, 0, 0, 0, 0, 1, 0, 6, 0, 0, -1, 2],
    )
    // The second screw only slides: its axis is its linear part.
    const sliding: Chain = {
      ...chain,
      motions: chain.motions.map((motion) => (motion.joint === 1 ? { ...motion, rotary: false, axis: [0, 1, 0] } : motion)),
    }
    expect(chain.motions.map((motion) => [motion.rotary, motion.multiplier])).toContainEqual([false, 0.1])
    const { p, r } = poseOf(sliding, [Math.PI / 2, 3, Math.PI])
    expectClose(p, [-5, 4, 1.68584073], 1e-8)
    expectClose(r, [0, 1, 0, 1, 0, 0, 0, 0, -1], 1e-14)
  })

  it('FK7 gives the pose of the six-axis example of Lynch & Park 2017, chapter 4 (example from memory)', () => {
    const { p, r } = poseOf(sixAxis(), [0, -Math.PI / 2, 0, 0, Math.PI / 2, 0])
    expectClose(p, [0.095, 0.109, 0.988], 1e-14)
    expectClose(r, [0, -1, 0, 1, 0, 0, 0, 0, 1], 1e-14)
  })

  it('FK8 gives the golden pose of the 7R arm', () => {
    const { p, r, quaternion } = poseOf(golden(), GOLDEN_POSE)
    expectClose(p, [0.039212607, -0.04363621, 1.025326241], 1e-9)
    expectClose(
      r,
      [-0.856944989, -0.508820984, -0.082137029, 0.354713617, -0.697847245, 0.622243901, -0.373929853, 0.50409367, 0.778502432],
      1e-9,
    )
    expectClose(quaternion, [-0.124899784, 0.308462036, 0.912865635, 0.236490062], 1e-9)
  })

  it('FK9 takes the direction of an axis and not its length', () => {
    expect(poseOf(arm([{ axis: [0, 0, 2] }]), [0.3]).r[0]).toBeCloseTo(0.9553364891, 10)
  })

  it('agrees with the product of matrix exponentials of mathjs', () => {
    // The home pose of each motion gives its screw; the exponential series of mathjs shares nothing with ours.
    for (let seed = 1; seed <= 20; seed++) {
      const chain = randomArm(seed)
      const q = randomPose(chain, seed)
      let expected = math.matrix(square(chain.constants[0]!))
      chain.motions.forEach((motion, i) => {
        const length = Math.sqrt(motion.axis.reduce((sum, a) => sum + a * a, 0))
        const [x, y, z] = motion.axis.map((a) => a / length) as [number, number, number]
        const moved = motion.multiplier * q[motion.joint]! + motion.offset
        const generator = motion.rotary
          ? [
              [0, -z, y, 0],
              [z, 0, -x, 0],
              [-y, x, 0, 0],
              [0, 0, 0, 0],
            ]
          : [
              [0, 0, 0, x],
              [0, 0, 0, y],
              [0, 0, 0, z],
              [0, 0, 0, 0],
            ]
        const step = math.expm(math.multiply(math.matrix(generator), moved))
        expected = math.multiply(math.multiply(expected, step), math.matrix(square(chain.constants[i + 1]!)))
      })
      const rows = (expected.toArray() as number[][]).slice(0, 3).flat()
      expectClose(Array.from(at(chain, q).baseFromTip), rows, 1e-9)
    }
  })

  it('moves a mimic joint as if its value had been written out', () => {
    const folded = arm(
      [{ xyz: [0, 0, 0] }, { xyz: [1, 0, 0] }, { xyz: [1, 0, 0], mimic: { joint: 1, multiplier: 2, offset: 0.1 } }],
      transform([1, 0, 0]),
    )
    expect(folded.joints).toHaveLength(2)
    const { p, r } = poseOf(folded, [0.3, 0.4])
    expectClose(p, [1.6909791541, 1.9393114969, 0], 1e-10)
    expectClose(r, poseOf(planar([1, 1, 1]), [0.3, 0.4, 0.9]).r, 1e-15)
  })

  it('keeps a proper rotation over 5000 joints', () => {
    const random = numbers(7)
    const chain = arm(
      Array.from({ length: 5000 }, () => ({
        xyz: [0.01, 0, 0.02] as const,
        rpy: [random(), random(), random()] as const,
        axis: [random() - 0.5, 1, random()] as const,
      })),
    )
    const t = at(
      chain,
      chain.joints.map(() => 6 * random() - 3),
    ).baseFromTip
    for (let a = 0; a < 3; a++) {
      for (let b = 0; b < 3; b++) {
        const dot = [0, 4, 8].reduce((sum, row) => sum + t[row + a]! * t[row + b]!, 0)
        expect(dot).toBeCloseTo(a === b ? 1 : 0, 11)
      }
    }
  })

  it('applies the tool after the tip, and forgets it when none is given', () => {
    const chain = golden()
    const tool = transform([0.1, -0.2, 0.3], [0.4, 0.5, 0.6])
    const work = at(chain, GOLDEN_POSE, tool)
    const expected = new Float64Array(12)
    multiplyTransforms(work.baseFromTip, 0, tool, 0, expected, 0)
    expect(Array.from(work.baseFromTool)).toEqual(Array.from(expected))
    forwardKinematics(chain, GOLDEN_POSE, work)
    expect(Array.from(work.baseFromTool)).toEqual(Array.from(work.baseFromTip))
  })

  it('gives the inverse pose for the chain read from tip to base', () => {
    for (let seed = 1; seed <= 20; seed++) {
      const chain = randomArm(seed)
      const q = randomPose(chain, seed)
      const reversed: Chain = {
        ...chain,
        motions: [...chain.motions]
          .reverse()
          .map((motion) => ({ ...motion, axis: motion.axis.map((a) => -a) as [number, number, number] })),
        constants: [...chain.constants].reverse().map((constant) => {
          const inverse = new Float64Array(12)
          invertTransform(constant, inverse)
          return Array.from(inverse)
        }),
      }
      const expected = new Float64Array(12)
      invertTransform(at(chain, q).baseFromTip, expected)
      expectClose(Array.from(at(reversed, q).baseFromTip), Array.from(expected), 1e-12)
    }
  })

  it('leaves the axis of each motion: its direction and a point on it', () => {
    expect(motionAxis(at(golden(), GOLDEN_POSE), 0)).toEqual({ along: [0, 0, 1], point: [0, 0, 0.3] })
  })

  it('stays finite for joint values of a thousand million', () => {
    const chain = arm([{ type: 'prismatic' }, { axis: [1, 1, 0] }, { axis: [0, 1, 0] }], transform([1, 0, 0]))
    expect(Array.from(at(chain, [1e9, -1e9, 1e9]).baseFromTip).every(Number.isFinite)).toBe(true)
  })

  it('gives the same bits for the same question, whatever the workspace did before', () => {
    const chain = randomArm(11)
    const work = createWorkspace(chain)
    forwardKinematics(chain, randomPose(chain, 1), work, transform([1, 2, 3], [1, 2, 3]))
    forwardKinematics(chain, randomPose(chain, 2), work)
    expect(work.baseFromTool).toEqual(at(chain, randomPose(chain, 2)).baseFromTool)
  })

  it('refuses a configuration of another length and a workspace of another chain', () => {
    const chain = planar([1, 1])
    expect(() => at(chain, [0])).toThrow('2 joint values are needed, 1 were given')
    expect(() => forwardKinematics(chain, [0, 0], createWorkspace(planar([1, 1])))).toThrow('another chain')
  })

  it('computes a chain that only holds fixed joints', () => {
    const chain: Chain = { base: 'a', tip: 'b', joints: [], motions: [], constants: [transform([1, 2, 3])] }
    expectClose(Array.from(at(chain, []).baseFromTip), transform([1, 2, 3]), 1e-15)
  })
})

function square(t: readonly number[]): number[][] {
  return [t.slice(0, 4), t.slice(4, 8), t.slice(8, 12), [0, 0, 0, 1]]
}
