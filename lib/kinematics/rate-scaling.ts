import type { RateBounds } from './rate-bounds'

/** Of a limit, relative. */
const ROUNDING = 4 * Number.EPSILON
/** Rounding may leave a rate beyond its limit by its last bits. What is taken off doubles each time, first from the secondary
 *  part alone. */
const NUDGES_OF_SECONDARY = 4
const MOST_NUDGES = 53

/** The factors of the primary and the secondary rates. */
export interface RateScaling {
  scale: number
  secondaryScale: number
}

/** Of all (scale, secondaryScale) in [0, 1]² that keep scale·primary + secondaryScale·secondary within the bounds, the largest scale,
 *  then the largest secondaryScale. The secondary motion may help: where it opposes the primary at the joint that binds, keeping it
 *  keeps the tool faster. False, and both 0, where no pair keeps them: bounds that exclude standing still may be out of reach.
 *  A linear programme in two variables: the unit square is cut by each bound in turn, unless the edge of full scale already meets them. */
export function scaleToBounds(bounds: RateBounds, primary: Float64Array, secondary: Float64Array, out: RateScaling): boolean {
  out.scale = 1
  out.secondaryScale = 1
  if (keeps(bounds, primary, secondary, 1, 1)) return true
  if (keepsAtFullScale(bounds, primary, secondary, out)) {
    takeOffRounding(bounds, primary, secondary, out)
    return true
  }
  const { lower, upper } = bounds
  for (let k = 0; k < UNIT_SQUARE.length; k++) bounds.corners[k] = UNIT_SQUARE[k]!
  let corners = UNIT_SQUARE.length / 2
  for (let i = 0; i < upper.length; i++) {
    if (upper[i]! < Number.POSITIVE_INFINITY) corners = cut(bounds, corners, primary, secondary, i, 1)
    if (lower[i]! > Number.NEGATIVE_INFINITY) corners = cut(bounds, corners, primary, secondary, i, -1)
  }
  out.scale = 0
  for (let k = 0; k < corners; k++) out.scale = Math.max(out.scale, bounds.corners[2 * k]!)
  out.secondaryScale = corners === 0 ? 0 : largestSecondary(bounds, primary, secondary, out.scale)
  takeOffRounding(bounds, primary, secondary, out)
  return corners > 0
}

/** Whether the bounds can be kept at scale 1: then fills the largest secondaryScale that does. */
function keepsAtFullScale({ lower, upper }: RateBounds, primary: Float64Array, secondary: Float64Array, out: RateScaling): boolean {
  let least = 0
  let most = 1
  for (let i = 0; i < upper.length; i++) {
    const p = primary[i]!, s = secondary[i]!
    const above = upper[i]! - p, below = lower[i]! - p
    // A part that is lost in the rounding of the rest decides nothing.
    if (Math.abs(s) <= ROUNDING * (Math.abs(p) + Math.min(upper[i]!, Number.MAX_VALUE))) {
      if (!(above >= 0 && below <= 0)) return false
      continue
    }
    most = Math.min(most, (s > 0 ? above : below) / s)
    least = Math.max(least, (s > 0 ? below : above) / s)
  }
  if (!(most >= least)) return false
  out.secondaryScale = most
  return true
}

const UNIT_SQUARE = Float64Array.of(0, 0, 1, 0, 1, 1, 0, 1)

function keeps({ lower, upper }: RateBounds, primary: Float64Array, secondary: Float64Array, scale: number, secondaryScale: number): boolean {
  for (let i = 0; i < upper.length; i++) {
    const rate = scale * primary[i]! + secondaryScale * secondary[i]!
    if (!(rate <= upper[i]! && rate >= lower[i]!)) return false
  }
  return true
}

function takeOffRounding(bounds: RateBounds, primary: Float64Array, secondary: Float64Array, out: RateScaling): void {
  const { scale, secondaryScale } = out
  if (keeps(bounds, primary, secondary, scale, secondaryScale)) return
  for (let i = 0, off = Number.EPSILON; i < NUDGES_OF_SECONDARY; i++, off *= 2) {
    out.secondaryScale = secondaryScale * (1 - off)
    if (keeps(bounds, primary, secondary, scale, out.secondaryScale)) return
  }
  for (let i = 0, off = Number.EPSILON; i < MOST_NUDGES; i++, off *= 2) {
    out.scale = scale * (1 - off)
    out.secondaryScale = secondaryScale * (1 - off)
    if (keeps(bounds, primary, secondary, out.scale, out.secondaryScale)) return
  }
  // Only bounds that exclude standing still come here: the answer is as good as rounding lets it be, and whoever uses it clamps.
  const still = keeps(bounds, primary, secondary, 0, 0)
  out.scale = still ? 0 : scale
  out.secondaryScale = still ? 0 : secondaryScale
}

/** Leaves the part of a convex polygon where joint i keeps its upper (side 1) or lower (−1) bound, p·scale + s·secondaryScale <= limit,
 *  and returns its number of corners. Sutherland & Hodgman 1974. */
function cut(bounds: RateBounds, corners: number, primary: Float64Array, secondary: Float64Array, i: number, side: 1 | -1): number {
  const { corners: from, cutCorners: to } = bounds
  const p = side * primary[i]!
  const s = side * secondary[i]!
  const limit = side === 1 ? bounds.upper[i]! : -bounds.lower[i]!
  let outside = false
  for (let k = 0; k < corners; k++) outside ||= !(p * from[2 * k]! + s * from[2 * k + 1]! <= limit)
  if (!outside) return corners
  let kept = 0
  for (let k = 0; k < corners; k++) {
    const next = k + 1 === corners ? 0 : k + 1
    const a = from[2 * k]!, b = from[2 * k + 1]!
    const nextA = from[2 * next]!, nextB = from[2 * next + 1]!
    const room = limit - p * a - s * b
    const roomNext = limit - p * nextA - s * nextB
    if (room >= 0) {
      to[2 * kept] = a
      to[2 * kept + 1] = b
      kept++
    }
    if ((room > 0 && roomNext < 0) || (room < 0 && roomNext > 0)) {
      const part = room / (room - roomNext)
      to[2 * kept] = a + part * (nextA - a)
      to[2 * kept + 1] = b + part * (nextB - b)
      kept++
    }
  }
  for (let k = 0; k < 2 * kept; k++) from[k] = to[k]!
  return kept
}

function largestSecondary({ lower, upper }: RateBounds, primary: Float64Array, secondary: Float64Array, scale: number): number {
  let largest = 1
  for (let i = 0; i < upper.length; i++) {
    const s = secondary[i]!
    const limit = s > 0 ? upper[i]! : -lower[i]!
    // A part that is lost in the rounding of the limit decides nothing.
    if (limit < Number.POSITIVE_INFINITY && Math.abs(s) > ROUNDING * Math.abs(limit))
      largest = Math.min(largest, (limit - Math.sign(s) * scale * primary[i]!) / Math.abs(s))
  }
  return Math.max(0, largest)
}
