import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { addManipulabilityGradient } from './manipulability-gradient'
import type { Task } from './task'

/** What spare freedom is spent on. posture: n values to come near to (rad or m); mid-range: the middles of the joint ranges;
 *  manipulability: away from poses that are singular for the task. gain in SI. */
export type Objective =
  | { readonly objective: 'posture'; readonly posture: ArrayLike<number>; readonly gain: number }
  | { readonly objective: 'mid-range'; readonly gain: number }
  | { readonly objective: 'manipulability'; readonly gain: number }

/** Narrower than this a range cannot be squared and divided by; it leaves no room to move in either. */
const NARROWEST_RANGE = 1e-100

/** Whether any of the objectives looks at the singular values of the pose. */
export function needSingularValues(objectives: readonly Objective[]): boolean {
  for (const { objective } of objectives) if (objective === 'manipulability') return true
  return false
}

/** Fills `wish` (n; rad/s or m/s) with the sum of the objectives' gradients at the pose in `work`, each times its gain, before any
 *  projection. Where needSingularValues, work.taskValues holds those of the task, with the given rank.
 *  Throws a RangeError when a posture has another length. Liégeois 1977. */
export function fillWish(work: Workspace, task: Task, rank: number, objectives: readonly Objective[], wish: Float64Array): void {
  for (let i = 0; i < wish.length; i++) wish[i] = 0
  for (const objective of objectives) {
    switch (objective.objective) {
      case 'posture':
        addPosture(work, objective.posture, objective.gain, wish)
        break
      case 'mid-range':
        addMidRange(work.chain, work.q, objective.gain, wish)
        break
      case 'manipulability':
        addManipulabilityGradient(work, task, rank, objective.gain, wish)
    }
  }
}

/** −gain·(q − posture), the short way round on continuous joints only: a revolute joint cannot go round. */
function addPosture({ prepared, q }: Workspace, posture: ArrayLike<number>, gain: number, wish: Float64Array): void {
  const { continuous } = prepared
  if (posture.length !== wish.length) throw new RangeError(`a posture needs ${wish.length} joint values, ${posture.length} were given`)
  for (let i = 0; i < wish.length; i++) {
    const difference = q[i]! - posture[i]!
    wish[i]! -= gain * (continuous[i] === 1 ? shortWayRound(difference) : difference)
  }
}

/** The angle in [−pi, pi] that differs from `angle` (rad) by whole turns; unchanged where it is there already. */
function shortWayRound(angle: number): number {
  return Math.abs(angle) <= Math.PI ? angle : Math.atan2(Math.sin(angle), Math.cos(angle))
}

/** The gradient −(1/n)(q − middle)/(upper − lower)². A joint without both bounds, or with an empty range, contributes nothing.
 *  Siciliano, Sciavicco, Villani & Oriolo 2009, section 3.5.1. */
function addMidRange(chain: Chain, q: ArrayLike<number>, gain: number, wish: Float64Array): void {
  for (let i = 0; i < wish.length; i++) {
    const { lower, upper } = chain.joints[i]!
    if (lower === null || upper === null) continue
    const range = upper - lower
    if (range > NARROWEST_RANGE) wish[i]! -= (gain * (q[i]! - (lower + upper) / 2)) / wish.length / range / range
  }
}
