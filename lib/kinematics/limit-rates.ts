import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { fillRateBounds, type RateLimits } from './rate-bounds'
import type { RateRecord } from './rate-record'
import { scaleToBounds } from './rate-scaling'
import { createSaturation, saturateRates } from './saturate-rates'
import { taskRows } from './solve-rates'
import { TWIST_SIZE } from './task'

/** Fills the record's rates, scale, secondaryScale and saturated from the primary and secondary rates in `work`, within the limits. What is given up,
 *  in this order: the secondary motion; under 'saturate' the even share of the joints, those at a bound being relieved by the others;
 *  the speed of the task. Bounds that no speed of the task keeps (a joint that cannot brake to where the others are) make every joint
 *  come as near to standing still as its bounds let it: then both scales are 0 and the joints that still move are the saturated ones. */
export function limitRates(
  chain: Chain, work: Workspace, limits: RateLimits, weighted: boolean, previousRates: ArrayLike<number> | undefined, record: RateRecord,
): void {
  const { bounds, scaling } = work
  const within = addBoth(work, limits.derating, record)
  if (limits.rates === 'report') return
  checkLength(chain, limits.derating, 'deratings')
  checkLength(chain, limits.accelerations, 'accelerations')
  checkLength(chain, previousRates, 'previous rates')
  // What most configurations of a batch need: nothing is bounded but by known rates, and all rates are within them.
  if (within && limits.dt === undefined) return
  fillRateBounds(bounds, chain.joints, work.q, limits, previousRates)
  const kept = scaleToBounds(bounds, record.primaryRates, record.secondaryRates, scaling)
  if (limits.rates === 'saturate' && (!kept || scaling.scale < 1)) {
    const room = (work.saturation ??= createSaturation(TWIST_SIZE, work.q.length))
    const best = saturateRates(taskRows(work), work.solved.rank, record.primaryRates, bounds, weighted ? work.rootWeights : null, room)
    // Evenly slowed rates may be faster, where the secondary motion takes load off the joint that binds.
    if (best >= 0 && (!kept || (best > scaling.scale && room.saturated.includes(1)))) {
      record.scale = best
      record.secondaryScale = work.solved.wished === 0 ? 1 : 0
      record.saturated.set(room.saturated)
      for (let j = 0; j < record.rates.length; j++) record.rates[j] = room.rates[j]! + 0
      return
    }
  }
  addUp(record, scaling.scale, scaling.secondaryScale)
  if (kept) clampRounding(work, record)
  else brake(work, record)
}

/** Fills the record with both motions whole; true where they are known to be within the rate limits, times one derating for all. */
function addBoth({ primary, secondary, prepared }: Workspace, derating: number | ArrayLike<number>, record: RateRecord): boolean {
  const { rates, primaryRates, secondaryRates, saturated } = record
  const { rate } = prepared
  const part = typeof derating === 'number' ? derating : 0
  let within = true
  for (let j = 0; j < rate.length; j++) {
    // Adding 0 turns −0 into 0, which is the same number and looks less odd on the wire.
    const first = primary[j]! + 0
    const second = secondary[j]! + 0
    const sum = first + second
    primaryRates[j] = first
    secondaryRates[j] = second
    rates[j] = sum
    saturated[j] = 0
    if (!(Math.abs(sum) <= rate[j]! * part)) within = false
  }
  record.scale = 1
  record.secondaryScale = 1
  return within
}

function addUp(record: RateRecord, scale: number, secondaryScale: number): void {
  record.scale = scale
  record.secondaryScale = secondaryScale
  for (let j = 0; j < record.rates.length; j++) {
    record.rates[j] = scale * record.primaryRates[j]! + secondaryScale * record.secondaryRates[j]! + 0
  }
}

function brake({ bounds }: Workspace, record: RateRecord): void {
  record.scale = 0
  record.secondaryScale = 0
  for (let j = 0; j < record.rates.length; j++) {
    const rate = Math.min(bounds.upper[j]!, Math.max(bounds.lower[j]!, 0))
    record.rates[j] = rate
    record.saturated[j] = rate === 0 ? 0 : 1
  }
}

/** Bounds that exclude standing still may be missed by the last bits. */
function clampRounding({ bounds }: Workspace, record: RateRecord): void {
  for (let j = 0; j < record.rates.length; j++) {
    record.rates[j] = Math.min(bounds.upper[j]!, Math.max(bounds.lower[j]!, record.rates[j]!))
  }
}

function checkLength(chain: Chain, given: number | ArrayLike<unknown> | undefined, what: string): void {
  if (given === undefined || typeof given === 'number' || given.length === chain.joints.length) return
  throw new RangeError(`${chain.joints.length} ${what} are needed, ${given.length} were given`)
}
