import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import type { Diagnosis } from '@/lib/kinematics/diagnosis'
import { measures } from '@/lib/kinematics/measures'
import type { Objective } from '@/lib/kinematics/objectives'
import { createTask } from '@/lib/kinematics/task'
import { arm, at, golden, planar, rad, scara, transform } from './arms'
import { askRates, EXACT, flat, PLANE, type Wish } from './ask-rates'
import { expectClose } from './expect-close'

const straight = planar([1, 1, 1])
const bending: Objective = { objective: 'posture', posture: [0.3, -0.6, 0.3], gain: 1 }

function codes(chain: Chain, q: ArrayLike<number>, twist: ArrayLike<number>, wish: Wish = {}): string[] {
  return askRates(chain, q, twist, wish).diagnosis.map(({ code }) => code)
}

function one(chain: Chain, q: ArrayLike<number>, twist: ArrayLike<number>, code: Diagnosis['code'], wish: Wish = {}): Diagnosis {
  const found = askRates(chain, q, twist, wish).diagnosis.filter((entry) => entry.code === code)
  expect(found).toHaveLength(1)
  return found[0]!
}

describe('the trap at a singular pose', () => {
  it.each([
    EXACT,
    { method: 'damped', damping: 0.05 },
    { method: 'damped', damping: 3 },
    { method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 },
  ] as const)('never answers bare zeros: it names the lost direction and what is missing (%o)', (inverse) => {
    const { rates, residual, achievedTwist, diagnosis } = askRates(straight, [0, 0, 0], flat(-0.1, 0), { task: PLANE, inverse })
    expectClose(rates, [0, 0, 0], 1e-17)
    expectClose(achievedTwist.slice(0, 2), [0, 0], 1e-16)
    expectClose(residual.slice(0, 2), [0.1, 0], 1e-16)
    const lost = diagnosis.find(({ code }) => code === 'direction-lost')
    expect(lost).toMatchObject({ direction: [1, 0, 0, 0, 0, 0], structural: false, freed: false })
    expect(lost!.detail).toBe(
      "The tool cannot move along x of the base (radially inward, towards the axis of 'motion-1', in the plane of links 'link-1' and " +
        "'link-2': the arm is stretched at 'motion-2') at this pose, and no objective is moving the arm out of it: add a posture " +
        'objective that leads away from here, for example to (joint-1 0.25 rad, joint-2 -0.3 rad, joint-3 -0.15 rad), which brings the ' +
        'direction back.',
    )
  })

  it('has more spare freedom there, and a posture uses it: half a second later the direction is back', () => {
    const { secondaryRates, nullity } = askRates(straight, [0, 0, 0], flat(-0.1, 0), { task: PLANE, inverse: EXACT, secondary: [bending] })
    expect(nullity).toBe(2)
    expectClose(secondaryRates, [0.3, -0.6, 0.3], 1e-15)
    const q = secondaryRates.map((rate) => 0.5 * rate)
    expect(measures(straight, at(straight, q), PLANE).singularValues[1]).toBeCloseTo(0.1262, 4)
    expectClose(askRates(straight, q, flat(-0.1, 0), { task: PLANE, inverse: EXACT }).rates, [0.4017, -0.6692, 0.1349], 5e-5)
  })

  it('says so when the objective given frees the arm', () => {
    const lost = one(straight, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE, secondary: [bending] })
    expect(lost.freed).toBe(true)
    expect(lost.detail).toContain('the spare freedom is moving the arm out of it')
  })

  it.each([
    ['whose posture is away along a row of the Jacobian', { objective: 'posture', posture: [0.3, 0.2, 0.1], gain: 1 }, 'along the rows of the Jacobian), of which nothing is spare'],
    ['whose posture is this pose', { objective: 'posture', posture: [0, 0, 0], gain: 1 }, 'the objectives given ask for nothing here'],
    ['that contributes nothing', { objective: 'mid-range', gain: 1 }, 'the objectives given ask for nothing here'],
    ['that looks for manipulability where there is none', { objective: 'manipulability', gain: 1 }, 'the objectives given ask for nothing here'],
  ] as const)('does not promise it for an objective %s, and says why', (_name, objective, why) => {
    const lost = one(straight, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE, secondary: [objective] })
    expect(lost.freed).toBe(false)
    expect(lost.detail).toContain(why)
  })

  it('suggests a posture that frees the arm when it is given as an objective, within the limits of the joints', () => {
    const oneWay = planar([1, 1, 1], { lower: -0.01, upper: 3 })
    for (const chain of [straight, oneWay]) {
      const { suggestion } = one(chain, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE })
      if (chain === oneWay) {
        // Every spare motion bends one joint down: there is no posture to suggest.
        expect(suggestion).toBeUndefined()
        continue
      }
      const lost = one(chain, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE, secondary: [{ objective: 'posture', posture: suggestion!, gain: 1 }] })
      expect(lost.freed).toBe(true)
    }
    expect(one(oneWay, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE }).detail).toContain('no bending of a single joint brings the direction back')
  })

  it('stays put without an objective, and with the suggested one leaves the pose and follows, never further off than the damping lets it', () => {
    const follow = (secondary: Objective[]) => {
      let q = [0, 0, 0]
      let worst = 0
      for (let i = 0; i < 600; i++) {
        const goal = 3 - 0.0005 * i
        const work = at(straight, q)
        worst = Math.max(worst, Math.abs(goal - work.baseFromTip[3]!), Math.abs(work.baseFromTip[7]!))
        const twist = flat(-0.05 + 2 * (goal - work.baseFromTip[3]!), -2 * work.baseFromTip[7]!)
        const { rates } = askRates(straight, q, twist, { task: PLANE, inverse: { method: 'damped', damping: 0.05 }, secondary })
        q = q.map((value, k) => value + 0.01 * rates[k]!)
      }
      const t = at(straight, q).baseFromTip
      return { x: t[3]!, worst }
    }
    expect(follow([])).toEqual({ x: 3, worst: expect.closeTo(0.2995, 9) as number })
    const { suggestion } = one(straight, [0, 0, 0], flat(-0.1, 0), 'direction-lost', { task: PLANE })
    const freed = follow([{ objective: 'posture', posture: suggestion!, gain: 1 }])
    // Stated bound: 40 mm off the commanded path at worst while the arm bends, 5 mm after six seconds.
    expect(freed.worst).toBeLessThan(0.04)
    expect(Math.abs(freed.x - (3 - 0.0005 * 600))).toBeLessThan(0.005)
  })

  it('does not promise it for a self-motion that leaves the elbow stretched', () => {
    const q = rad(10, 40, 30, 0, 20, 50, 60)
    const chain = golden()
    const swivel: Objective = { objective: 'posture', posture: q.map((value, i) => value + [0, 0, 0.5, 0, -0.5, 0, 0][i]!), gain: 1 }
    const t = at(chain, q).baseFromTip
    const wrist = [t[3]! - 0.1 * t[2]!, t[7]! - 0.1 * t[6]!, t[11]! - 0.1 * t[10]! - 0.3]
    const size = Math.sqrt(wrist.reduce((sum, part) => sum + part * part, 0))
    // Away from the shoulder, with the wrist's point as reference: what a stretched elbow cannot do.
    const tool = transform([0, 0, -0.1])
    const twist = [...wrist.map((part) => (0.05 * part) / size), 0, 0, 0]
    const lost = one(chain, q, twist, 'direction-lost', { inverse: EXACT, secondary: [swivel], tool })
    expect(lost).toMatchObject({ structural: false, freed: false })
    const bend: Objective = { objective: 'posture', posture: q.map((value, i) => value + (i === 3 ? 0.5 : 0)), gain: 1 }
    expect(one(chain, q, twist, 'direction-lost', { inverse: EXACT, secondary: [bend], tool }).freed).toBe(true)
  })

  it('says that no spare freedom is left where the task takes all of it', () => {
    const lost = one(planar([1, 1]), [0, 1e-3], flat(1, 0), 'direction-lost', { task: PLANE, secondary: [{ ...bending, posture: [0, 1] }] })
    expect(lost.detail).toContain('no spare freedom is left')
  })

  it('parks a damped arm for ever without a posture, and lets it go with one (4 s at 10 ms)', () => {
    const run = (secondary: Objective[]) => {
      let q = [0, 0, 0]
      const seen: number[][] = []
      for (let i = 1; i <= 400; i++) {
        const { rates } = askRates(straight, q, flat(-0.05, 0), { task: PLANE, inverse: { method: 'damped', damping: 0.05 }, secondary })
        q = q.map((value, k) => value + 0.01 * rates[k]!)
        if (i === 50 || i === 100 || i === 400)
          seen.push([at(straight, q).baseFromTip[3]!, measures(straight, at(straight, q), PLANE).singularValues[1]!])
      }
      return seen
    }
    expect(run([]).map(([x]) => x)).toEqual([3, 3, 3])
    expectClose(run([bending]).flat(), [2.99731, 0.043, 2.97961, 0.119, 2.8367, 0.349], 5e-4)
    expectClose(
      run([bending]).map(([x]) => x!),
      [2.99731, 2.97961, 2.8367],
      5e-6,
    )
  }, 20_000)
})

