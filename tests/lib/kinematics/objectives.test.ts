import { describe, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { fillWish, type Objective } from '@/lib/kinematics/objectives'
import { createTask } from '@/lib/kinematics/task'
import { arm, at, planar, rad } from './arms'
import { expectClose } from './expect-close'

function wish(chain: Chain, q: readonly number[], ...objectives: Objective[]): number[] {
  const out = new Float64Array(q.length)
  fillWish(at(chain, q), createTask(), 0, objectives, out)
  return Array.from(out)
}

describe('posture', () => {
  it('asks each joint for gain times what it is away', () => {
    expectClose(wish(planar([1, 1]), [0.5, -0.2], { objective: 'posture', posture: [0.1, 0.3], gain: 2 }), [-0.8, 1], 1e-15)
  })

  it('goes the short way round on a continuous joint, and never on a revolute one', () => {
    const [away, home] = rad(170, -170) as [number, number]
    expectClose(
      wish(arm([{ type: 'continuous' }, { type: 'revolute' }]), [away, away], { objective: 'posture', posture: [home, home], gain: 1 }),
      rad(20, -340),
      1e-14,
    )
  })

  it('does not count whole turns of a continuous joint, however many', () => {
    const asked = wish(arm([{ type: 'continuous' }]), [0.3 + 1000 * 2 * Math.PI], { objective: 'posture', posture: [0], gain: 1 })
    expectClose(asked, [-0.3], 1e-11)
  })
})

describe('mid-range', () => {
  it('asks for the gradient of the joint range measure (Siciliano et al. 2009, section 3.5.1)', () => {
    expectClose(wish(planar([1], { lower: -1, upper: 2 }), [1.5], { objective: 'mid-range', gain: 1 }), [-0.1111111], 1e-7)
  })

  it('is the derivative of that measure over all joints of the chain', () => {
    const chain = arm([
      { lower: -1, upper: 2 },
      { lower: 0.5, upper: 3 },
      { lower: -2, upper: -1 },
    ])
    const measure = (q: readonly number[]) =>
      -chain.joints.reduce((sum, { lower, upper }, i) => sum + ((q[i]! - (lower! + upper!) / 2) / (upper! - lower!)) ** 2, 0) / 6
    const q = [1.5, 0.7, -1.9]
    const slope = q.map(
      (_value, i) => (measure(q.map((v, k) => (k === i ? v + 1e-6 : v))) - measure(q.map((v, k) => (k === i ? v - 1e-6 : v)))) / 2e-6,
    )
    expectClose(
      wish(chain, q, { objective: 'mid-range', gain: 3 }),
      slope.map((s) => 3 * s),
      1e-9,
    )
  })

  it('leaves joints without both bounds, or with no range between them, alone', () => {
    const chain = arm([
      { lower: -1, upper: 2 },
      { lower: -1 },
      { type: 'continuous' },
      { lower: 0.5, upper: 0.5 },
      { lower: 0, upper: 1e-300 },
    ])
    const asked = wish(chain, [1.5, 1, 1, 1, 1], { objective: 'mid-range', gain: 1 })
    expectClose(asked, [-0.1111111 / 5, 0, 0, 0, 0], 1e-7)
  })
})
