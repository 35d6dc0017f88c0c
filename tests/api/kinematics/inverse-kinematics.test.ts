import { describe, expect, inject, it } from 'vitest'
import type { Revision } from '@/lib/contract/model'
import { OPERATIONS } from '@/lib/contract/operations'
import { numbers } from '../../lib/kinematics/arms'
import { expectProblem, pointersOf } from '../expect-problem'
import { get } from '../send'
import { asPerson } from '../support/callers'
import { answerTo, ask, resultOf, resultsOf } from './ask'
import { expectClose } from './close'

const PLACE = { components: ['vx', 'vy'] }
const SHOP = { length: 'mm', angle: 'deg' }
const LEVEL = [0, 0, 0, 1]
const rad = (...degrees: number[]) => degrees.map((value) => (value * Math.PI) / 180)
const at = (...position: number[]) => ({ position, quaternion: LEVEL })
const codeless = ({ reason, converged }: { reason?: string; converged?: boolean }) => [converged, reason]

/** The trainer without its last joint, its tool where that joint's link would end: two links of 1 m. */
const TWO_LINKS = { chain: { tip: 'middle_link' }, tool: { position: [1, 0, 0], quaternion: LEVEL }, task: PLACE }

/** Poses that the arm has within its limits, at configurations drawn from a seed, the outermost twentieth of each range left out. */
async function reachedPoses(model: string, count: number) {
  const { joints } = (await get(`/teams/tarnholm/models/${model}/revisions/1`, await asPerson('kofi'))).body as Revision
  const random = numbers(20261201)
  const { chain } = await answerTo('forward-kinematics', model, { configurations: [joints.filter(({ type, mimic }) => type !== 'fixed' && mimic === undefined).map(() => 0)] })
  const ranges = chain.joints.map((name) => {
    const { lower, upper } = joints.find((joint) => joint.name === name)!
    return [lower ?? -Math.PI, upper ?? Math.PI] as const
  })
  const configurations = Array.from({ length: count }, () => ranges.map(([from, to]) => from + (to - from) * (0.025 + 0.95 * random())))
  const poses = await resultsOf('forward-kinematics', model, { configurations, include: ['pose'] })
  return { configurations, targets: poses.map(({ pose }) => pose!) }
}

describe('a pose that the arm has', () => {
  it.each(['skerry-7', 'fulmar-6', 'gannet-4', 'skerry-7-rail', 'trainer-3r', 'dunlin-2'])('is found within the limits of %s, and forward kinematics leads back to it', async (model) => {
    const { targets } = await reachedPoses(model, 25)
    const found = await resultsOf('inverse-kinematics', model, { targets, attempts: 32 })
    expect(found.map(codeless)).toEqual(targets.map(() => [true, undefined]))
    const back = await resultsOf('forward-kinematics', model, { configurations: found.map(({ configuration }) => configuration!) })
    back.forEach(({ pose, withinLimits }, i) => {
      expect(withinLimits).toBe(true)
      expectClose(pose!.position, targets[i]!.position, 1.01e-6)
      // A turn of 1e-6 rad is 0.5e-6 of a quaternion, whose sign may be the other one at half a turn.
      expectClose(Math.abs(pose!.quaternion.reduce((sum, value, k) => sum + value * targets[i]!.quaternion[k]!, 0)), 1, 1e-12)
      expect(found[i]!.positionError).toBeLessThanOrEqual(1e-6)
      expect(found[i]!.orientationError).toBeLessThanOrEqual(1e-6)
    })
  })

  it('is found at once from the configuration itself, and in a few steps from near it', async () => {
    const { configurations, targets } = await reachedPoses('skerry-7', 10)
    const same = await resultsOf('inverse-kinematics', 'skerry-7', { targets, seeds: configurations })
    expect(same).toEqual(configurations.map((configuration, i) => ({
      converged: true, configuration, positionError: same[i]!.positionError, orientationError: same[i]!.orientationError, iterations: 0, attempts: 1,
    })))
    const near = await resultsOf('inverse-kinematics', 'skerry-7', { targets, seeds: configurations.map((q) => q.map((value) => value + 0.02)) })
    for (const { iterations, attempts } of near) {
      expect(attempts).toBe(1)
      expect(iterations).toBeLessThanOrEqual(12)
    }
  })

  it('is the one that the reference shows', async () => {
    const { example } = OPERATIONS.inverseKinematics
    const { converged, configuration } = await resultOf('inverse-kinematics', 'skerry-7', example)
    expect(converged).toBe(true)
    const { pose } = await resultOf('forward-kinematics', 'skerry-7', { units: SHOP, configurations: [configuration] })
    expectClose(pose!.position, example.targets[0]!.position, 1.01e-3)
  })

  it('is that of example 6.1 of Lynch & Park 2017 (from memory), in degrees', async () => {
    // Links of 1 m, the goal at (0.366, 1.366) m turned by 120°, from (0°, 30°): the answer is (30°, 90°).
    const half = Math.PI / 3
    const target = { position: [366, 1366, 0], quaternion: [0, 0, Math.sin(half), Math.cos(half)] }
    const { task: _place, ...wholePose } = TWO_LINKS
    const question = { ...wholePose, tool: { position: [1000, 0, 0], quaternion: LEVEL }, units: SHOP, targets: [target], seeds: [[0, 30]] }
    const { converged, configuration, attempts } = await resultOf('inverse-kinematics', 'trainer-3r', { ...question, positionTolerance: 1, orientationTolerance: 0.1 })
    expect([converged, attempts]).toEqual([true, 1])
    expectClose(configuration, [30, 90], 0.1)
  })
})

