import { numericalRank } from '@/lib/math/numerical-rank'
import { decompose } from '@/lib/math/singular-values'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { LINEAR_COMPONENTS, type Task } from './task'
import { fillTaskJacobian, taskJacobian } from './task-jacobian'

/** Singular values up to this part of the largest count as 0, unless a caller says otherwise. */
export const RANK_TOLERANCE = 1e-9

/** Below this smallest singular value a pose is called near singular (SI, unscaled). */
export const NEAR_SINGULAR = 0.02

/** How well a pose moves in every direction of a task. */
export interface Measures {
  /** min(components, n), descending. */
  readonly singularValues: number[]
  readonly rank: number
  /** The product of the singular values. Yoshikawa 1985. */
  readonly manipulability: number
  /** First over last singular value; null where the rank is not full. Salisbury & Craig 1982. */
  readonly conditionNumber: number | null
}

export interface MeasureOptions {
  /** Divides the linear rows, m. */
  readonly characteristicLength?: number
  /** Relative to the largest singular value. */
  readonly tolerance?: number
}

/** The measures of a task at the pose in `work` (see forwardKinematics). Leaves the decomposition in work.taskValues. */
export function measures(chain: Chain, work: Workspace, task: Task, options: MeasureOptions = {}): Measures {
  taskJacobian(chain, work, task, options.characteristicLength)
  return measuresOf(work, task, options.tolerance)
}

/** Singular values of the linear and of the angular components of a task, each by itself: of one unit each (m/s, and rad/s, per unit of
 *  joint rate), so that they need no characteristic length. Empty where the task has none of the kind. */
export interface PartMeasures {
  /** min(linear components, n), descending. */
  readonly translational: number[]
  /** min(angular components, n), descending. */
  readonly rotational: number[]
}

/** The singular values of both parts of a task at the pose in `work` (see forwardKinematics). */
export function partMeasures(chain: Chain, work: Workspace, task: Task): PartMeasures {
  const n = chain.joints.length
  fillTaskJacobian(chain, work, task)
  const linear = task.rows.filter((row) => row < LINEAR_COMPONENTS).length
  const valuesOf = (first: number, last: number): number[] => {
    decompose(work.taskJacobian.subarray(first * n, last * n), last - first, n, work.taskValues)
    return Array.from(work.taskValues.values.subarray(0, Math.min(last - first, n)))
  }
  return { translational: valuesOf(0, linear), rotational: valuesOf(linear, task.rows.length) }
}

/** The measures of the decomposition that `work` already holds. */
export function measuresOf(work: Workspace, task: Task, tolerance = RANK_TOLERANCE): Measures {
  const n = work.q.length
  const m = task.rows.length
  const count = Math.min(m, n)
  const singularValues = Array.from(work.taskValues.values.subarray(0, count))
  const rank = rankOf(work, m, tolerance)
  const manipulability = singularValues.reduce((product, value) => product * value, 1)
  const full = count > 0 && rank === count
  return { singularValues, rank, manipulability, conditionNumber: full ? singularValues[0]! / singularValues[count - 1]! : null }
}

/** The rank of a task of m components, by the singular values that `work` holds. */
export function rankOf(work: Workspace, m: number, tolerance = RANK_TOLERANCE): number {
  const n = work.q.length
  return numericalRank(work.taskValues.values, Math.min(m, n), tolerance, Math.max(m, n))
}
