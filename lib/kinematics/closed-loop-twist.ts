import { invertTransform, multiplyTransforms, positionOf } from '@/lib/math/rigid-transform'
import { rotationVectorOf } from '@/lib/math/rotation-vector'
import { turnIntoFrame } from '@/lib/math/twist-columns'
import type { Workspace } from './create-workspace'
import type { TaskFrame } from './task'

/** Where the tool shall be, how it shall move there, and how hard an error is worked off. */
export interface Reference {
  /** Transform of 12 numbers, tool in base. */
  readonly baseFromGoal: ArrayLike<number>
  /** Feed-forward, 6 numbers in the task's frame; none: at rest. */
  readonly twist?: ArrayLike<number>
  /** 1/s. */
  readonly positionGain: number
  readonly orientationGain: number
}

/** The twist (6, in `frame`, at the tool point) that follows a reference from the pose in `work`: feed-forward, plus gain times
 *  position difference, plus gain times the rotation vector from the tool to the goal, the short way round.
 *  Siciliano, Sciavicco, Villani & Oriolo 2009, section 3.7, with the rotation vector as orientation error. */
export function closedLoopTwist(work: Workspace, reference: Reference, frame: TaskFrame): number[] {
  const { baseFromGoal, twist, positionGain, orientationGain } = reference
  const toolFromBase = new Float64Array(12)
  const leftToTurn = new Float64Array(12)
  invertTransform(work.baseFromTool, toolFromBase)
  // Its rotation is R_goal · R_toolᵀ, in base axes.
  multiplyTransforms(baseFromGoal, 0, toolFromBase, 0, leftToTurn, 0)
  const now = positionOf(work.baseFromTool)
  const away = positionOf(baseFromGoal).map((p, i) => p - now[i]!)
  const error = [...away.map((d) => positionGain * d), ...rotationVectorOf(leftToTurn).map((r) => orientationGain * r)]
  if (frame === 'tip') turnIntoFrame(work.baseFromTool, error, 1, error)
  return error.map((e, i) => e + (twist?.[i] ?? 0))
}
