import { dot } from '@/lib/math/dot'
import { createSingularValues, decompose, type SingularValues } from '@/lib/math/singular-values'
import { numericalRank } from '@/lib/math/numerical-rank'
import type { RateBounds } from './rate-bounds'

/** Below this part of the largest singular value the joints that are left cannot take the task over. */
const TAKES_OVER = 1e-9

/** Room for saturating the rates of n joints. */
export interface Saturation {
  /** n: 1 where a joint stands at a bound of the best answer found. */
  readonly saturated: Uint8Array
  /** n: that answer (rad/s or m/s). */
  readonly rates: Float64Array
  readonly free: Uint8Array
  readonly held: Float64Array
  readonly scaledRows: Float64Array
  readonly freeRows: Float64Array
  readonly values: SingularValues
  readonly target: Float64Array
  readonly left: Float64Array
  readonly along: Float64Array
  readonly aside: Float64Array
}

/** Room for `n` joints and tasks of up to `m` components. */
export function createSaturation(m: number, n: number): Saturation {
  return {
    saturated: new Uint8Array(n),
    rates: new Float64Array(n),
    free: new Uint8Array(n),
    held: new Float64Array(n),
    scaledRows: new Float64Array(m * n),
    freeRows: new Float64Array(m * n),
    values: createSingularValues(m, n),
    target: new Float64Array(m),
    left: new Float64Array(m),
    along: new Float64Array(n),
    aside: new Float64Array(n),
  }
}

/** Rates that do as much of the task as the bounds allow, joints at their bounds being relieved by the others; returns the scale of the
 *  task, in [0, 1], or −1 where nothing was found within the bounds. Fills room.rates and room.saturated.
 *  rows: r orthonormal rows of n that span what the task feels; the task is rows · rates = rows · primary. rootWeights: n square roots of
 *  joint weights, whose norm the rates are least in. Saturation in the null space: Flacco, De Luca & Khatib 2012, 2015 (from memory). */
export function saturateRates(
  rows: Float64Array, r: number, primary: Float64Array, bounds: RateBounds, rootWeights: Float64Array | null, room: Saturation,
): number {
  const n = primary.length
  const { free, held, scaledRows, target, saturated, rates } = room
  for (let k = 0; k < r; k++) {
    target[k] = dot(rows, k * n, primary, 0, n)
    for (let j = 0; j < n; j++) scaledRows[k * n + j] = rows[k * n + j]! / (rootWeights === null ? 1 : rootWeights[j]!)
  }
  free.fill(1)
  held.fill(0)
  let best = -1
  // Each round holds one joint more.
  for (let round = 0; round <= n; round++) {
    if (!solveFree(room, r, n, rootWeights)) break
    const scale = largestScale(room, bounds, n)
    if (scale > best) {
      best = scale
      for (let j = 0; j < n; j++) {
        saturated[j] = 1 - free[j]!
        rates[j] = clamp(scale * room.along[j]! + room.aside[j]!, bounds.lower[j]!, bounds.upper[j]!)
      }
    }
    const critical = mostCritical(room, bounds, n)
    if (critical === -1) break
    free[critical] = 0
    held[critical] = clamp(room.along[critical]! + room.aside[critical]!, bounds.lower[critical]!, bounds.upper[critical]!)
  }
  return best
}

/** rates(s) = s · along + aside: the least rates of the free joints that do s of the task while the others are held.
 *  False where the free joints no longer reach all of it. */
function solveFree(room: Saturation, r: number, n: number, rootWeights: Float64Array | null): boolean {
  const { free, held, scaledRows, freeRows, values, target, left, along, aside } = room
  for (let i = 0; i < r * n; i++) freeRows[i] = free[i % n] === 1 ? scaledRows[i]! : 0
  decompose(freeRows, r, n, values)
  if (r > n || numericalRank(values.values, Math.min(r, n), TAKES_OVER, n) < r) return false
  for (let k = 0; k < r; k++) {
    left[k] = 0
    for (let j = 0; j < n; j++) left[k]! += scaledRows[k * n + j]! * held[j]! * (rootWeights === null ? 1 : rootWeights[j]!)
  }
  along.fill(0)
  for (let j = 0; j < n; j++) aside[j] = held[j]!
  for (let k = 0; k < r; k++) {
    const a = dot(values.left, k * r, target, 0, r) / values.values[k]!
    const b = dot(values.left, k * r, left, 0, r) / values.values[k]!
    for (let j = 0; j < n; j++) {
      if (free[j] === 0) continue
      const part = values.right[k * n + j]! / (rootWeights === null ? 1 : rootWeights[j]!)
      along[j]! += a * part
      aside[j]! -= b * part
    }
  }
  return true
}

/** The largest s in [0, 1] for which s · along + aside is within the bounds; −1 where there is none. */
function largestScale({ free, along, aside }: Saturation, { lower, upper }: RateBounds, n: number): number {
  let least = 0
  let most = 1
  for (let j = 0; j < n; j++) {
    if (free[j] === 0) continue
    const a = along[j]!, b = aside[j]!
    if (within(b, lower[j]!, upper[j]!) && within(a + b, lower[j]!, upper[j]!)) continue
    const toUpper = (upper[j]! - b) / a
    const toLower = (lower[j]! - b) / a
    if (a > 0) {
      most = Math.min(most, toUpper)
      least = Math.max(least, toLower)
    } else if (a < 0) {
      most = Math.min(most, toLower)
      least = Math.max(least, toUpper)
    } else return -1
  }
  return most >= least ? most : -1
}

/** The free joint that keeps the task slowest: of those beyond a bound at full scale, the one that reaches it first; −1 where none is. */
function mostCritical({ free, along, aside }: Saturation, { lower, upper }: RateBounds, n: number): number {
  let critical = -1
  let least = Number.POSITIVE_INFINITY
  for (let j = 0; j < n; j++) {
    const a = along[j]!, b = aside[j]!
    if (free[j] === 0 || within(a + b, lower[j]!, upper[j]!)) continue
    const bound = a + b > upper[j]! ? upper[j]! : lower[j]!
    // A joint that is beyond its bound however slow the task is has nothing to wait for.
    const reached = within(b, lower[j]!, upper[j]!) ? (bound - b) / a : -1
    if (reached < least) {
      least = reached
      critical = j
    }
  }
  return critical
}

function within(value: number, lower: number, upper: number): boolean {
  return value <= upper && value >= lower
}

function clamp(value: number, lower: number, upper: number): number {
  return Math.min(upper, Math.max(lower, value))
}
