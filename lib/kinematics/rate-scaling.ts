import type { Chain } from './chain'

/** Of a limit, relative. */
const ROUNDING = 4 * Number.EPSILON
/** Rounding may leave a rate beyond its limit by its last bits. What is taken off doubles each time, first from the secondary
 *  part alone. */
const NUDGES_OF_SECONDARY = 4
const MOST_NUDGES = 53

/** The factors of the primary and the secondary rates. */
export interface RateScaling {
  readonly scale: number
  readonly secondaryScale: number
}

/** Of all (scale, secondaryScale) in [0, 1]² with |scale·primary + secondaryScale·secondary| <= derating·rate for each known rate,
 *  the largest scale, then the largest secondaryScale. The secondary motion may help: where it opposes the primary at the joint that
 *  binds, keeping it keeps the tool faster. A linear programme in two variables: the unit square is cut by each limit in turn. */
export function scaleToRates(chain: Chain, primary: Float64Array, secondary: Float64Array, derating: number): RateScaling {
  const limits = chain.joints.map(({ rate }) => (rate === null ? Number.POSITIVE_INFINITY : rate * derating))
  if (keeps(limits, primary, secondary, 1, 1)) return { scale: 1, secondaryScale: 1 }

  let corners: Corner[] = [
    [0, 0],
    [1, 0],
    [1, 1],
    [0, 1],
  ]
  limits.forEach((limit, i) => {
    if (limit === Number.POSITIVE_INFINITY) return
    corners = cut(corners, primary[i]!, secondary[i]!, limit)
    corners = cut(corners, -primary[i]!, -secondary[i]!, limit)
  })
  let scale = 0
  for (const [s] of corners) scale = Math.max(scale, s)
  const secondaryScale = largestSecondary(limits, primary, secondary, scale)
  return withinRounding(limits, primary, secondary, scale, secondaryScale)
}

type Corner = readonly [scale: number, secondaryScale: number]

function keeps(limits: readonly number[], primary: Float64Array, secondary: Float64Array, scale: number, secondaryScale: number): boolean {
  return limits.every((limit, i) => Math.abs(scale * primary[i]! + secondaryScale * secondary[i]!) <= limit)
}

function withinRounding(
  limits: readonly number[],
  primary: Float64Array,
  secondary: Float64Array,
  scale: number,
  secondaryScale: number,
): RateScaling {
  if (keeps(limits, primary, secondary, scale, secondaryScale)) return { scale, secondaryScale }
  for (let i = 0, off = Number.EPSILON; i < NUDGES_OF_SECONDARY; i++, off *= 2) {
    if (keeps(limits, primary, secondary, scale, secondaryScale * (1 - off))) return { scale, secondaryScale: secondaryScale * (1 - off) }
  }
  for (let i = 0, off = Number.EPSILON; i < MOST_NUDGES; i++, off *= 2) {
    const part = 1 - off
    if (keeps(limits, primary, secondary, scale * part, secondaryScale * part))
      return { scale: scale * part, secondaryScale: secondaryScale * part }
  }
  return { scale: 0, secondaryScale: 0 }
}

/** The part of a convex polygon where p·scale + s·secondaryScale <= limit. Sutherland & Hodgman 1974. */
function cut(corners: readonly Corner[], p: number, s: number, limit: number): Corner[] {
  if (corners.every((corner) => p * corner[0] + s * corner[1] <= limit)) return [...corners]
  const kept: Corner[] = []
  corners.forEach((corner, k) => {
    const next = corners[(k + 1) % corners.length]!
    const room = limit - p * corner[0] - s * corner[1]
    const roomNext = limit - p * next[0] - s * next[1]
    if (room >= 0) kept.push(corner)
    if ((room > 0 && roomNext < 0) || (room < 0 && roomNext > 0)) {
      const part = room / (room - roomNext)
      kept.push([corner[0] + part * (next[0] - corner[0]), corner[1] + part * (next[1] - corner[1])])
    }
  })
  return kept
}

function largestSecondary(limits: readonly number[], primary: Float64Array, secondary: Float64Array, scale: number): number {
  let largest = 1
  limits.forEach((limit, i) => {
    const s = secondary[i]!
    // A part that is lost in the rounding of the limit decides nothing.
    if (Math.abs(s) > ROUNDING * limit) largest = Math.min(largest, (limit - Math.sign(s) * scale * primary[i]!) / Math.abs(s))
  })
  return Math.max(0, largest)
}
