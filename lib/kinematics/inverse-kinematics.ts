import { lowDiscrepancy } from '@/lib/math/low-discrepancy'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { descend, type Place } from './descend'
import type { FoundPose, PoseSearch, SearchReason } from './pose-search'
import { beyondReach } from './reach'
import { rangeOf } from './seeded-configurations'
import { spendRedundancy } from './spend-redundancy'
import { LINEAR_COMPONENTS } from './task'

/** Best errors of several attempts that differ by less than this part are the same place. */
const SAME = 1e-3

/** A configuration within the joint limits that puts the tool at `baseFromGoal` (transform of 12 numbers), as far as the components of the
 *  task ask, or the best that was found and why no better. Starts at `seed` (n; none: the middle of the joint ranges), then at points of
 *  an even sequence over the joint ranges: the same question has the same answer everywhere. Throws a RangeError for a seed of another
 *  length. */
export function inverseKinematics(chain: Chain, work: Workspace, baseFromGoal: ArrayLike<number>, search: PoseSearch, seed?: ArrayLike<number>): FoundPose {
  const steps = inverseKinematicsInSteps(chain, work, baseFromGoal, search, seed)
  for (;;) {
    const step = steps.next()
    if (step.done === true) return step.value
  }
}

/** The same, pausing after each step, so that whoever asks can let others have a turn, or stop. */
export function* inverseKinematicsInSteps(
  chain: Chain, work: Workspace, baseFromGoal: ArrayLike<number>, search: PoseSearch, seed?: ArrayLike<number>,
): Generator<void, FoundPose> {
  if (seed !== undefined && seed.length !== chain.joints.length) {
    throw new RangeError(`a seed needs ${chain.joints.length} joint values, ${seed.length} were given`)
  }
  const places: Place[] = []
  let iterations = 0
  for (let attempt = 0; attempt < Math.max(1, search.attempts); attempt++) {
    const place = placeAt(attempt === 0 ? firstStart(chain, seed) : furtherStart(chain, attempt))
    yield* descend(chain, work, baseFromGoal, search, place, search.iterations)
    iterations += place.iterations
    places.push(place)
    if (place.ending !== 'converged') continue
    iterations += yield* spendRedundancy(chain, work, baseFromGoal, search, place)
    return found(place, iterations, places.length)
  }
  const best = places.reduce((least, place) => (place.measure < least.measure ? place : least))
  return { ...found(best, iterations, places.length), reason: reasonOf(chain, baseFromGoal, search, best, places) }
}

function found({ q, positionError, orientationError, ending }: Place, iterations: number, attempts: number): FoundPose {
  return { converged: ending === 'converged', configuration: Array.from(q), positionError, orientationError, iterations, attempts }
}

function reasonOf(chain: Chain, baseFromGoal: ArrayLike<number>, search: PoseSearch, best: Place, places: readonly Place[]): SearchReason {
  const whole = search.task.rows.filter((row) => row < LINEAR_COMPONENTS).length === LINEAR_COMPONENTS
  if (whole && beyondReach(chain, baseFromGoal, search.tipFromTool) > search.positionTolerance) return 'unreachable'
  if (best.ending === 'at-limits') return 'at-limits'
  // One descent may end in a hollow; several that end equally well in different places speak for the goal being out of reach.
  const equal = places.filter(({ ending, measure }) => ending === 'stationary' && measure <= best.measure * (1 + SAME))
  return best.ending === 'stationary' && (equal.length > 1 || chain.joints.length === 0) ? 'unreachable' : 'stalled'
}

function placeAt(q: Float64Array): Place {
  return { q, positionError: Number.POSITIVE_INFINITY, orientationError: Number.POSITIVE_INFINITY, measure: Number.POSITIVE_INFINITY, ending: 'out-of-steps', iterations: 0 }
}

/** The seed, brought within the limits, or the middle of the ranges. */
function firstStart(chain: Chain, seed: ArrayLike<number> | undefined): Float64Array {
  return Float64Array.from(chain.joints, (joint, i) => {
    if (seed === undefined) return (rangeOf(joint)[0] + rangeOf(joint)[1]) / 2
    return Math.min(joint.upper ?? Number.POSITIVE_INFINITY, Math.max(joint.lower ?? Number.NEGATIVE_INFINITY, seed[i]!))
  })
}

function furtherStart(chain: Chain, attempt: number): Float64Array {
  const point = lowDiscrepancy(chain.joints.length, attempt)
  return Float64Array.from(chain.joints, (joint, i) => {
    const [from, to] = rangeOf(joint)
    return from + (to - from) * point[i]!
  })
}
