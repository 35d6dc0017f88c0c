import type { ChainJoint } from './chain'

/** What limits the rates of the joints. */
export interface RateLimits {
  /** Where a joint would exceed a bound: slow down and keep the direction; let other joints take over first; or say the rates as they are. */
  readonly rates: 'scale' | 'saturate' | 'report'
  /** Multiplies every known rate limit, in (0, 1]; one number, or one for each joint. */
  readonly derating: number | ArrayLike<number>
  /** rad/s² or m/s², n; null (or not above 0) where unknown. Used where `dt` is given. */
  readonly accelerations?: ArrayLike<number | null>
  /** The period at which rates are commanded, s. */
  readonly dt?: number
}

/** The rates that each joint may have, n each (rad/s or m/s; ±Infinity where nothing is known), and room to compute with them. */
export interface RateBounds {
  readonly lower: Float64Array
  readonly upper: Float64Array
  /** The rate limits alone, times the derating. */
  readonly derated: Float64Array
  /** 1 where a position limit leaves less than the joint can brake to. */
  readonly forced: Uint8Array
  readonly corners: Float64Array
  readonly cutCorners: Float64Array
}

/** Room for the bounds of n joints. */
export function createRateBounds(n: number): RateBounds {
  // The unit square has four corners, and each of two cuts a joint adds at most one.
  const size = 2 * (4 + 2 * n)
  return {
    lower: new Float64Array(n).fill(Number.NEGATIVE_INFINITY),
    upper: new Float64Array(n).fill(Number.POSITIVE_INFINITY),
    derated: new Float64Array(n).fill(Number.POSITIVE_INFINITY),
    forced: new Uint8Array(n),
    corners: new Float64Array(size),
    cutCorners: new Float64Array(size),
  }
}

/** Fills `bounds` for the configuration `q`. Rate limits, times the derating, count always; a rate that is not known (null, or not
 *  above 0) never does. With a period, and with acceleration limits and the rates before (n), so does the change from those; and
 *  under 'saturate' the way that is left to each position limit, so that the joint can still stop at it. Outside a position limit
 *  only the way back is open, as fast as the joint may. Where these exclude each other, position wins, then the slowing down. */
export function fillRateBounds(
  bounds: RateBounds, joints: readonly ChainJoint[], q: ArrayLike<number>, limits: RateLimits, previousRates?: ArrayLike<number>,
): void {
  const { derating, accelerations, dt } = limits
  for (let i = 0; i < joints.length; i++) {
    const joint = joints[i]!
    const part = typeof derating === 'number' ? derating : derating[i]!
    const rate = joint.rate !== null && joint.rate > 0 ? joint.rate * part : Number.POSITIVE_INFINITY
    let low = -rate
    let high = rate
    bounds.derated[i] = rate
    bounds.forced[i] = 0
    if (dt !== undefined) {
      const given = accelerations?.[i] ?? 0
      const acceleration = given > 0 ? given : Number.POSITIVE_INFINITY
      if (limits.rates === 'saturate') {
        if (joint.upper !== null) high = stoppableRate(joint.upper - q[i]!, rate, acceleration, dt)
        if (joint.lower !== null) low = -stoppableRate(q[i]! - joint.lower, rate, acceleration, dt)
      }
      if (previousRates !== undefined && acceleration < Number.POSITIVE_INFINITY) {
        const before = previousRates[i]!
        const change = acceleration * dt
        if ((before - change > high && high < rate) || (before + change < low && low > -rate)) bounds.forced[i] = 1
        const nearestLow = Math.min(high, Math.max(low, before - change))
        high = Math.max(low, Math.min(high, before + change))
        low = nearestLow
      }
    }
    bounds.lower[i] = low + 0
    bounds.upper[i] = high + 0
  }
}

/** The largest rate from which braking by `acceleration` (rad/s² or m/s²), changed once every `dt` (s), stops within `margin` (rad or m).
 *  In m whole steps and a part: min{V, A·T·(r + m(m+1)/2)/(m+1)} with r = margin/(A·T²) and m = ⌊(√(1+8r) − 1)/2⌋. The continuous form
 *  √(2·A·margin) of Flacco, De Luca & Khatib 2012 would ask for more than A when it is applied at discrete times. */
export function stoppableRate(margin: number, rate: number, acceleration: number, dt: number): number {
  if (!(margin > 0)) return 0
  const step = acceleration * dt
  const steps = margin / dt / step
  // So many steps that they cannot be counted: the continuous form is the same to the last digits.
  if (!(steps < 1e15)) return Math.min(rate, Math.sqrt(2 * acceleration) * Math.sqrt(margin))
  if (!(steps > 0)) return Math.min(rate, margin / dt)
  const whole = Math.floor((Math.sqrt(1 + 8 * steps) - 1) / 2)
  return Math.min(rate, (step * (steps + (whole * (whole + 1)) / 2)) / (whole + 1))
}
