import type { Objective } from './objectives'
import type { Task } from './task'

/** What a configuration is looked for by. */
export interface PoseSearch {
  /** Components that count; the others are free. */
  readonly task: Task
  /** Transform of 12 numbers; none: the tip itself. */
  readonly tipFromTool?: ArrayLike<number>
  /** m. */
  readonly positionTolerance: number
  /** rad. */
  readonly orientationTolerance: number
  /** How many starting points are tried at most, the seed included. */
  readonly attempts: number
  /** How many steps each of them is given at most. */
  readonly iterations: number
  /** What freedom that is left over is spent on once the pose is reached. */
  readonly secondary: readonly Objective[]
}

/** What is used where nothing is said. */
export const DEFAULT_SEARCH = Object.freeze({ positionTolerance: 1e-6, orientationTolerance: 1e-6, attempts: 8, iterations: 100, secondary: Object.freeze([]) })

/** Why a pose was not reached. unreachable: no joint motion brings the tool nearer, with no limit in the way, or the goal is proved to be
 *  too far; at-limits: joint limits are in the way; stalled: the steps ran out, or ended at places of different quality. */
export type SearchReason = 'unreachable' | 'at-limits' | 'stalled'

/** The best that was found. */
export interface FoundPose {
  readonly converged: boolean
  /** n, within the joint limits. */
  readonly configuration: number[]
  /** m and rad, of the components that count. */
  readonly positionError: number
  readonly orientationError: number
  /** Over all attempts. */
  readonly iterations: number
  readonly attempts: number
  readonly reason?: SearchReason
}
