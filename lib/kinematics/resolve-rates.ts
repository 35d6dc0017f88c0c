import { dot } from '@/lib/math/dot'
import { norm } from '@/lib/math/norm'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { diagnose, type Diagnosis } from './diagnose'
import { fillGains, rankTolerance, type Inverse } from './inverse'
import { jacobian } from './jacobian'
import { measuresOf } from './measures'
import { fillWish, type Objective } from './objectives'
import { scaleToRates } from './rate-scaling'
import type { StructuralLoss } from './structural-loss'
import { LINEAR_COMPONENTS, TWIST_SIZE, type Task } from './task'
import { taskJacobian } from './task-jacobian'

/** What happens where a joint would exceed its rate limit: slow down and keep the direction, or say the rates as they are. */
export interface RateLimits {
  readonly rates: 'scale' | 'report'
  /** Multiplies every known rate limit, in (0, 1]. */
  readonly derating: number
}

/** Everything that stays the same over a batch. */
export interface RatePolicy {
  readonly task: Task
  readonly inverse: Inverse
  /** Added up with their gains. */
  readonly secondary: readonly Objective[]
  readonly limits: RateLimits
  /** From structuralLoss for this chain, task and tool, with tolerance rankTolerance(inverse) and characteristic length 1. */
  readonly structural: StructuralLoss
}

/** Joint rates and what became of the twist that was asked for. SI; twists at the tool point in the task's frame. */
export interface RateOutcome {
  /** n: scale · primaryRates + secondaryScale · secondaryRates. */
  readonly rates: number[]
  /** n: what the task asks. */
  readonly primaryRates: number[]
  /** n: what the objectives ask of the spare freedom. */
  readonly secondaryRates: number[]
  readonly scale: number
  readonly secondaryScale: number
  /** 6: what the tool does at `rates`, also outside the task. */
  readonly achievedTwist: number[]
  /** 6: achieved − asked; 0 outside the task. */
  readonly residual: number[]
  /** min(components, n), descending, of the unscaled task Jacobian. */
  readonly singularValues: number[]
  readonly rank: number
  readonly nullity: number
  /** λ; 0 where nothing is damped. */
  readonly damping: number
  readonly manipulability: number
  /** m/s, of the tool point at `rates`. */
  readonly toolSpeed: number
  readonly diagnosis: Diagnosis[]
}

/** Part of the wished rates that is rounding of the projection. Left standing, a joint that the spare freedom cannot move would have
 *  a rate of 1e-17, and a rate limit could then depend on its sign. */
const PROJECTION_ROUNDING = 64 * Number.EPSILON

/** Joint rates that give the tool `twist` (6, in the task's frame, at the tool point; components outside the task are ignored) as nearly
 *  as the pose in `work` allows (see forwardKinematics), spare freedom spent on the objectives. Every number is finite for inputs up to
 *  1e9. Throws a RangeError when `twist` or a posture has the wrong length. Whitney 1969; Liégeois 1977. */
export function resolveRates(chain: Chain, work: Workspace, twist: ArrayLike<number>, policy: RatePolicy): RateOutcome {
  if (twist.length !== TWIST_SIZE) throw new RangeError(`a twist has ${TWIST_SIZE} components, ${twist.length} were given`)
  const { task, inverse, secondary, limits, structural } = policy
  const n = chain.joints.length
  const m = task.rows.length
  taskJacobian(chain, work, task)
  const { singularValues, rank, manipulability } = measuresOf(work, task, rankTolerance(inverse))
  const damping = fillGains(work, Math.min(m, n), rank, Math.max(m, n), inverse)
  for (let k = 0; k < m; k++) work.asked[k] = twist[task.rows[k]!]!
  fillPrimary(work, m)
  fillWish(chain, work.q, secondary, work.secondary)
  projectOntoNullSpace(work, rank)

  const { scale, secondaryScale } =
    limits.rates === 'scale' ? scaleToRates(chain, work.primary, work.secondary, limits.derating) : { scale: 1, secondaryScale: 1 }
  // Adding 0 turns −0 into 0, which is the same number and looks less odd on the wire.
  const primaryRates = Array.from(work.primary, (rate) => rate + 0)
  const secondaryRates = Array.from(work.secondary, (rate) => rate + 0)
  const rates = primaryRates.map((rate, i) => scale * rate + secondaryScale * secondaryRates[i]! + 0)

  const whole = jacobian(chain, work, task.frame)
  const achievedTwist = Array.from({ length: TWIST_SIZE }, (_component, row) => dot(whole, row * n, rates, 0, n))
  const residual = achievedTwist.map((achieved, row) => (task.rows.includes(row) ? achieved - twist[row]! : 0))
  const numbers = { rates, primaryRates, secondaryRates, scale, secondaryScale, singularValues, rank, nullity: n - rank, damping }
  return {
    ...numbers,
    achievedTwist,
    residual,
    manipulability,
    toolSpeed: norm(achievedTwist, 0, LINEAR_COMPONENTS),
    diagnosis: diagnose(chain, work, task, structural, { ...numbers, objectives: secondary.length, derating: limits.derating }),
  }
}

/** work.primary = Σ gain · (left · asked) · right. */
function fillPrimary(work: Workspace, m: number): void {
  const { left, right } = work.taskValues
  const n = work.q.length
  work.primary.fill(0)
  for (let k = 0; k < Math.min(m, n); k++) {
    const amount = work.gains[k]! * dot(left, k * m, work.asked, 0, m)
    for (let j = 0; j < n; j++) work.primary[j]! += amount * right[k * n + j]!
  }
}

/** work.secondary = (I − J⁺J) · work.secondary, from the undamped inverse: a damped one would leak into the task. Twice, so that
 *  what rounding leaves of the first pass is taken out too. */
function projectOntoNullSpace(work: Workspace, rank: number): void {
  const { right } = work.taskValues
  const { secondary } = work
  const n = secondary.length
  const rounding = PROJECTION_ROUNDING * norm(secondary)
  for (let pass = 0; pass < 2; pass++) {
    for (let k = 0; k < rank; k++) {
      const along = dot(right, k * n, secondary, 0, n)
      for (let j = 0; j < n; j++) secondary[j]! -= along * right[k * n + j]!
    }
  }
  for (let j = 0; j < n; j++) if (Math.abs(secondary[j]!) <= rounding) secondary[j] = 0
}