describe('seeds', () => {
  it('choose between the postures that reach a pose', async () => {
    // Both links at 60° to the base line: elbow to one side or the other (closed form).
    const target = at(1, 0, 0)
    const found = await resultsOf('inverse-kinematics', 'trainer-3r', { ...TWO_LINKS, targets: [target, target], seeds: [[1, -2], [-1, 2]] })
    expectClose(found.map(({ configuration }) => configuration!), [rad(60, -120), rad(-60, 120)], 1e-5)
  })

  it('have one entry for each target or one for all', async () => {
    const three = { ...TWO_LINKS, targets: [at(1, 0, 0), at(1, 0.1, 0), at(1, 0.2, 0)] }
    const elbows = async (seeds: number[][]) => (await resultsOf('inverse-kinematics', 'trainer-3r', { ...three, seeds })).map(({ configuration }) => Math.sign(configuration![1]!))
    expect(await elbows([[1, -2]])).toEqual([-1, -1, -1])
    expect(await elbows([[1, -2], [-1, 2], [1, -2]])).toEqual([-1, 1, -1])
    const wrong = async (seeds: number[][]) => {
      const response = await ask('inverse-kinematics', 'trainer-3r', { ...three, seeds })
      expectProblem(response, 'length-mismatch')
      return response
    }
    const two = await wrong([[0, 0], [0, 0]])
    expect(pointersOf(two)).toEqual(['/seeds'])
    expect(two.body).toMatchObject({ detail: expect.stringContaining('one for each of the 3 targets, or one for all') })
    expect(pointersOf(await wrong([[0, 0], [0], [0, 0, 0]]))).toEqual(['/seeds/1', '/seeds/2'])
  })

  it('convert with the units, and are brought within the limits', async () => {
    const seeded = { ...TWO_LINKS, tool: { position: [1000, 0, 0], quaternion: LEVEL }, units: SHOP, targets: [at(1000, 0, 0)] }
    const { configuration } = await resultOf('inverse-kinematics', 'trainer-3r', { ...seeded, seeds: [[60.5, -119]] })
    expectClose(configuration, [60, -120], 1e-3)
    const outside = await resultOf('inverse-kinematics', 'trainer-3r', { ...seeded, seeds: [[400, -400]] })
    expect(outside.converged).toBe(true)
    expect(Math.abs(outside.configuration![1]!)).toBeLessThanOrEqual((2.8 * 180) / Math.PI)
  })
})

