import { numericalRank } from '@/lib/math/numerical-rank'
import type { Workspace } from './create-workspace'
import { RANK_TOLERANCE } from './measures'

/** How a task Jacobian is inverted. tolerance: relative to the largest singular value. damping, maxDamping: λ, enters squared.
 *  threshold: of the smallest singular value. All in SI, of the unscaled Jacobian. */
export type Inverse =
  | { readonly method: 'truncated'; readonly tolerance: number }
  | { readonly method: 'damped'; readonly damping: number }
  | { readonly method: 'adaptive-damped'; readonly threshold: number; readonly maxDamping: number }

/** What is used where nothing is said. */
export const DEFAULT_INVERSE: Inverse = Object.freeze({ method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 })

/** The tolerance that decides rank, and with it the null space, which is never taken from a damped inverse. */
export function rankTolerance(inverse: Inverse): number {
  return inverse.method === 'truncated' ? inverse.tolerance : RANK_TOLERANCE
}

/** Fills work.gains for the first `count` singular values in `work` and returns λ.
 *  Damped: σ / (σ² + λ²), Nakamura & Hanafusa 1986, Wampler 1986. Without damping 1/σ up to the rank, 0 beyond.
 *  Adaptive: λ² = (1 − (σmin/ε)²)·λmax² while σmin < ε, Chiaverini, Siciliano & Egeland 1994. */
export function fillGains(work: Workspace, count: number, rank: number, size: number, inverse: Inverse): number {
  const { values } = work.taskValues
  const lambda = dampingOf(inverse, count === 0 ? Number.POSITIVE_INFINITY : values[count - 1]!)
  // A value below rounding has a direction that is rounding too; damping leaves the rest as it is.
  const divisible = lambda > 0 ? numericalRank(values, count, 0, size) : rank
  for (let k = 0; k < count; k++) work.gains[k] = k < divisible ? 1 / (values[k]! + lambda * (lambda / values[k]!)) : 0
  return lambda
}

function dampingOf(inverse: Inverse, smallest: number): number {
  switch (inverse.method) {
    case 'truncated':
      return 0
    case 'damped':
      return inverse.damping
    case 'adaptive-damped': {
      if (smallest >= inverse.threshold) return 0
      const part = smallest / inverse.threshold
      return Math.sqrt(1 - part * part) * inverse.maxDamping
    }
  }
}
