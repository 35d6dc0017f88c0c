import type { Inverse } from './inverse'
import type { Objective } from './objectives'
import type { RateLimits } from './rate-bounds'
import type { StructuralLoss } from './structural-loss'
import type { Task } from './task'

/** Everything that stays the same over a batch. */
export interface RatePolicy {
  readonly task: Task
  readonly inverse: Inverse
  /** n, from 1e-12 to 1e12: what a unit of each joint's rate costs, squared. None: 1 each. The spare motion is then I − J_W⁺·J. */
  readonly jointWeights?: ArrayLike<number>
  /** Added up with their gains. */
  readonly secondary: readonly Objective[]
  readonly limits: RateLimits
  /** From structuralLoss for this chain, task and tool, with tolerance rankTolerance(inverse) and characteristic length 1. */
  readonly structural: StructuralLoss
}

/** What changes from one configuration of a batch to the next, beside the pose and the twist. */
export interface Instant {
  /** n, rad/s or m/s: the rates commanded a period ago. */
  readonly previousRates?: ArrayLike<number>
  /** 1/s: the larger gain of a closed loop, where the twist comes from one. */
  readonly gain?: number
}