describe('a pose that the arm does not have', () => {
  it('is answered with the nearest that was found, and why', async () => {
    const ask = (target: object, more: object = {}) => resultOf('inverse-kinematics', 'trainer-3r', { ...TWO_LINKS, targets: [target], seeds: [[0.3, 0.4]], ...more })
    // 1 m beyond the stretched arm.
    const far = await ask(at(3, 0, 0))
    expect(codeless(far)).toEqual([false, 'unreachable'])
    expectClose(far.positionError!, 1, 1e-3)
    // In the hole that the limit of the elbow, 2.8 rad, leaves about the base: 2·cos 1.4 m from its middle.
    const near = await ask(at(0.1, 0, 0))
    expect(codeless(near)).toEqual([false, 'at-limits'])
    expectClose(near.positionError!, 2 * Math.cos(1.4) - 0.1, 1e-3)
    expectClose(Math.abs(near.configuration![1]!), 2.8, 1e-9)
    // The whole pose is more than two joints can give: the turn follows from the place.
    expect((await ask(at(1, 0.5, 0), { task: {} })).converged).toBe(false)
  })

  it('is reported in the units of the question, of the components that count', async () => {
    const deep = { position: [0.5, 0.2, -0.05], quaternion: [1, 0, 0, 0] }
    const si = await resultOf('inverse-kinematics', 'gannet-4', { targets: [deep] })
    const shop = await resultOf('inverse-kinematics', 'gannet-4', { units: SHOP, targets: [{ ...deep, position: [500, 200, -50] }] })
    expect([codeless(si), codeless(shop)]).toEqual([[false, 'at-limits'], [false, 'at-limits']])
    expectClose(shop.positionError!, si.positionError! * 1000, 1e-6)
    expectClose(shop.configuration, si.configuration!.map((value, i) => (i === 2 ? value * 1000 : (value * 180) / Math.PI)), 1e-6)
    // The quill ends at its stroke.
    expectClose(si.configuration![2]!, 0.17, 1e-9)
    expect((await resultOf('inverse-kinematics', 'gannet-4', { targets: [deep], task: PLACE })).positionError).toBeLessThanOrEqual(1e-6)
  })

  it('is given up after as many attempts as were allowed, 8 when nothing is said', async () => {
    const tried = async (more: object) => (await resultOf('inverse-kinematics', 'trainer-3r', { ...TWO_LINKS, targets: [at(0.1, 0, 0)], ...more })).attempts
    expect([await tried({ attempts: 1 }), await tried({ attempts: 64 }), await tried({})]).toEqual([1, 64, 8])
  })
})

describe('the task', () => {
  it('leaves the turn about the axis of a symmetric tool free', async () => {
    const { configurations, targets } = await reachedPoses('fulmar-6', 8)
    // The same poses, turned by 100° about the tool's own z axis.
    const half = rad(50)[0]!
    const turned = targets.map(({ position, quaternion: [x, y, z, w] }) => {
      const [s, c] = [Math.sin(half), Math.cos(half)]
      return { position, quaternion: [x! * c + y! * s, y! * c - x! * s, z! * c + w! * s, w! * c - z! * s] }
    })
    const symmetric = { task: { components: ['vx', 'vy', 'vz', 'wx', 'wy'], frame: 'tip' }, targets: turned, seeds: configurations }
    const found = await resultsOf('inverse-kinematics', 'fulmar-6', symmetric)
    // Nothing need move: only the turn differs, and it does not count.
    expect(found.map(({ converged, attempts }) => [converged, attempts])).toEqual(turned.map(() => [true, 1]))
    const back = await resultsOf('forward-kinematics', 'fulmar-6', { configurations: found.map(({ configuration }) => configuration!), matrices: true })
    const wanted = await resultsOf('forward-kinematics', 'fulmar-6', { configurations, matrices: true })
    back.forEach(({ pose }, i) => {
      expectClose(pose!.position, targets[i]!.position, 1.01e-6)
      expectClose(pose!.matrix!.map((row) => row[2]!), wanted[i]!.pose!.matrix!.map((row) => row[2]!), 1.5e-6)
    })
    // The whole pose asks the last joint for the turn.
    const whole = await resultsOf('inverse-kinematics', 'fulmar-6', { ...symmetric, task: {} })
    whole.forEach(({ converged, configuration }, i) => {
      expect(converged).toBe(true)
      expect(Math.max(...configuration!.map((value, k) => Math.abs(value - configurations[i]![k]!)))).toBeGreaterThan(1)
    })
  })

  it('is of the tool point, where the tool is', async () => {
    const tool = { position: [0, 0, 0.2], quaternion: [0, Math.SQRT1_2, 0, Math.SQRT1_2] }
    const [q] = (await reachedPoses('skerry-7', 1)).configurations
    const { pose } = await resultOf('forward-kinematics', 'skerry-7', { configurations: [q], tool })
    const { configuration } = await resultOf('inverse-kinematics', 'skerry-7', { targets: [pose], tool })
    expectClose((await resultOf('forward-kinematics', 'skerry-7', { configurations: [configuration], tool })).pose!.position, pose!.position, 1.01e-6)
  })
})

