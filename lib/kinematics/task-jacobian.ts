import { decompose } from '@/lib/math/singular-values'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { jacobian } from './jacobian'
import { LINEAR_COMPONENTS, TWIST_SIZE, type Task } from './task'

/** Fills work.taskJacobian (components x n) at the pose in `work` with the rows that the task asks for, in its frame, linear rows
 *  divided by `characteristicLength` (m; 1 leaves SI). Returns the whole Jacobian in that frame, undivided. */
export function fillTaskJacobian(chain: Chain, work: Workspace, task: Task, characteristicLength = 1): Float64Array {
  const whole = jacobian(chain, work, task.frame)
  copyTaskRows(work, whole, task, characteristicLength)
  return whole
}

/** The same from a Jacobian that is there already, in the task's frame. */
export function copyTaskRows(work: Workspace, whole: Float64Array, task: Task, characteristicLength = 1): void {
  const n = work.q.length
  const { rows } = task
  if (rows.length === TWIST_SIZE && characteristicLength === 1) {
    for (let i = 0; i < whole.length; i++) work.taskJacobian[i] = whole[i]!
    return
  }
  for (let k = 0; k < rows.length; k++) {
    const row = rows[k]!
    const divisor = row < LINEAR_COMPONENTS ? characteristicLength : 1
    const to = work.taskJacobian
    if (divisor === 1) for (let j = 0; j < n; j++) to[k * n + j] = whole[row * n + j]!
    else for (let j = 0; j < n; j++) to[k * n + j] = whole[row * n + j]! / divisor
  }
}

/** The same, and work.taskValues with its singular value decomposition. Returns work.taskJacobian. */
export function taskJacobian(chain: Chain, work: Workspace, task: Task, characteristicLength = 1): Float64Array {
  fillTaskJacobian(chain, work, task, characteristicLength)
  decompose(work.taskJacobian, task.rows.length, chain.joints.length, work.taskValues)
  return work.taskJacobian
}