describe('direction-lost', () => {
  it('says that a chain can never do what no pose of it does', () => {
    const lost = one(straight, [0.3, 0.4, 0.5], [0, 0, 0.1, 0, 0, 0], 'direction-lost')
    expect(lost).toMatchObject({ direction: [0, 0, 1, 0, 0, 0], structural: true, freed: false })
    expect(lost.detail).toBe(
      'The tool cannot move along z of the base: this chain can never move in that direction, whatever its pose. Ask for fewer components.',
    )
    expect(
      one(scara(), [0.3, 0.4, 0.1, 0.2], [0, 0, 0, 0, 0.4, 0], 'direction-lost', { task: createTask(undefined, 'tip') }).detail,
    ).toContain('turn about y of the tool')
  })

  it('tells both apart when a twist asks for both', () => {
    const lost = askRates(straight, [0, 0, 0], [-0.1, 0, 0.2, 0, 0, 0], { inverse: EXACT }).diagnosis.filter(
      ({ code }) => code === 'direction-lost',
    )
    expect(lost.map(({ direction, structural }) => ({ direction, structural }))).toEqual([
      { direction: [0, 0, 1, 0, 0, 0], structural: true },
      { direction: [1, 0, 0, 0, 0, 0], structural: false },
    ])
  })

  it('says of an arm with too few joints that some direction is always missing', () => {
    const chain = arm(
      [
        {},
        { xyz: [0.4, 0, 0], axis: [0, 1, 0] },
        { xyz: [0.3, 0.1, 0], axis: [1, 0, 0] },
        { xyz: [0.2, 0, 0.1] },
        { xyz: [0.1, 0, 0], axis: [0, 1, 1] },
      ],
      transform([0.1, 0.1, 0]),
    )
    const lost = one(chain, [0.3, 0.4, 0.5, 0.6, 0.7], [1, 1, 1, 1, 1, 1], 'direction-lost', { inverse: EXACT })
    expect(lost.structural).toBe(true)
    expect(lost.detail).toContain('too few joints for the whole task')
  })

  it('writes the direction out where it is not along an axis', () => {
    const lost = one(straight, [Math.PI / 6, 0, 0], flat(Math.cos(Math.PI / 6), 0.5), 'direction-lost', { task: PLANE })
    expectClose(lost.direction!, [Math.cos(Math.PI / 6), 0.5, 0, 0, 0, 0], 1e-12)
    expect(lost.detail).toContain('move in the direction (vx 0.866, vy 0.500) in the axes of the base')
  })

  it('gives one direction one sign, whichever way was asked', () => {
    const lost = (vx: number) => one(straight, [0, 0, 0], flat(vx, 0), 'direction-lost', { task: PLANE }).direction
    expect(lost(1)).toEqual(lost(-1))
  })

  it('counts a direction as lost from less than 1 % delivered, and no sooner', () => {
    // σ²/(σ²+λ²) = 0.01 at λ = σ·√99.
    const chain = planar([1, 1])
    const q = [0, 0.1]
    const { singularValues } = askRates(chain, q, flat(0, 0), { task: PLANE })
    const edge = singularValues[1]! * Math.sqrt(99)
    const at = (damping: number) => codes(chain, q, flat(1, 0), { task: PLANE, inverse: { method: 'damped', damping } })
    expect(at(edge * 1.0001)).toContain('direction-lost')
    expect(at(edge * 0.9999)).not.toContain('direction-lost')
  })

  it('is not said when no more than 1e-6 of the twist is lost', () => {
    const ask = (vx: number) => codes(straight, [0, 0, 0], flat(vx, 1), { task: PLANE })
    expect(ask(1.1e-6)).toContain('direction-lost')
    expect(ask(0.9e-6)).not.toContain('direction-lost')
    expect(codes(straight, [0, 0, 0], flat(0, 0), { task: PLANE })).not.toContain('direction-lost')
  })
})

