import { describe, expect, it } from 'vitest'
import { closedLoopTwist } from '@/lib/kinematics/closed-loop-twist'
import { quaternionOf } from '@/lib/math/quaternion'
import { multiplyTransforms } from '@/lib/math/rigid-transform'
import { arm, at, golden, GOLDEN_POSE, planar, rad, transform } from './arms'
import { askRates, EXACT, PLANE } from './ask-rates'
import { expectClose } from './expect-close'

const still = arm([{ type: 'prismatic' }])

/** The goal that is `offset` away from a tool placed at `tool`, turned by `turn` about base axes. */
function question(tool: number[], goal: number[]) {
  return { work: at(still, [0], tool), goal }
}

describe('closedLoopTwist', () => {
  it('adds gain times position difference and gain times rotation vector to the feed-forward', () => {
    const { work, goal } = question(transform(), transform([0.1, -0.2, 0.3], [0, 0, 0.4]))
    const twist = closedLoopTwist(work, { baseFromGoal: goal, twist: [1, 2, 3, 4, 5, 6], positionGain: 2, orientationGain: 5 }, 'base')
    expectClose(twist, [1.2, 1.6, 3.6, 4, 5, 8], 1e-14)
  })

  it('agrees with the quaternion error of Siciliano et al. 2009, section 3.7.3 (from memory), which is sin(angle/2)·r', () => {
    const tool = transform([0, 0, 0], [0.1, 0.2, 0.3])
    const goal = new Float64Array(12)
    multiplyTransforms(transform([0, 0, 0], [0, 0, 0.4]), 0, tool, 0, goal, 0)
    const { work } = question(tool, [])
    const error = closedLoopTwist(work, { baseFromGoal: goal, positionGain: 0, orientationGain: 1 }, 'base').slice(3)
    const [x, y, z, w] = quaternionOf(work.baseFromTool)
    const [xd, yd, zd, wd] = quaternionOf(goal)
    const witness = [w * xd - wd * x - (yd * z - zd * y), w * yd - wd * y - (zd * x - xd * z), w * zd - wd * z - (xd * y - yd * x)]
    expectClose(witness, [0, 0, 0.1986693308], 1e-10)
    const angle = Math.sqrt(error.reduce((sum, e) => sum + e * e, 0))
    expectClose(
      error.map((e) => (e * Math.sin(angle / 2)) / angle),
      witness,
      1e-14,
    )
    expectClose(error, [0, 0, 0.4], 1e-15)
  })

  it('turns the short way round, and at half a turn by the sign rule of the quaternion', () => {
    const of = (rpy: [number, number, number]) =>
      closedLoopTwist(at(still, [0]), { baseFromGoal: transform([0, 0, 0], rpy), positionGain: 1, orientationGain: 1 }, 'base').slice(3)
    expectClose(of([0, 0, 3.5]), [0, 0, 3.5 - 2 * Math.PI], 1e-14)
    expectClose(of([0, 0, Math.PI]), [0, 0, Math.PI], 1e-14)
    expectClose(of([0, 0, -Math.PI]), [0, 0, Math.PI], 1e-14)
    expectClose(of([-Math.PI, 0, 0]), [Math.PI, 0, 0], 1e-14)
  })

  it('gives the same motion in tip axes, feed-forward read in them', () => {
    const chain = golden()
    const work = at(chain, GOLDEN_POSE)
    const baseFromGoal = transform([0.1, 0.2, 0.9], [0.5, 0.6, 0.7])
    const base = closedLoopTwist(work, { baseFromGoal, positionGain: 1, orientationGain: 2 }, 'base')
    const tip = closedLoopTwist(work, { baseFromGoal, positionGain: 1, orientationGain: 2, twist: [0, 0, 1, 0, 0, 0] }, 'tip')
    const r = work.baseFromTool
    const turned = [0, 3].flatMap((block) => [0, 1, 2].map((k) => [0, 1, 2].reduce((sum, i) => sum + r[4 * i + k]! * base[block + i]!, 0)))
    expectClose(
      tip,
      turned.map((part, i) => part + (i === 2 ? 1 : 0)),
      1e-14,
    )
  })

  it('asks for nothing at the goal', () => {
    const work = at(golden(), GOLDEN_POSE)
    expectClose(
      closedLoopTwist(work, { baseFromGoal: work.baseFromTool, positionGain: 1, orientationGain: 1 }, 'base'),
      [0, 0, 0, 0, 0, 0],
      1e-15,
    )
  })

  it('leads a discrete loop to its goal: gain 5 at 10 ms leaves 0.95^100 of the error after a second, near e^-5', () => {
    const chain = planar([1, 1])
    let q = rad(30, 60)
    const goal = transform([0.5, 1.2, 0])
    const away = () => {
      const t = at(chain, q).baseFromTip
      return Math.sqrt((0.5 - t[3]!) ** 2 + (1.2 - t[7]!) ** 2)
    }
    const first = away()
    for (let i = 0; i < 100; i++) {
      const twist = closedLoopTwist(at(chain, q), { baseFromGoal: goal, positionGain: 5, orientationGain: 5 }, 'base')
      const { rates } = askRates(chain, q, twist, { task: PLANE, inverse: EXACT })
      q = q.map((value, k) => value + 0.01 * rates[k]!)
    }
    expect(0.95 ** 100).toBeCloseTo(0.00592, 5)
    // The pose moves along arcs, not straight lines: the loop is a little off its linear model.
    expect(away() / first).toBeCloseTo(0.00592, 3)
  })

  it('is warned of from gain times period 2 on, where a discrete loop no longer settles', () => {
    const codes = (gain: number, dt?: number) =>
      askRates(planar([1, 1]), rad(30, 60), [0, 0, 0, 0, 0, 0], { task: PLANE, gain, limits: { rates: 'scale', derating: 1, ...(dt === undefined ? {} : { dt }) } }).diagnosis
    expect(codes(200, 0.01).map(({ code }) => code)).toEqual(['gain-too-high'])
    expect(codes(200, 0.01)[0]!.detail).toContain('Gain 200 per second times a period of 0.0100 s is 2.00')
    expect([codes(199, 0.01), codes(200)]).toEqual([[], []])
    // The linear model: each period multiplies the error by 1 − gain·dt.
    expect(Math.abs(1 - 1.99)).toBeLessThan(1)
    expect(Math.abs(1 - 2.01)).toBeGreaterThan(1)
  })
})
