import type { Limits } from '@/lib/urdf/read-limit'

/** Bounds that were rounded when they were written do not leave each other. As a part of the larger of 1 and the bound. */
const ROUNDING = 1e-6

type Range = Pick<Limits, 'lower' | 'upper'>

/** How a follower at `multiplier * leader + offset` leaves its own range while the leader moves over its range, as the end of a
 *  sentence; null when it does not. Bounds in rad or m, null = unbounded. */
export function leavesRange(leader: Range, follower: Range, multiplier: number, offset: number): string | null {
  const at = (bound: number | null, end: number): number => (multiplier === 0 ? offset : bound === null ? Math.sign(multiplier) * end : multiplier * bound + offset)
  const ends = [at(leader.lower, -Infinity), at(leader.upper, Infinity)]
  const [low, high] = [Math.min(...ends), Math.max(...ends)]
  const room = (bound: number): number => ROUNDING * Math.max(1, Math.abs(bound))
  const shown = (value: number): string => (Number.isFinite(value) ? `${Number(value.toPrecision(6))}` : 'no end')
  if (follower.upper !== null && high > follower.upper + room(follower.upper)) return `${shown(high)}, and its upper limit is ${follower.upper}`
  if (follower.lower !== null && low < follower.lower - room(follower.lower)) return `${shown(low)}, and its lower limit is ${follower.lower}`
  return null
}