describe('near-singular', () => {
  it('is said under 0.02 or while damping is at work, and not otherwise', () => {
    const chain = planar([1, 1])
    expect(codes(chain, [0, 1], flat(0.1, 0), { task: PLANE })).toEqual([])
    expect(codes(chain, [0, 1], flat(0.1, 0), { task: PLANE, inverse: { method: 'damped', damping: 0.01 } })).toEqual(['near-singular'])
    expect(codes(chain, [0, 0.01], flat(0, 0.1), { task: PLANE, inverse: EXACT })).toEqual(['near-singular'])
    expect(one(chain, [0, 0.01], flat(0, 0.1), 'near-singular', { task: PLANE, inverse: EXACT }).detail).toContain(
      'in its worst direction a joint rate of 224 is needed for each unit of tool speed',
    )
    expect(one(chain, [0, 0.01], flat(0, 0.1), 'near-singular', { task: PLANE }).detail).toContain(
      'the tool falls short of what was asked by 0.000',
    )
    const { residual, diagnosis } = askRates(chain, [0, 0.01], flat(0.1, 0), { task: PLANE })
    const short = Math.sqrt(residual[0]! ** 2 + residual[1]! ** 2).toPrecision(3)
    expect(diagnosis.find(({ code }) => code === 'near-singular')!.detail).toContain(`by ${short} m/s and 0 rad/s`)
  })
})

