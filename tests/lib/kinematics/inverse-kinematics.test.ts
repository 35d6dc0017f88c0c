import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { inverseKinematics, inverseKinematicsInSteps } from '@/lib/kinematics/inverse-kinematics'
import { DEFAULT_SEARCH, type FoundPose, type PoseSearch } from '@/lib/kinematics/pose-search'
import { createTask } from '@/lib/kinematics/task'
import { rotationVectorOf } from '@/lib/math/rotation-vector'
import { arm, at, golden, GOLDEN_POSE, planar, rad, sixAxis, transform, turnSlideScrew } from './arms'
import { expectClose } from './expect-close'

const PLACE = createTask(['vx', 'vy'])

function find(chain: Chain, goal: ArrayLike<number>, wish: Partial<PoseSearch> = {}, seed?: ArrayLike<number>): FoundPose {
  return inverseKinematics(chain, createWorkspace(chain), goal, { task: createTask(), ...DEFAULT_SEARCH, ...wish }, seed)
}

/** The golden arm with the limits of a real one. */
function limited(): Chain {
  const chain = golden()
  const half = [2.9, 2, 2.9, 2.6, 2.9, 2, 3]
  return { ...chain, joints: chain.joints.map((joint, i) => ({ ...joint, lower: -half[i]!, upper: half[i]! })) }
}