describe('tolerances', () => {
  it('are in the units of the question, and end the search', async () => {
    const { targets } = await reachedPoses('skerry-7', 6)
    const loose = await resultsOf('inverse-kinematics', 'skerry-7', { targets, positionTolerance: 0.005, orientationTolerance: rad(2)[0] })
    const shop = await resultsOf('inverse-kinematics', 'skerry-7', {
      units: SHOP, targets: targets.map(({ position, quaternion }) => ({ position: position.map((m) => m * 1000), quaternion })), positionTolerance: 5, orientationTolerance: 2,
    })
    const tight = await resultsOf('inverse-kinematics', 'skerry-7', { targets })
    shop.forEach(({ configuration, positionError, orientationError, iterations }, i) => {
      expectClose(configuration, loose[i]!.configuration!.map((value) => (value * 180) / Math.PI), 1e-6)
      expect(positionError).toBeLessThanOrEqual(5)
      expect(orientationError).toBeLessThanOrEqual(2)
      expect(iterations).toBeLessThan(tight[i]!.iterations!)
    })
    expect(Math.max(...shop.map(({ positionError }) => positionError!))).toBeGreaterThan(1e-3)
  })

  it.each([
    [{ positionTolerance: 0 }, '/positionTolerance'],
    [{ orientationTolerance: -1 }, '/orientationTolerance'],
    [{ positionTolerance: 2e9 }, '/positionTolerance'],
    [{ attempts: 0 }, '/attempts'],
    [{ attempts: 65 }, '/attempts'],
    [{ attempts: 1.5 }, '/attempts'],
    [{ targets: [] }, '/targets'],
    [{ targets: [{ position: [1, 0, 0] }] }, '/targets/0/quaternion'],
    [{ targets: [{ position: [1, 0, 0], quaternion: [0, 0, 0, 2] }] }, '/targets/0/quaternion'],
    [{ targets: [at(1, 0, 0), at(0, 2e9, 0)] }, '/targets/1/position/1'],
    [{ seeds: [] }, '/seeds'],
  ] as const)('and counts are refused where they make no sense: %j', async (more, pointer) => {
    const response = await ask('inverse-kinematics', 'trainer-3r', { ...TWO_LINKS, targets: [at(1, 0, 0)], ...more })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })
})