describe('rate limits', () => {
  const slow = planar([1, 1, 1], { rate: 0.3 })

  it('says by how much the tool is slowed, and by which joint', () => {
    const { detail, joint } = one(slow, rad(30, 30, 30), flat(1, 0), 'rate-limited', { task: PLANE, inverse: EXACT })
    expect(joint).toBe('joint-3')
    expect(detail).toBe("Joint 'joint-3' would exceed its rate limit: the tool is slowed to 56.5 % of what was asked, its direction kept.")
  })

  it('says when the objectives get less than they ask', () => {
    const secondary: Objective[] = [{ objective: 'posture', posture: [0, 0, 0], gain: 20 }]
    expect(codes(slow, rad(30, 30, 30), flat(0.1, 0), { task: PLANE, inverse: EXACT, secondary })).toEqual(['secondary-starved'])
  })

  it('says neither where the limits are only reported', () => {
    expect(codes(slow, rad(30, 30, 30), flat(1, 0), { task: PLANE, inverse: EXACT, limits: { rates: 'report', derating: 1 } })).toEqual([])
  })
})

describe('joint limits', () => {
  const chain = planar([1], { lower: -1, upper: 1 })
  const task = createTask(['wz'])
  const ask = (q: number, wz: number) => askRates(chain, [q], [0, 0, 0, 0, 0, wz], { task }).diagnosis

  it('says at-limit of a joint within 1e-9 of a limit only when it is driven outward', () => {
    for (const q of [1, 1 + 0.9e-9, 1 - 0.9e-9])
      expect(ask(q, 1).map(({ code, joint }) => [code, joint])).toEqual([['at-limit', 'joint-1']])
    expect(ask(1, 1)[0]!.detail).toBe("Joint 'joint-1' is at its upper limit and is driven outward.")
    expect(ask(-1, -1)[0]!.detail).toBe("Joint 'joint-1' is at its lower limit and is driven outward.")
    expect([ask(1, -1), ask(1, 0), ask(0.999, 1), ask(-1, 1)]).toEqual([[], [], [], []])
  })

  it('says outside-limits beyond 1e-9, and whether the motion comes back', () => {
    expect(ask(1 + 2e-9, 1)[0]).toMatchObject({
      code: 'outside-limits',
      joint: 'joint-1',
      detail: "Joint 'joint-1' is above its upper limit and is driven further out.",
    })
    expect(ask(1.5, -1)[0]!.detail).toContain('is moving back')
    expect(ask(-1.5, 0)[0]!.detail).toBe("Joint 'joint-1' is below its lower limit and is not moving back.")
  })

  it('does not take rounding for motion', () => {
    const seven = golden({ lower: 0, upper: 2 })
    const q = [0.3, 0.4, 0.5, 0, 0.5, 0.6, 0.7]
    const bent = [...q]
    bent[3] = 2
    // The self-motion leaves the elbow still: whatever its last bits say, it is not driven outward.
    const secondary: Objective[] = [{ objective: 'posture', posture: [1, 1, 1, 2, 1, 1, 1], gain: 1 }]
    expect(codes(seven, bent, [0, 0, 0, 0, 0, 0], { secondary, inverse: EXACT })).toEqual([])
  })
})
