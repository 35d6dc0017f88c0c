import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import type { Diagnosis, Finished } from './diagnosis'
import type { RatePolicy } from './rate-policy'
import { isAtLimit, sideOutside } from './within-limits'

/** A rate under this part of the fastest joint's is rounding, and drives nothing anywhere. */
const STANDING_STILL = 1e-12

/** What the limits of the joints did to an answer, and what it does to them. */
export function diagnoseLimits(chain: Chain, work: Workspace, policy: RatePolicy, done: Finished): Diagnosis[] {
  return [...slowed(chain, work, done), ...starved(done), ...atLimits(chain, work, policy, done), ...outsideLimits(chain, work, done)]
}

function slowed(chain: Chain, work: Workspace, done: Finished): Diagnosis[] {
  if (done.scale >= 1) return []
  const place = done.scale === 0 && done.saturated.length > 0 ? chain.joints.findIndex(({ name }) => name === done.saturated[0]) : busiest(work, done.rates)
  const joint = chain.joints[place]
  if (joint === undefined) return [{ code: 'rate-limited', detail: `The tool is slowed to ${percent(done.scale)} of what was asked, its direction kept.` }]
  const cause = `Joint '${joint.name}' would exceed its ${boundWords(joint.rate, work, place)}`
  const braking = done.rates.some((rate) => rate !== 0) && done.scale === 0
  const detail = braking
    ? `${cause}: no speed of the tool in the direction asked is within reach in this period, and each joint brakes as hard as it may.`
    : `${cause}: the tool is slowed to ${percent(done.scale)} of what was asked, its direction kept.`
  return [{ code: 'rate-limited', detail, joint: joint.name }]
}

/** Whether the bound of a joint is its rate limit or a tighter one. */
function boundWords(rate: number | null, { bounds }: Workspace, place: number): string {
  const known = rate !== null && rate > 0
  const tighter = Math.max(-bounds.lower[place]!, bounds.upper[place]!) < bounds.derated[place]! || -bounds.lower[place]! !== bounds.upper[place]!
  return known && !tighter ? 'rate limit' : 'bound, which its acceleration or position limit sets'
}

/** The joint that is nearest to a bound in the answer; of equals the first; −1 where none is bounded. */
function busiest({ bounds }: Workspace, rates: readonly number[]): number {
  let most = 0
  let place = -1
  rates.forEach((rate, i) => {
    const bound = rate < 0 ? bounds.lower[i]! : bounds.upper[i]!
    const load = bound === 0 ? 1 : rate / bound
    if (load > most * (1 + 1e-9)) {
      most = load
      place = i
    }
  })
  return place
}

function starved({ secondaryScale, secondaryRates, saturated }: Finished): Diagnosis[] {
  if (secondaryScale >= 1 || secondaryRates.every((rate) => rate === 0)) return []
  const what = saturated.length === 0 ? 'The rate limits leave' : 'The joints at their limits take the spare freedom, which leaves'
  return [{ code: 'secondary-starved', detail: `${what} ${percent(secondaryScale)} of the motion that the objectives ask of the spare freedom.` }]
}

function atLimits(chain: Chain, work: Workspace, { limits }: RatePolicy, { rates }: Finished): Diagnosis[] {
  const still = stillness(rates)
  return chain.joints.flatMap(({ name, lower, upper }, i): Diagnosis[] => {
    if (limits.rates !== 'report' && limits.dt !== undefined && work.bounds.forced[i] === 1) {
      const detail = `Joint '${name}' comes to its limit faster than it can brake: its rate is held to what the limit leaves, beyond its acceleration.`
      return [{ code: 'at-limit', joint: name, detail }]
    }
    const up = isAtLimit(work.q[i]!, upper) && rates[i]! > still
    const down = isAtLimit(work.q[i]!, lower) && rates[i]! < -still
    if (!up && !down) return []
    return [{ code: 'at-limit', joint: name, detail: `Joint '${name}' is at its ${up ? 'upper' : 'lower'} limit and is driven outward.` }]
  })
}

function outsideLimits(chain: Chain, work: Workspace, { rates }: Finished): Diagnosis[] {
  const still = stillness(rates)
  return chain.joints.flatMap(({ name, lower, upper }, i): Diagnosis[] => {
    const side = sideOutside(work.q[i]!, lower, upper)
    if (side === 0) return []
    const outward = side * rates[i]!
    const what = outward > still ? 'is driven further out' : outward < -still ? 'is moving back' : 'is not moving back'
    const detail = `Joint '${name}' is ${side > 0 ? 'above its upper' : 'below its lower'} limit and ${what}.`
    return [{ code: 'outside-limits', joint: name, detail }]
  })
}

function stillness(rates: readonly number[]): number {
  return STANDING_STILL * rates.reduce((most, rate) => Math.max(most, Math.abs(rate)), 0)
}

function percent(part: number): string {
  return `${(100 * part).toPrecision(3)} %`
}
