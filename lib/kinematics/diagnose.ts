import { norm } from '@/lib/math/norm'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { diagnoseLimits } from './diagnose-limits'
import { diagnoseLost } from './diagnose-lost'
import type { Diagnosis, Finished } from './diagnosis'
import { NEAR_SINGULAR } from './measures'
import type { Instant, RatePolicy } from './rate-policy'
import { LINEAR_COMPONENTS } from './task'

/** Everything worth saying about an answer for the pose in `work`, in the order of the codes, joints in chain order. */
export function diagnose(chain: Chain, work: Workspace, policy: RatePolicy, instant: Instant, done: Finished): Diagnosis[] {
  return [
    ...diagnoseLost(chain, work, policy, done),
    ...nearSingular(done),
    ...diagnoseLimits(chain, work, policy, done),
    ...gainTooHigh(instant.gain, policy.limits.dt),
  ]
}

function nearSingular({ singularValues, damping, residual }: Finished): Diagnosis[] {
  const smallest = singularValues.at(-1)
  const near = smallest !== undefined && smallest < NEAR_SINGULAR
  if (!(damping > 0) && !near) return []
  const value = smallest === undefined ? '' : ` (smallest singular value ${smallest.toPrecision(3)})`
  return [
    { code: 'near-singular', detail: `${near ? 'The arm is near a singular pose' : 'Damping is at work'}${value}: ${cost(smallest, damping, residual)}.` },
  ]
}

/** What being near a singular pose costs: falling short where damping holds the rates down, and fast joints where nothing does. */
function cost(smallest: number | undefined, damping: number, residual: readonly number[]): string {
  if (damping > 0) {
    const linear = norm(residual, 0, LINEAR_COMPONENTS)
    const angular = norm(residual, LINEAR_COMPONENTS)
    return `damping ${damping.toPrecision(3)} holds the joint rates down, and the tool falls short of what was asked by ${amount(linear, 'm/s')} and ${amount(angular, 'rad/s')}`
  }
  if (smallest === undefined || !(smallest > 0)) return 'one direction has no rate that would give it'
  return `in its worst direction a joint rate of ${(1 / smallest).toPrecision(3)} is needed for each unit of tool speed`
}

function amount(value: number, unit: string): string {
  return `${value === 0 ? '0' : value.toPrecision(3)} ${unit}`
}

/** From here on each period turns an error into one at least as large on the other side. */
const UNSTABLE = 2

/** What there is to say of a closed loop of proportional `gain` (1/s) that is closed every `dt` (s). */
function gainTooHigh(gain: number | undefined, dt: number | undefined): Diagnosis[] {
  if (gain === undefined || dt === undefined || gain * dt < UNSTABLE) return []
  const product = (gain * dt).toPrecision(3)
  return [
    {
      code: 'gain-too-high',
      detail: `Gain ${gain.toPrecision(3)} per second times a period of ${dt.toPrecision(3)} s is ${product}: from 2 on an error grows from period to period instead of fading. Lower the gain or close the loop more often.`,
    },
  ]
}
