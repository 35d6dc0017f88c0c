import { addCross } from '@/lib/math/cross'
import { dot } from '@/lib/math/dot'
import { turnOutOfFrame } from '@/lib/math/twist-columns'
import type { Workspace } from './create-workspace'
import { motionTwists } from './motion-twists'
import { LINEAR_COMPONENTS, TWIST_SIZE, type Task } from './task'

/** Adds gain · ∂w/∂q to `wish` (n), w being the manipulability of the task (the product of its singular values, in work.taskValues with
 *  the given rank): ∂w/∂qᵢ = w·tr(∂J/∂qᵢ·J⁺), Yoshikawa 1985. Where w is 0 it has no gradient, and nothing is added.
 *  w·J⁺ is formed from products of the other singular values, so that nothing is divided by a small one. */
export function addManipulabilityGradient(work: Workspace, task: Task, rank: number, gain: number, wish: Float64Array): void {
  const n = wish.length
  const m = task.rows.length
  const count = Math.min(m, n)
  if (rank < count || count === 0) return
  const pulls = pullsOf(work, task, count)
  if (task.frame === 'tip') turnOutOfFrame(work.baseFromTool, pulls, n)

  const { joint } = work.prepared
  const twists = motionTwists(work)
  const { turnedAlong, carriedBefore, pull } = work.slopes
  turnedAlong.fill(0)
  carriedBefore.fill(0)
  // tr(∂J/∂qᵢ·w·J⁺) = ωᵢ · Σ over j >= i of (vⱼ × aⱼ + ωⱼ × bⱼ) + vᵢ · Σ over j < i of (aⱼ × ωⱼ), where (a; b) are the pulls.
  // In tool axes each twist is also turned back by the whole turning: that is the same sum over all j, taken off.
  if (task.frame === 'base') for (let i = 0; i < joint.length; i++) addTurned(work, i, 1)
  for (let i = 0; i < joint.length; i++) {
    const v = TWIST_SIZE * i
    const w = v + LINEAR_COMPONENTS
    const slope = dot(twists, w, turnedAlong, 0, LINEAR_COMPONENTS) + dot(twists, v, carriedBefore, 0, LINEAR_COMPONENTS)
    wish[joint[i]!]! += gain * slope
    addTurned(work, i, -1)
    addCross(pull, 0, twists, w, 1, carriedBefore, 0)
  }
}

/** Reads the pull on motion i, and adds weight · (v × a + ω × b). */
function addTurned({ prepared, motionTwists: twists, slopes, q }: Workspace, i: number, weight: number): void {
  const { pull, pulls, turnedAlong } = slopes
  for (let r = 0; r < TWIST_SIZE; r++) pull[r] = pulls[r * q.length + prepared.joint[i]!]!
  addCross(twists, TWIST_SIZE * i, pull, 0, weight, turnedAlong, 0)
  addCross(twists, TWIST_SIZE * i + LINEAR_COMPONENTS, pull, LINEAR_COMPONENTS, weight, turnedAlong, 0)
}

/** w·(J⁺)ᵀ as a 6 x n matrix in twist order, 0 outside the task: what each entry of the Jacobian adds to w. */
function pullsOf(work: Workspace, task: Task, count: number): Float64Array {
  const { left, values, right } = work.taskValues
  const n = work.q.length
  const m = task.rows.length
  const { pulls } = work.slopes
  pulls.fill(0)
  for (let k = 0; k < count; k++) {
    let others = 1
    for (let l = 0; l < count; l++) if (l !== k) others *= values[l]!
    for (let row = 0; row < m; row++) {
      const part = others * left[k * m + row]!
      const at = task.rows[row]! * n
      for (let j = 0; j < n; j++) pulls[at + j]! += part * right[k * n + j]!
    }
  }
  return pulls
}
