import { norm } from '@/lib/math/norm'
import type { Chain } from './chain'
import { createWorkspace, type Workspace } from './create-workspace'
import { forwardKinematics } from './forward-kinematics'
import { jacobian } from './jacobian'
import type { Task } from './task'

/** How far the fastest joint is moved to see what changes, rad or m: large beside rounding, small beside any motion. */
const STEP = 1e-3
/** A growth below this part of the largest singular value is rounding. */
const NOTICEABLE = 1e-9

/** Whether moving on by `motion` (n joint rates) brings a lost `direction` (6 numbers, in the task's frame) within reach: whether the
 *  joints' hold on it is larger after a small step from the pose in `work`. work.taskValues is that of the pose. */
export function freesDirection(
  chain: Chain,
  work: Workspace,
  task: Task,
  direction: readonly number[],
  motion: ArrayLike<number>,
): boolean {
  return growthOfHold(chain, work, task, direction, motion) > NOTICEABLE * work.taskValues.values[0]!
}

/** By how much a small step along `motion` (n) makes the joints' hold on `direction`, the norm of directionᵀ·J, grow; 0 for no motion. */
export function growthOfHold(
  chain: Chain,
  work: Workspace,
  task: Task,
  direction: readonly number[],
  motion: ArrayLike<number>,
): number {
  let fastest = 0
  for (let i = 0; i < motion.length; i++) fastest = Math.max(fastest, Math.abs(motion[i]!))
  if (fastest === 0) return 0
  const ahead = (work.ahead ??= createWorkspace(chain))
  const q = Float64Array.from(work.q, (value, i) => value + (STEP / fastest) * motion[i]!)
  forwardKinematics(chain, work.q, ahead, work.tipFromTool)
  const before = hold(jacobian(chain, ahead, task.frame), direction, q.length)
  forwardKinematics(chain, q, ahead, work.tipFromTool)
  return hold(jacobian(chain, ahead, task.frame), direction, q.length) - before
}

function hold(whole: Float64Array, direction: readonly number[], n: number): number {
  const row = new Float64Array(n)
  direction.forEach((part, k) => {
    for (let j = 0; j < n; j++) row[j]! += part * whole[k * n + j]!
  })
  return norm(row)
}
