import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { addManipulabilityGradient } from '@/lib/kinematics/manipulability-gradient'
import { measures } from '@/lib/kinematics/measures'
import type { Objective } from '@/lib/kinematics/objectives'
import { createTask, type Task } from '@/lib/kinematics/task'
import { at, golden, GOLDEN_POSE, planar, rad, randomArm, randomPose, transform } from './arms'
import { askRates, EXACT, PLANE, flat } from './ask-rates'
import { expectClose } from './expect-close'

function gradient(chain: Chain, q: readonly number[], task: Task, gain = 1, tool?: number[]): number[] {
  const work = at(chain, q, tool)
  const { rank } = measures(chain, work, task)
  const wish = new Float64Array(q.length)
  addManipulabilityGradient(work, task, rank, gain, wish)
  return Array.from(wish)
}

describe('the gradient of manipulability', () => {
  it('is that of the planar 3R arm (METHODS 9)', () => {
    expectClose(gradient(planar([1, 1, 1]), rad(30, 30, 30), PLANE), [0, 1.2773882858, 1.4943820425], 1e-9)
  })

  it.each([0.4, -0.4, 2, -2])('is l1·l2·cos q2 with the sign of sin q2 for a planar 2R arm at q2 = %s', (q2) => {
    expectClose(gradient(planar([0.4, 0.3]), [0.7, q2], PLANE), [0, 0.12 * Math.cos(q2) * Math.sign(Math.sin(q2))], 1e-14)
  })

  it.each([
    ['the whole task', undefined, 'base'],
    ['the whole task', undefined, 'tip'],
    ['a task of five components', ['vx', 'vy', 'vz', 'wx', 'wy'], 'tip'],
    ['a task of two components', ['vx', 'wz'], 'base'],
    ['a task of two components', ['vy', 'wx'], 'tip'],
  ] as const)('is the derivative of %s (%o, %s axes), with prismatic joints, mimics and a tool', (_name, components, frame) => {
    const tool = transform([0.1, 0.2, -0.3], [1, -0.5, 2])
    const task = createTask(components, frame)
    for (let seed = 1; seed <= 30; seed++) {
      const chain = seed % 3 === 0 ? golden() : randomArm(seed)
      const q = randomPose(chain, seed)
      const step = 1e-6
      const w = (by: number, joint: number) => measures(chain, at(chain, q.map((value, i) => (i === joint ? value + by : value)), tool), task).manipulability
      const { singularValues, rank, manipulability } = measures(chain, at(chain, q, tool), task)
      // Where a value is nearly 0 the measure has a kink that differences cannot see round.
      if (rank < singularValues.length || singularValues.at(-1)! < 1e-2 * singularValues[0]!) continue
      const differences = q.map((_value, i) => (w(step, i) - w(-step, i)) / (2 * step))
      expectClose(gradient(chain, q, task, 1, tool), differences, 1e-7 * Math.max(manipulability, ...differences.map(Math.abs)))
    }
  })

  it('is nothing where manipulability is 0 and has no gradient', () => {
    expect(gradient(planar([1, 1, 1]), [0.3, 0, 0], PLANE)).toEqual([0, 0, 0])
    expect(gradient(golden(), rad(10, 20, 30, 0, 50, 60, 70), createTask())).toEqual([0, 0, 0, 0, 0, 0, 0])
  })

  it('leads the self-motion of the 7R arm to higher manipulability, as an objective', () => {
    const chain = golden()
    let q = [...GOLDEN_POSE]
    const of = () => measures(chain, at(chain, q), createTask()).manipulability
    const before = of()
    for (let i = 0; i < 50; i++) {
      const now = of()
      const { secondaryRates } = askRates(chain, q, [0, 0, 0, 0, 0, 0], { secondary: [{ objective: 'manipulability', gain: 10 }], inverse: EXACT })
      q = q.map((value, k) => value + 0.05 * secondaryRates[k]!)
      expect(of()).toBeGreaterThanOrEqual(now - 1e-9)
    }
    expect(of()).toBeGreaterThan(before * 1.009)
  })

  it('adds up with other objectives, by gain', () => {
    const of = (...gains: number[]) =>
      askRates(planar([1, 1, 1]), rad(30, 30, 30), flat(0, 0), {
        task: PLANE, inverse: EXACT,
        secondary: gains.map((gain, i): Objective => (i === 0 ? { objective: 'manipulability', gain } : { objective: 'posture', posture: [0, 0, 0], gain })),
      }).secondaryRates
    expectClose(of(2, 3), of(2, 0).map((rate, i) => rate + of(0, 3)[i]!), 1e-15)
  })
})
