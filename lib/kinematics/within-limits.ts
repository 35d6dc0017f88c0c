import type { Chain } from './chain'

/** How far beyond a limit a joint value may be and still count as at it (rad or m): a controller's rounding, not a motion. */
export const LIMIT_TOLERANCE = 1e-9

/** A joint value outside its limits; a bound that does not exist is null. */
export interface Violation {
  readonly joint: string
  readonly value: number
  readonly lower: number | null
  readonly upper: number | null
}

/** Each joint of `q` (n; rad or m) that is beyond its limits by more than 1e-9, in chain order. */
export function listViolations(chain: Chain, q: ArrayLike<number>): Violation[] {
  return chain.joints.flatMap(({ name, lower, upper }, i) => {
    const value = q[i]!
    return sideOutside(value, lower, upper) === 0 ? [] : [{ joint: name, value, lower, upper }]
  })
}

/** 1 above the upper limit, −1 below the lower, 0 within or at them. */
export function sideOutside(value: number, lower: number | null, upper: number | null): -1 | 0 | 1 {
  if (upper !== null && value - upper > LIMIT_TOLERANCE) return 1
  if (lower !== null && lower - value > LIMIT_TOLERANCE) return -1
  return 0
}

/** Whether a joint value stands at a limit, within 1e-9; never where there is none. */
export function isAtLimit(value: number, limit: number | null): boolean {
  return limit !== null && Math.abs(value - limit) <= LIMIT_TOLERANCE
}
