import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { nullSpace } from '@/lib/kinematics/null-space'
import { resolveRates } from '@/lib/kinematics/resolve-rates'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask, type Task, type TwistComponent } from '@/lib/kinematics/task'
import { at, golden, numbers, randomArm, randomPose } from '../lib/kinematics/arms'
import { expectClose } from '../lib/kinematics/expect-close'
import { askPython } from './ask-python'

interface Witness {
  readonly values: number[]
  readonly projector: number[][]
  readonly rates: number[]
  readonly damped: number[]
}

const DAMPING = 0.07
const TASKS: readonly (readonly TwistComponent[] | undefined)[] = [undefined, ['vx', 'vy', 'vz'], ['vx', 'vy', 'vz', 'wx', 'wy'], ['vz', 'wy']]

interface Case {
  readonly chain: Chain
  readonly q: number[]
  readonly task: Task
  readonly twist: number[]
  readonly matrix: number[][]
}

const cases: Case[] = Array.from({ length: 240 }, (_unused, i) => {
  const chain = i % 4 === 0 ? golden() : randomArm(i + 1)
  const task = createTask(TASKS[i % TASKS.length], i % 3 === 0 ? 'tip' : 'base')
  const q = randomPose(chain, i + 1)
  // Every tenth golden arm is stretched, which costs it a direction.
  if (i % 40 === 0) q[3] = 0
  const work = at(chain, q)
  nullSpace(chain, work, task, structuralLoss(chain, task))
  const n = chain.joints.length
  const matrix = task.rows.map((_row, k) => Array.from(work.taskJacobian.subarray(k * n, (k + 1) * n)))
  const random = numbers(i + 1)
  return { chain, q, task, twist: Array.from({ length: 6 }, () => random() - 0.5), matrix }
})

const witnesses = askPython<Witness[]>('linear-algebra.py', {
  matrices: cases.map(({ matrix }) => matrix),
  asked: cases.map(({ task, twist }) => task.rows.map((row) => twist[row]!)),
  damping: DAMPING,
})

/** First over last singular value that counts. */
function condition({ values }: Witness): number {
  return values[0]! / values.filter((value) => value > 1e-9 * values[0]!).at(-1)!
}

describe('NumPy', () => {
  it('has the same singular values', () => {
    cases.forEach(({ chain, q, task }, i) => {
      const { singularValues } = nullSpace(chain, at(chain, q), task, structuralLoss(chain, task))
      expectClose(singularValues, witnesses[i]!.values, 1e-14 * Math.max(1, witnesses[i]!.values[0]!))
    })
  })

  it('has the same projector', () => {
    cases.forEach(({ chain, q, task }, i) => {
      const { projector } = nullSpace(chain, at(chain, q), task, structuralLoss(chain, task), { withProjector: true })
      expectClose(projector!.flat(), witnesses[i]!.projector.flat(), 1e-14 * Math.max(10, condition(witnesses[i]!)))
    })
  })

  it('has the same least rates, and the same damped ones', () => {
    cases.forEach(({ chain, q, task, twist }, i) => {
      const structural = structuralLoss(chain, task)
      const policy = { task, structural, secondary: [], limits: { rates: 'report', derating: 1 } } as const
      const least = resolveRates(chain, at(chain, q), twist, { ...policy, inverse: { method: 'truncated', tolerance: 1e-9 } }).rates
      const damped = resolveRates(chain, at(chain, q), twist, { ...policy, inverse: { method: 'damped', damping: DAMPING } }).rates
      const witness = witnesses[i]!
      const size = (v: readonly number[]) => Math.max(1, ...v.map(Math.abs))
      expectClose(least, witness.rates, 1e-14 * Math.max(10, condition(witness)) * size(witness.rates))
      expectClose(damped, witness.damped, 1e-14 * Math.max(10, witness.values[0]! / DAMPING) * size(witness.damped))
    })
  })

  it('met hard poses too: some that have lost a direction, some that nearly have', () => {
    expect(cases.filter(({ matrix }, i) => witnesses[i]!.values.at(-1)! < 1e-9 && matrix.length <= matrix[0]!.length).length).toBeGreaterThan(2)
    expect(witnesses.filter((witness) => condition(witness) > 50).length).toBeGreaterThan(5)
  })
})
