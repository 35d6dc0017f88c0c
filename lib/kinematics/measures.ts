import { numericalRank } from '@/lib/math/numerical-rank'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import type { Task } from './task'
import { taskJacobian } from './task-jacobian'

/** Singular values up to this part of the largest count as 0, unless a caller says otherwise. */
export const RANK_TOLERANCE = 1e-9

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

/** The same of the decomposition that `work` already holds. */
export function measuresOf(work: Workspace, task: Task, tolerance = RANK_TOLERANCE): Measures {
  const n = work.q.length
  const m = task.rows.length
  const count = Math.min(m, n)
  const singularValues = Array.from(work.taskValues.values.subarray(0, count))
  const rank = numericalRank(singularValues, count, tolerance, Math.max(m, n))
  const manipulability = singularValues.reduce((product, value) => product * value, 1)
  const full = count > 0 && rank === count
  return { singularValues, rank, manipulability, conditionNumber: full ? singularValues[0]! / singularValues[count - 1]! : null }
}
