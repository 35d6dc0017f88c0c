import { dot } from '@/lib/math/dot'
import { norm } from '@/lib/math/norm'
import { errorRows } from '@/lib/math/pose-error-rows'
import { decompose } from '@/lib/math/singular-values'
import type { Chain } from './chain'
import { closedLoopTwist } from './closed-loop-twist'
import type { Workspace } from './create-workspace'
import { forwardKinematics } from './forward-kinematics'
import { jacobian } from './jacobian'
import type { PoseSearch } from './pose-search'
import { LINEAR_COMPONENTS } from './task'

/** No joint moves further in one step (rad or m): beyond, the linear picture of the arm is no longer true. */
const LONGEST_STEP = 0.5
const FIRST_DAMPING = 1e-3
const MOST_DAMPING = 1e6
/** A step that takes off less than this part of the error counts as none; so many of them end a descent. */
const WORTHWHILE = 1e-4
const PATIENCE = 6

/** How a descent ended. */
type Ending = 'converged' | 'stationary' | 'at-limits' | 'out-of-steps'

/** A place reached by a descent. */
export interface Place {
  readonly q: Float64Array
  positionError: number
  orientationError: number
  /** Errors over tolerances: at most 1 where both are met. */
  measure: number
  ending: Ending
  iterations: number
}

/** Goes down from `place.q` (n, within the limits) towards the goal, by steps of Levenberg & Marquardt whose damping shrinks with the
 *  square of the error (Sugihara 2011, from memory), joints that meet a limit being held there. Pauses after each step. Leaves `work`
 *  at the place. */
export function* descend(chain: Chain, work: Workspace, baseFromGoal: ArrayLike<number>, search: PoseSearch, place: Place, most: number): Generator<void, void> {
  const n = chain.joints.length
  const trial = new Float64Array(n)
  const step = new Float64Array(n)
  const held = new Uint8Array(n)
  let factor = FIRST_DAMPING
  let idle = 0
  let error = lookAt(chain, work, baseFromGoal, search, place.q, place)
  place.ending = 'out-of-steps'
  for (let i = 0; ; i++) {
    if (place.measure <= 1) {
      place.ending = 'converged'
      return
    }
    if (i >= most) return
    place.iterations++
    const size = norm(work.asked, 0, search.task.rows.length)
    fillErrorRows(chain, work, search, error)
    held.fill(0)
    // A joint that is held changes what is best for the others, so that another may come to its limit.
    for (let round = 0; round <= n; round++) {
      fillStep(work, search, factor * size * size, held, step)
      if (!holdAtLimits(chain, place.q, step, held)) break
    }
    const moved = moveWithin(chain, place.q, step, trial)
    const before = place.measure
    const next = { ...place }
    const nextError = moved ? lookAt(chain, work, baseFromGoal, search, trial, next) : error
    if (moved && norm(work.asked, 0, search.task.rows.length) < size) {
      place.q.set(trial)
      place.positionError = next.positionError
      place.orientationError = next.orientationError
      place.measure = next.measure
      error = nextError
      factor = Math.max(factor / 5, 1e-9)
      idle = place.measure > (1 - WORTHWHILE) * before ? idle + 1 : 0
    } else {
      factor *= 8
      error = lookAt(chain, work, baseFromGoal, search, place.q, place)
    }
    if (!moved || factor > MOST_DAMPING || idle >= PATIENCE) {
      place.ending = held.includes(1) ? 'at-limits' : 'stationary'
      return
    }
    yield
  }
}

/** Puts `work` at q, fills work.asked with the task's part of the error there, and the errors of `place`. Returns the whole error. */
function lookAt(chain: Chain, work: Workspace, baseFromGoal: ArrayLike<number>, search: PoseSearch, q: Float64Array, place: Place): number[] {
  forwardKinematics(chain, q, work, search.tipFromTool)
  const error = closedLoopTwist(work, { baseFromGoal, positionGain: 1, orientationGain: 1 }, search.task.frame)
  const { rows } = search.task
  for (let k = 0; k < rows.length; k++) work.asked[k] = error[rows[k]!]!
  const linear = rows.filter((row) => row < LINEAR_COMPONENTS).length
  place.positionError = norm(work.asked, 0, linear)
  place.orientationError = norm(work.asked, linear, rows.length - linear)
  place.measure = Math.max(place.positionError / search.positionTolerance, place.orientationError / search.orientationTolerance)
  return error
}

function fillErrorRows(chain: Chain, work: Workspace, { task }: PoseSearch, error: readonly number[]): void {
  const n = chain.joints.length
  const whole = jacobian(chain, work, task.frame)
  errorRows(whole, n, error, task.frame)
  for (let k = 0; k < task.rows.length; k++) {
    for (let j = 0; j < n; j++) work.taskJacobian[k * n + j] = whole[task.rows[k]! * n + j]!
  }
}

/** step = Σ σ/(σ² + damping) · right · (left · error), columns of held joints left out. */
function fillStep(work: Workspace, { task }: PoseSearch, damping: number, held: Uint8Array, step: Float64Array): void {
  const n = step.length
  const m = task.rows.length
  const { left, values, right } = work.taskValues
  for (let k = 0; k < m; k++) for (let j = 0; j < n; j++) if (held[j] === 1) work.taskJacobian[k * n + j] = 0
  decompose(work.taskJacobian, m, n, work.taskValues)
  step.fill(0)
  for (let k = 0; k < Math.min(m, n); k++) {
    if (!(values[k]! > Number.EPSILON * m * values[0]!)) break
    const amount = dot(left, k * m, work.asked, 0, m) / (values[k]! + damping / values[k]!)
    for (let j = 0; j < n; j++) step[j]! += amount * right[k * n + j]!
  }
}

/** Holds each joint that stands at a limit and would go beyond it; true where there is a new one. */
function holdAtLimits(chain: Chain, q: Float64Array, step: Float64Array, held: Uint8Array): boolean {
  let more = false
  chain.joints.forEach(({ lower, upper }, j) => {
    if (held[j] === 1) return
    if ((upper !== null && q[j]! >= upper && step[j]! > 0) || (lower !== null && q[j]! <= lower && step[j]! < 0)) {
      held[j] = 1
      more = true
    }
  })
  return more
}

/** to = q + step, shortened evenly where it is too long and cut off at the limits; false where nothing moves. */
export function moveWithin(chain: Chain, q: Float64Array, step: ArrayLike<number>, to: Float64Array): boolean {
  let longest = 0
  for (let j = 0; j < q.length; j++) longest = Math.max(longest, Math.abs(step[j]!))
  const part = longest > LONGEST_STEP ? LONGEST_STEP / longest : 1
  let moved = false
  chain.joints.forEach(({ lower, upper }, j) => {
    to[j] = Math.min(upper ?? Number.POSITIVE_INFINITY, Math.max(lower ?? Number.NEGATIVE_INFINITY, q[j]! + part * step[j]!))
    if (to[j] !== q[j]) moved = true
  })
  return moved
}
