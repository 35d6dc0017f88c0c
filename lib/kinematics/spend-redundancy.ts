import { dot } from '@/lib/math/dot'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { descend, moveWithin, type Place } from './descend'
import { measuresOf } from './measures'
import { fillWish } from './objectives'
import type { PoseSearch } from './pose-search'
import { taskJacobian } from './task-jacobian'

/** The first step along the spare motion, rad or m of the joint that moves most; halved where the wish turns round. */
const FIRST_STEP = 0.2
/** From here on a step changes nothing that anyone would notice. */
const LAST_STEP = 1e-5
const MOST_STEPS = 80
/** Steps that bring the tool back to the goal after each. */
const CORRECTIONS = 10
/** A spare motion below this part of the wish is rounding. */
const SPENT = 1e-9

/** Moves a converged `place` along the freedom that the task leaves, towards what the objectives ask for, within the joint limits and
 *  without leaving the goal. Pauses after each step; returns how many there were. */
export function* spendRedundancy(chain: Chain, work: Workspace, baseFromGoal: ArrayLike<number>, search: PoseSearch, place: Place): Generator<void, number> {
  if (search.secondary.length === 0) return 0
  const n = chain.joints.length
  const next: Place = { ...place, q: new Float64Array(n) }
  const motion = new Float64Array(n)
  const before = new Float64Array(n)
  let length = FIRST_STEP
  let iterations = 0
  while (iterations < MOST_STEPS && length > LAST_STEP) {
    if (!fillSpareMotion(chain, work, search, place.q, motion)) break
    if (dot(motion, 0, before, 0, n) < 0) length /= 2
    before.set(motion)
    const fastest = motion.reduce((most, part) => Math.max(most, Math.abs(part)), 0)
    iterations++
    const part = Math.min(length / fastest, partToLimits(chain, place.q, motion))
    moveWithin(chain, place.q, motion.map((rate) => part * rate), next.q)
    next.iterations = 0
    yield* descend(chain, work, baseFromGoal, search, next, CORRECTIONS)
    iterations += next.iterations
    if (next.ending === 'converged') {
      place.q.set(next.q)
      place.positionError = next.positionError
      place.orientationError = next.orientationError
      place.measure = next.measure
    } else {
      length /= 2
      yield* descend(chain, work, baseFromGoal, search, place, 0)
    }
  }
  return iterations
}

/** How much of `motion` the first joint to meet a limit can make. */
function partToLimits(chain: Chain, q: Float64Array, motion: Float64Array): number {
  let part = Number.POSITIVE_INFINITY
  chain.joints.forEach(({ lower, upper }, j) => {
    const limit = motion[j]! > 0 ? upper : lower
    if (limit !== null && motion[j] !== 0) part = Math.min(part, (limit - q[j]!) / motion[j]!)
  })
  return Math.max(0, part)
}

/** The part of what the objectives wish at the pose in `work` that the task does not feel and no limit stops; false where none is left. */
function fillSpareMotion(chain: Chain, work: Workspace, { task, secondary }: PoseSearch, q: Float64Array, motion: Float64Array): boolean {
  const n = motion.length
  taskJacobian(chain, work, task)
  const { rank } = measuresOf(work, task)
  fillWish(work, task, rank, secondary, motion)
  const wished = motion.reduce((most, part) => Math.max(most, Math.abs(part)), 0)
  const { right } = work.taskValues
  // What is stopped by a limit is felt by the task once the others go on, so that both are taken out in turn.
  for (let pass = 0; pass < n + 1; pass++) {
    chain.joints.forEach(({ lower, upper }, j) => {
      if ((upper !== null && q[j]! > upper - LAST_STEP && motion[j]! > 0) || (lower !== null && q[j]! < lower + LAST_STEP && motion[j]! < 0)) motion[j] = 0
    })
    for (let k = 0; k < rank; k++) {
      const along = dot(right, k * n, motion, 0, n)
      for (let j = 0; j < n; j++) motion[j]! -= along * right[k * n + j]!
    }
  }
  return motion.some((part) => Math.abs(part) > SPENT * wished)
}
