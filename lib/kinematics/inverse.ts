import { numericalRank } from '@/lib/math/numerical-rank'
import type { Workspace } from './create-workspace'
import { RANK_TOLERANCE } from './measures'

/** How a task Jacobian is inverted. tolerance: relative to the largest singular value. damping, maxDamping: λ, enters squared.
 *  threshold: of the smallest singular value. All in SI, of the unscaled Jacobian. */
export type Inverse =
  | { readonly method: 'truncated'; readonly tolerance: number }
  | { readonly method: 'damped'; readonly damping: number }
  | { readonly method: 'adaptive-damped'; readonly threshold: number; readonly maxDamping: number }
  | { readonly method: 'filtered'; readonly threshold: number; readonly damping: number }

/** What is used where nothing is said. */
export const DEFAULT_INVERSE = Object.freeze({ method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 } as const satisfies Inverse)

/** The tolerance that decides rank, and with it the null space, which is never taken from a damped inverse. */
export function rankTolerance(inverse: Inverse): number {
  return inverse.method === 'truncated' ? inverse.tolerance : RANK_TOLERANCE
}

/** The smallest singular value from which on an inverse damps nothing. */
export function undampedFrom(inverse: Inverse): number {
  if (inverse.method === 'truncated') return 0
  if (inverse.method === 'damped') return inverse.damping === 0 ? 0 : Number.POSITIVE_INFINITY
  return inverse.threshold
}

/** Fills work.gains, work.lambdas and work.delivered for the first `count` singular values in `work` and returns the largest λ.
 *  Damped: σ / (σ² + λ²), Nakamura & Hanafusa 1986, Wampler 1986. Without damping 1/σ up to the rank, 0 beyond.
 *  Adaptive: λ² = (1 − (σmin/ε)²)·λmax² while σmin < ε, Chiaverini, Siciliano & Egeland 1994.
 *  Filtered: only the directions that vanish are damped, each by itself, Maciejewski & Klein 1988. */
export function fillGains(work: Workspace, count: number, rank: number, size: number, inverse: Inverse): number {
  const { gains, lambdas, delivered } = work
  const { values } = work.taskValues
  let largest = 0
  for (let k = 0; k < count; k++) {
    lambdas[k] = dampingOf(inverse, values[k]!, values[count - 1]!)
    largest = Math.max(largest, lambdas[k]!)
  }
  // A value below rounding has a direction that is rounding too; damping leaves the rest as it is.
  const divisible = largest > 0 ? numericalRank(values, count, 0, size) : rank
  for (let k = 0; k < count; k++) {
    const lambda = lambdas[k]!
    gains[k] = k < divisible ? 1 / (values[k]! + lambda * (lambda / values[k]!)) : 0
    delivered[k] = gains[k]! * values[k]!
  }
  return largest
}

/** λ of the direction with the given singular value. */
function dampingOf(inverse: Inverse, value: number, smallest: number): number {
  switch (inverse.method) {
    case 'truncated':
      return 0
    case 'damped':
      return inverse.damping
    case 'adaptive-damped':
      return Math.sqrt(below(smallest, inverse.threshold)) * inverse.maxDamping
    case 'filtered':
      // Whole up to half the threshold, then less, so that the rates do not jump where a direction crosses it.
      return Math.sqrt(Math.min(1, (4 / 3) * below(value, inverse.threshold))) * inverse.damping
  }
}

/** 1 − (value/threshold)², and 0 from the threshold on. */
function below(value: number, threshold: number): number {
  if (value >= threshold) return 0
  const part = value / threshold
  return 1 - part * part
}