describe('inverseKinematics', () => {
  it('finds a configuration, within the limits, for every pose that some configuration has', () => {
    const chain = limited()
    const reached = fc.tuple(...chain.joints.map(({ lower, upper }) => fc.double({ min: lower! * 0.95, max: upper! * 0.95, noNaN: true })))
    fc.assert(
      fc.property(reached, (q) => {
        const goal = Array.from(at(chain, q).baseFromTip)
        const found = find(chain, goal, { attempts: 16 })
        expect(found.converged, JSON.stringify(found)).toBe(true)
        const t = at(chain, found.configuration).baseFromTip
        expectClose(t, goal, 2e-6)
        found.configuration.forEach((value, i) => expect(Math.abs(value)).toBeLessThanOrEqual(chain.joints[i]!.upper!))
        expect(found.reason).toBeUndefined()
      }),
      { seed: 14, numRuns: 60 },
    )
  })

  it('stays near its seed: a goal a little off is reached in a few steps and a little motion', () => {
    const chain = limited()
    const goal = at(chain, GOLDEN_POSE.map((value) => value + 0.05)).baseFromTip
    const { configuration, iterations, attempts, converged } = find(chain, goal, {}, GOLDEN_POSE)
    expect([converged, attempts]).toEqual([true, 1])
    expect(iterations).toBeLessThanOrEqual(5)
    configuration.forEach((value, i) => expect(Math.abs(value - GOLDEN_POSE[i]!)).toBeLessThan(0.2))
  })

  it('reaches the worked example of Lynch & Park 2017, whose answer lies within its tolerances of ours', () => {
    const chain = turnSlideScrew()
    const goal = [0, 1, 0, -5, 1, 0, 0, 4, 0, 0, -1, 1.6858]
    const found = find(chain, goal, { positionTolerance: 0.001, orientationTolerance: 0.01 }, [1.5, 2.5, 3])
    expect(found.converged).toBe(true)
    expectClose(found.configuration, [1.57073819, 2.999667, 3.14153913], 1e-3)
    const exact = find(chain, [0, 1, 0, -5, 1, 0, 0, 4, 0, 0, -1, 2 - 0.1 * Math.PI], {}, [1.5, 2.5, 3])
    expectClose(exact.configuration, [Math.PI / 2, 3, Math.PI], 1e-6)
  })

  it('reaches the goal of example 6.1 of Lynch & Park 2017 (from memory)', () => {
    const { configuration, converged } = find(planar([1, 1]), transform([0.366, 1.366, 0], [0, 0, (2 * Math.PI) / 3]), { positionTolerance: 1e-3, orientationTolerance: 1e-3 }, rad(0, 30))
    expect(converged).toBe(true)
    expectClose(configuration, rad(30, 90), 1e-3)
  })

  it('leaves free what the task leaves out: any turn about the axis of a symmetric tool will do', () => {
    const chain = sixAxis()
    const q = rad(20, -70, 80, -50, 60, 30)
    const task = createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip')
    const goal = at(chain, q).baseFromTip
    for (const seed of [rad(30, -60, 70, -40, 50, -140), rad(0, -80, 90, -60, 70, 160), rad(20, -70, 80, -50, 60, -149)]) {
      const found = find(chain, goal, { task }, seed)
      expect([found.converged, found.attempts]).toEqual([true, 1])
      const t = at(chain, found.configuration).baseFromTip
      expectClose([t[3]!, t[7]!, t[11]!, t[2]!, t[6]!, t[10]!], [goal[3]!, goal[7]!, goal[11]!, goal[2]!, goal[6]!, goal[10]!], 3e-6)
    }
  })

  it('turns the tool by nearly half a turn, the short way', () => {
    const chain = arm([{ axis: [0, 0, 1] }, { axis: [0, 1, 0] }, { axis: [1, 0, 0] }])
    const task = createTask(['wx', 'wy', 'wz'])
    const goal = transform([0, 0, 0], [0.3, 0.4, 3.1])
    const { converged, configuration } = find(chain, goal, { task }, [0, 0, 0])
    expect(converged).toBe(true)
    const t = at(chain, configuration).baseFromTip
    expectClose([0, 1, 2, 4, 5, 6, 8, 9, 10].map((i) => t[i]!), [0, 1, 2, 4, 5, 6, 8, 9, 10].map((i) => goal[i]!), 1e-5)
    expect(rotationVectorOf(t)).toHaveLength(3)
  })

  it('spends the freedom that is left on the objectives, without leaving the goal', () => {
    const chain = limited()
    const goal = Array.from(at(chain, GOLDEN_POSE).baseFromTip)
    // Along the golden self-motion, and a little off it.
    const along = [0.687, -0.136, 0.1, 0, -0.645, 0.208, -0.201]
    const posture = GOLDEN_POSE.map((value, i) => value + 0.6 * along[i]! + (i === 3 ? 0.1 : 0))
    const away = (q: readonly number[]) => Math.sqrt(q.reduce((sum, value, i) => sum + (value - posture[i]!) ** 2, 0))
    const plain = find(chain, goal, {}, GOLDEN_POSE)
    const spent = find(chain, goal, { secondary: [{ objective: 'posture', posture, gain: 1 }] }, GOLDEN_POSE)
    expect(spent.converged).toBe(true)
    expectClose(at(chain, spent.configuration).baseFromTip, goal, 2e-6)
    expect(away(spent.configuration)).toBeLessThan(0.4 * away(plain.configuration))
    // No further along the self-motion is nearer: the answer of a posture much like it is the same.
    const again = find(chain, goal, { secondary: [{ objective: 'posture', posture, gain: 5 }] }, spent.configuration)
    expectClose(again.configuration, spent.configuration, 1e-3)
  })

  it('keeps the limits while it spends', () => {
    const chain = planar([1, 1, 1], { lower: -1, upper: 1 })
    const goal = at(chain, [0.2, 0.5, 0.6]).baseFromTip
    const found = find(chain, goal, { task: PLACE, secondary: [{ objective: 'posture', posture: [9, -9, 9], gain: 1 }] }, [0.2, 0.5, 0.6])
    expect(found.converged).toBe(true)
    found.configuration.forEach((value) => expect(Math.abs(value)).toBeLessThanOrEqual(1))
    expect(Math.max(...found.configuration.map(Math.abs))).toBeGreaterThan(0.99)
  })

  it('says unreachable of a goal beyond the arm, with the configuration that comes nearest', () => {
    const found = find(planar([1, 1]), transform([3, 0, 0]), { task: PLACE }, [0.3, 0.4])
    expect(found).toMatchObject({ converged: false, reason: 'unreachable' })
    expect(found.positionError).toBeCloseTo(1, 4)
    const inside = find(planar([2, 0.5]), transform([0.5, 0, 0]), { task: PLACE }, [0.3, 0.4])
    expect(inside).toMatchObject({ converged: false, reason: 'unreachable' })
    expect(inside.positionError).toBeCloseTo(1, 4)
  })

  it('says at-limits where limits are in the way', () => {
    const chain = planar([1, 1], { lower: -0.5, upper: 0.5 })
    const found = find(chain, transform([0, 1.2, 0]), { task: PLACE }, [0.1, 0.1])
    expect(found).toMatchObject({ converged: false, reason: 'at-limits' })
    expect(Math.max(...found.configuration.map(Math.abs))).toBe(0.5)
  })

  it('says stalled where the steps run out', () => {
    expect(find(golden(), at(golden(), GOLDEN_POSE).baseFromTip, { attempts: 1, iterations: 2 })).toMatchObject({ converged: false, reason: 'stalled', iterations: 2, attempts: 1 })
  })

  it('gets out of the stretched pose, from which no step leads towards the base', () => {
    const found = find(planar([1, 1]), transform([1, 0, 0]), { task: PLACE }, [0, 0])
    expect(found.converged).toBe(true)
    expect(found.attempts).toBeGreaterThan(1)
  })

  it('moves sliding joints and mimics, and a chain of one', () => {
    const rail = arm([{ type: 'prismatic', axis: [1, 0, 0], lower: 0, upper: 3 }, { xyz: [0, 0, 0.2] }, { xyz: [0.5, 0, 0], mimic: { joint: 1, multiplier: 0.5 } }], transform([0.4, 0, 0]))
    const goal = at(rail, [1.3, 0.7]).baseFromTip
    const found = find(rail, goal, {}, [0.1, 0.1])
    expectClose(found.configuration, [1.3, 0.7], 1e-5)
    expect(find(arm([{ type: 'prismatic', axis: [0, 0, 1], lower: 0, upper: 1 }]), transform([0, 0, 2])).reason).toBe('unreachable')
  })

  it('gives the same bits again, and pauses after each step', () => {
    const chain = limited()
    const goal = at(chain, [1, -1, 0.5, 2, 1, -1, 2]).baseFromTip
    expect(find(chain, goal)).toEqual(find(chain, goal))
    const steps = inverseKinematicsInSteps(chain, createWorkspace(chain), goal, { task: createTask(), ...DEFAULT_SEARCH })
    let pauses = 0
    let step = steps.next()
    for (; step.done !== true; step = steps.next()) pauses++
    expect(pauses).toBeGreaterThan(0)
    expect(step.value).toEqual(find(chain, goal))
  })

  it('refuses a seed of another length, and brings one outside the limits inside', () => {
    expect(() => find(planar([1, 1]), transform(), {}, [0])).toThrow('a seed needs 2 joint values, 1 were given')
    const chain = planar([1, 1], { lower: -1, upper: 1 })
    const { configuration } = find(chain, at(chain, [0.4, 0.8]).baseFromTip, { task: PLACE }, [7, -7])
    configuration.forEach((value) => expect(Math.abs(value)).toBeLessThanOrEqual(1))
  })

  it('is finite for the largest goals', () => {
    const found = find(golden(), transform([1e9, -1e9, 1e9], [1, 1, 1]))
    expect([...found.configuration, found.positionError, found.orientationError].every(Number.isFinite)).toBe(true)
    expect(found.reason).toBe('unreachable')
  })
})
