import { createSingularValues, decompose } from '@/lib/math/singular-values'
import { numericalRank } from '@/lib/math/numerical-rank'
import type { Chain } from './chain'
import { createWorkspace } from './create-workspace'
import { forwardKinematics } from './forward-kinematics'
import { RANK_TOLERANCE, type MeasureOptions } from './measures'
import { seededConfigurations } from './seeded-configurations'
import type { Task } from './task'
import { taskJacobian } from './task-jacobian'

/** How many configurations speak for all of a chain's poses. */
const SAMPLES = 32
/** A direction this far (as a sine) out of everything reached is not reached: rank counts down to 1e-9, and there a singular
 *  vector is good to about rounding over 1e-9. */
const OUT_OF_REACH = 1e-6

/** What a chain can do in a task at its better poses, against which a loss at one pose is judged. */
export interface StructuralLoss extends Span {
  /** The largest rank met. */
  readonly largestRank: number
}

/** Orthonormal rows of `components` numbers, the first `reachedCount` of which span what is reached. */
export interface Span {
  readonly reached: Float64Array
  readonly reachedCount: number
}

export interface StructuralOptions extends MeasureOptions {
  /** Transform of 12 numbers. */
  readonly tipFromTool?: ArrayLike<number>
}

/** Examines 32 seeded configurations of the chain. The answer holds for one chain, task, tool, characteristic length and tolerance:
 *  ask once and use it for a whole batch. */
export function structuralLoss(chain: Chain, task: Task, options: StructuralOptions = {}): StructuralLoss {
  const steps = structuralLossInSteps(chain, task, options)
  for (;;) {
    const step = steps.next()
    if (step.done === true) return step.value
  }
}

/** The same, pausing after each configuration: on a chain of thousands of joints they take too long to hold an event loop for. */
export function* structuralLossInSteps(chain: Chain, task: Task, options: StructuralOptions = {}): Generator<void, StructuralLoss> {
  const work = createWorkspace(chain)
  const m = task.rows.length
  const n = chain.joints.length
  let span: Span = { reached: new Float64Array(m * m), reachedCount: 0 }
  let largestRank = 0
  for (const q of seededConfigurations(chain, SAMPLES)) {
    forwardKinematics(chain, q, work, options.tipFromTool)
    taskJacobian(chain, work, task, options.characteristicLength)
    const rank = numericalRank(work.taskValues.values, Math.min(m, n), options.tolerance ?? RANK_TOLERANCE, Math.max(m, n))
    largestRank = Math.max(largestRank, rank)
    span = join(m, span, { reached: work.taskValues.left, reachedCount: rank })
    yield
  }
  return { ...span, largestRank }
}

/** What to hold against a pose with left singular vectors `left`: directions outside the answer's span are lost there for good.
 *  That is all that is lost where the rank is the largest the chain ever has, else what neither this nor any seeded pose reaches. */
export function structuralSplit(left: Float64Array, m: number, rank: number, known: StructuralLoss): Span {
  const here = { reached: left, reachedCount: rank }
  return rank >= known.largestRank ? here : join(m, known, here)
}

/** An orthonormal basis of all m directions, those spanned by a and b together first. */
function join(m: number, a: Span, b: Span): Span {
  const columns = a.reachedCount + b.reachedCount
  const gathered = new Float64Array(m * columns)
  for (let i = 0; i < m; i++) {
    for (let k = 0; k < a.reachedCount; k++) gathered[i * columns + k] = a.reached[k * m + i]!
    for (let k = 0; k < b.reachedCount; k++) gathered[i * columns + a.reachedCount + k] = b.reached[k * m + i]!
  }
  const joined = createSingularValues(m, columns)
  decompose(gathered, m, columns, joined)
  let reachedCount = 0
  while (reachedCount < Math.min(m, columns) && joined.values[reachedCount]! > OUT_OF_REACH) reachedCount++
  return { reached: joined.left, reachedCount }
}
