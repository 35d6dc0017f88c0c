import { dot } from '@/lib/math/dot'
import { norm } from '@/lib/math/norm'
import { decompose } from '@/lib/math/singular-values'
import { bidiagonalise } from '@/lib/math/bidiagonal'
import { bidiagonalValues } from '@/lib/math/bidiagonal-values'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { diagnose } from './diagnose'
import type { Diagnosis } from './diagnosis'
import { prepareWeights } from './joint-weights'
import { jacobian } from './jacobian'
import { limitRates } from './limit-rates'
import { fillWish, needSingularValues } from './objectives'
import type { Instant, RatePolicy } from './rate-policy'
import { createRateRecord, type RateRecord } from './rate-record'
import { projectSecondary, solvePrimary } from './solve-rates'
import { solveSixOnly } from './solve-six'
import { solveWhole } from './solve-whole'
import { LINEAR_COMPONENTS, TWIST_SIZE } from './task'
import { copyTaskRows } from './task-jacobian'
import { fillTwist } from '@/lib/math/twist-columns'

/** Joint rates and what became of the twist that was asked for. SI; twists at the tool point in the task's frame. */
export interface RateOutcome {
  /** n: scale · primaryRates + secondaryScale · secondaryRates, unless a joint is saturated. */
  readonly rates: number[]
  /** n: what the task asks. */
  readonly primaryRates: number[]
  /** n: what the objectives ask of the spare freedom. */
  readonly secondaryRates: number[]
  readonly scale: number
  readonly secondaryScale: number
  /** Joints held at a bound while the others do their part of the task, or braking; in chain order. */
  readonly saturated: string[]
  /** 6: what the tool does at `rates`, also outside the task. */
  readonly achievedTwist: number[]
  /** 6: achieved − asked; 0 outside the task. */
  readonly residual: number[]
  /** The norm of what the secondary motion adds to the task: rounding where the task has full rank, below it what truncation lets through. */
  readonly leak: number
  /** min(components, n), descending, of the unscaled task Jacobian. */
  readonly singularValues: number[]
  readonly rank: number
  readonly nullity: number
  /** The largest λ; 0 where nothing is damped. */
  readonly damping: number
  readonly manipulability: number
  /** m/s, of the tool point at `rates`. */
  readonly toolSpeed: number
  readonly diagnosis: Diagnosis[]
}

/** Joint rates that give the tool `twist` (6, in the task's frame, at the tool point; components outside the task are ignored) as nearly
 *  as the pose in `work` allows (see forwardKinematics), spare freedom spent on the objectives. Every number is finite for inputs up to
 *  1e9. Throws a RangeError when `twist`, a posture, weights or a limit has the wrong length. Whitney 1969; Liégeois 1977. */
export function resolveRates(chain: Chain, work: Workspace, twist: ArrayLike<number>, policy: RatePolicy, instant: Instant = NO_INSTANT): RateOutcome {
  const record = createRateRecord(chain)
  resolveRatesInto(chain, work, twist, policy, record, instant)
  const { task } = policy
  const n = chain.joints.length
  const singularValues = Array.from(record.singularValues.subarray(0, Math.min(task.rows.length, n)))
  const { scale, secondaryScale, rank, damping } = record
  const outcome = {
    rates: Array.from(record.rates),
    primaryRates: Array.from(record.primaryRates),
    secondaryRates: Array.from(record.secondaryRates),
    scale,
    secondaryScale,
    saturated: chain.joints.flatMap(({ name }, i) => (record.saturated[i] === 1 ? [name] : [])),
    achievedTwist: Array.from(record.achievedTwist),
    residual: Array.from(record.residual),
    leak: leakOf(work, task.rows.length, record),
    singularValues,
    rank,
    nullity: n - rank,
    damping,
    manipulability: singularValues.reduce((product, value) => product * value, 1),
    toolSpeed: norm(record.achievedTwist, 0, LINEAR_COMPONENTS),
  }
  return { ...outcome, diagnosis: diagnose(chain, work, policy, instant, { ...outcome, easy: record.easy }) }
}

const NO_INSTANT: Instant = Object.freeze({})

/** The same into a record that is kept, allocating nothing where the pose is an easy one and the rates are within their limits.
 *  `detail` 'rates' leaves out the singular values, the rank and the achieved twist, which are most of the cost. */
export function resolveRatesInto(
  chain: Chain, work: Workspace, twist: ArrayLike<number>, policy: RatePolicy, record: RateRecord,
  instant: Instant = NO_INSTANT, detail: 'all' | 'rates' = 'all',
): void {
  if (twist.length !== TWIST_SIZE) throw new RangeError(`a twist has ${TWIST_SIZE} components, ${twist.length} were given`)
  const { task, inverse, jointWeights, secondary } = policy
  const m = task.rows.length
  const whole = jacobian(chain, work, task.frame)
  if (m === TWIST_SIZE) for (let k = 0; k < TWIST_SIZE; k++) work.asked[k] = twist[k]!
  else for (let k = 0; k < m; k++) work.asked[k] = twist[task.rows[k]!]!
  const weighted = jointWeights !== undefined
  if (weighted) prepareWeights(work, jointWeights)

  const { solved } = work
  const only = detail === 'rates' && m === TWIST_SIZE && !weighted && policy.limits.rates !== 'saturate'
  if (!(only && solveSixOnly(work, whole, task, inverse, secondary, solved))) {
    const needValues = needSingularValues(secondary)
    if (m < TWIST_SIZE) copyTaskRows(work, whole, task)
    const rows = m < TWIST_SIZE ? work.taskJacobian : whole
    const done = detail === 'all' && !weighted && !needValues && solveWhole(work, rows, m, inverse, solved, record.singularValues)
    if (!done) {
      if (m === TWIST_SIZE) copyTaskRows(work, whole, task)
      solvePrimary(work, m, inverse, weighted, needValues, solved)
      if (detail === 'all') fillSingularValues(work, m, record)
    }
    fillWish(work, task, solved.rank, secondary, work.secondary)
    projectSecondary(work, solved, weighted)
  }
  record.easy = solved.easy
  record.rank = solved.rank
  record.damping = solved.damping
  limitRates(chain, work, policy.limits, weighted, instant.previousRates, record)

  if (detail === 'rates') return
  fillTwist(whole, record.rates, record.achievedTwist)
  for (let row = 0; row < TWIST_SIZE; row++) record.residual[row] = 0
  for (let k = 0; k < m; k++) {
    const row = task.rows[k]!
    record.residual[row] = record.achievedTwist[row]! - twist[row]!
  }
}

function fillSingularValues(work: Workspace, m: number, record: RateRecord): void {
  if (work.solved.easy) {
    bidiagonalise(work.lower, m, m, work.bidiagonal)
    if (bidiagonalValues(work.bidiagonal.diagonal, work.bidiagonal.beside, m, work.valuesRoom, record.singularValues)) return
    decompose(work.taskJacobian, m, work.q.length, work.taskValues)
  }
  for (let k = 0; k < Math.min(m, work.q.length); k++) record.singularValues[k] = work.taskValues.values[k]!
}

function leakOf(work: Workspace, m: number, record: RateRecord): number {
  const n = work.q.length
  for (let k = 0; k < m; k++) work.coordinates[k] = record.secondaryScale * dot(work.solved.jacobian, k * n, record.secondaryRates, 0, n)
  return norm(work.coordinates, 0, m)
}