describe('secondary objectives', () => {
  it('spend the freedom that is left, and keep the pose', async () => {
    const { configurations: [q], targets } = await reachedPoses('skerry-7', 1)
    const posture = rad(-40, 40, 30, 60, 20, -30, 10)
    const away = (configuration: readonly number[] | undefined) => Math.hypot(...configuration!.map((value, i) => value - posture[i]!))
    const plain = await resultOf('inverse-kinematics', 'skerry-7', { targets, seeds: [q] })
    const spent = await resultOf('inverse-kinematics', 'skerry-7', { targets, seeds: [q], secondary: [{ objective: 'posture', posture, gain: 1 }] })
    expect(spent).toMatchObject({ converged: true, attempts: 1 })
    expect(spent.positionError).toBeLessThanOrEqual(1e-6)
    expect(away(spent.configuration)).toBeLessThan(away(plain.configuration) - 0.05)
  })

  it('include manipulability', async () => {
    const { configurations: [q], targets } = await reachedPoses('skerry-7', 1)
    const of = async (secondary: object[]) => {
      const { configuration } = await resultOf('inverse-kinematics', 'skerry-7', { targets, seeds: [q], secondary })
      return (await resultOf('jacobian', 'skerry-7', { configurations: [configuration] })).manipulability!
    }
    expect(await of([{ objective: 'manipulability', gain: 1 }])).toBeGreaterThan(1.0001 * (await of([])))
  })

  it('have postures of the chain', async () => {
    const response = await ask('inverse-kinematics', 'trainer-3r', { ...TWO_LINKS, targets: [at(1, 0, 0)], secondary: [{ objective: 'posture', posture: [0, 0, 0], gain: 1 }] })
    expectProblem(response, 'length-mismatch')
    expect(pointersOf(response)).toEqual(['/secondary/0/posture'])
  })
})

describe('many targets', () => {
  const circle = (count: number) => Array.from({ length: count }, (_, i) => at(1 + 0.5 * Math.cos((2 * Math.PI * i) / count), 0.5 * Math.sin((2 * Math.PI * i) / count), 0))

  it('are answered in their order, ten thousand of them and not one more', async () => {
    const targets = circle(10_000)
    const question = { ...TWO_LINKS, seeds: [[1, -2]], include: ['configuration'] }
    const results = await resultsOf('inverse-kinematics', 'trainer-3r', { ...question, targets })
    expect(results).toHaveLength(10_000)
    // The elbow by the law of cosines: distance² = 2 + 2·cos q2.
    results.forEach(({ configuration }, i) => {
      const [x, y] = targets[i]!.position as [number, number]
      expectClose(Math.cos(configuration![1]!), (x * x + y * y) / 2 - 1, 1e-5)
    })
    const tooMany = await ask('inverse-kinematics', 'trainer-3r', { ...question, targets: circle(10_001) })
    expectProblem(tooMany, 'invalid-request')
    expect(pointersOf(tooMany)).toEqual(['/targets'])
  })

  it('have the same answers bit for bit, alone, together and again', async () => {
    const { targets } = await reachedPoses('fulmar-6', 5)
    const all = { targets: [...targets, { position: [3, 0, 0], quaternion: LEVEL }] }
    const [once, again] = [await ask('inverse-kinematics', 'fulmar-6', all), await ask('inverse-kinematics', 'fulmar-6', all)]
    expect(once.status).toBe(200)
    expect(again.text).toBe(once.text)
    const alone = await Promise.all(all.targets.map((target) => resultOf('inverse-kinematics', 'fulmar-6', { targets: [target] })))
    expect(alone).toEqual((once.body as { results: object[] }).results)
  })

  it('leave others their turn: health answers while they are searched for', async () => {
    let isFinished = false
    const batch = resultsOf('inverse-kinematics', 'skerry-7', { targets: new Array<object>(200).fill(at(0.1, 0.1, 0.1)), attempts: 16, include: ['converged'] }).finally(() => (isFinished = true))
    let answered = 0
    while (!isFinished) {
      const { ok } = await fetch(`${inject('served').url}/api/health/ready`)
      if (ok && !isFinished) answered++
    }
    expect(await batch).toHaveLength(200)
    // One or two come in before the computing begins.
    expect(answered).toBeGreaterThan(5)
  })

  it('may be of a chain without joints, which is where it is', async () => {
    const still = { chain: { base: 'link_7', tip: 'tool_flange' } }
    const [here, there] = await resultsOf('inverse-kinematics', 'skerry-7', { ...still, targets: [at(0, 0, 0.1), at(0, 0, 0.2)] })
    expect(here).toMatchObject({ converged: true, configuration: [] })
    expect(there).toMatchObject({ converged: false, configuration: [], reason: 'unreachable' })
    expectClose(there!.positionError!, 0.1, 1e-12)
  })
})
