import { dot } from '@/lib/math/dot'
import { factorRows, leastSingularValue, solveLower, triangleNorm } from '@/lib/math/lower-orthogonal'
import { norm } from '@/lib/math/norm'
import { decompose } from '@/lib/math/singular-values'
import type { Workspace } from './create-workspace'
import { fillGains, rankTolerance, undampedFrom, type Inverse } from './inverse'
import { dampedWeighted, factorWeighted, leastWeighted, projectWeighted } from './joint-weights'
import { rankOf } from './measures'
import type { Solved } from './solved'

/** Fills work.primary from work.asked: the rates that the inverse gives for the task Jacobian (m x n) in `work`. At an easy pose by a
 *  triangular factorisation, which is as accurate as the singular value decomposition there and much cheaper; that the pose is easy
 *  is proved by a bound on the smallest singular value, and everything else goes the long way. `weighted`: see prepareWeights. */
export function solvePrimary(work: Workspace, m: number, inverse: Inverse, weighted: boolean, needValues: boolean, solved: Solved): void {
  solved.jacobian = work.taskJacobian
  solved.nullRows = null
  solved.easy = !needValues && isEasy(work, m, inverse)
  if (solved.easy) {
    solved.rows = work.rows
    solved.rank = m
    solved.damping = 0
    solveLower(work.lower, m, work.asked, work.byRow)
    if (weighted) {
      factorWeighted(work, work.rows, m)
      leastWeighted(work, m, work.byRow, work.primary)
    } else addUp(work, work.rows, m)
    return
  }
  const n = work.q.length
  const count = Math.min(m, n)
  decompose(work.taskJacobian, m, n, work.taskValues)
  const { left, right } = work.taskValues
  solved.rows = right
  solved.rank = rankOf(work, m, rankTolerance(inverse))
  solved.damping = fillGains(work, count, solved.rank, Math.max(m, n), inverse)
  for (let k = 0; k < count; k++) work.byRow[k] = dot(left, k * m, work.asked, 0, m)
  if (!weighted) {
    for (let k = 0; k < count; k++) work.byRow[k]! *= work.gains[k]!
    addUp(work, right, count)
    return
  }
  factorWeighted(work, right, solved.rank)
  if (solved.damping > 0) dampedWeighted(work, solved.rank, work.byRow, work.primary)
  else {
    for (let k = 0; k < solved.rank; k++) work.byRow[k]! *= work.gains[k]!
    leastWeighted(work, solved.rank, work.byRow, work.primary)
  }
}

/** Orthonormal rows of n, `solved.rank` of them, that span what the task feels as it was solved last. */
export function taskRows(work: Workspace): Float64Array {
  const { solved, rows, lower, taskValues } = work
  if (solved.nullRows === null) return solved.rows
  const n = work.q.length
  if (factorRows(solved.jacobian, solved.rank, n, rows, lower)) return rows
  decompose(solved.jacobian, solved.rank, n, taskValues)
  return taskValues.right
}

/** Below this the squares that the easy ways form underflow. */
export const SMALLEST = 1e-100

/** Factors the task Jacobian into work.lower and work.rows, and says whether the pose is proved to be easy. */
function isEasy(work: Workspace, m: number, inverse: Inverse): boolean {
  const n = work.q.length
  const floor = undampedFrom(inverse)
  if (m > n || floor === Number.POSITIVE_INFINITY) return false
  if (!factorRows(work.taskJacobian, m, n, work.rows, work.lower)) return false
  const least = leastSingularValue(work.lower, m, work.square)
  // Written so that a number that is not finite is not easy.
  return least >= Math.max(floor, SMALLEST) && least > rankTolerance(inverse) * triangleNorm(work.lower, m)
}

/** work.primary = Σ byRow · row over the first `count` rows. */
function addUp({ primary, byRow }: Workspace, rows: Float64Array, count: number): void {
  const n = primary.length
  for (let j = 0; j < n; j++) primary[j] = 0
  for (let k = 0; k < count; k++) {
    const amount = byRow[k]!
    for (let j = 0; j < n; j++) primary[j]! += amount * rows[k * n + j]!
  }
}

/** Part of the wished rates that is rounding of the projection. Left standing, a joint that the spare freedom cannot move would have
 *  a rate of 1e-17, and a rate limit could then depend on its sign. */
const PROJECTION_ROUNDING = 64 * Number.EPSILON

/** work.secondary = (I − J⁺J) · work.secondary, from the undamped inverse: a damped one would leak into the task. Where the rows are not
 *  orthonormal to the last bits, twice, so that what rounding leaves of the first pass is taken out too. */
export function projectSecondary(work: Workspace, solved: Solved, weighted: boolean): void {
  const { secondary } = work
  const { rows, nullRows, rank } = solved
  solved.wished = norm(secondary)
  if (solved.wished === 0) return
  if (nullRows !== null) {
    keepOnly(nullRows, secondary.length - rank, secondary, work.wish)
    zeroRounding(secondary, solved.wished)
    return
  }
  for (let pass = solved.easy && !weighted ? 1 : 0; pass < 2; pass++) {
    if (weighted) projectWeighted(work, rank, secondary)
    else takeOut(rows, rank, secondary)
  }
  zeroRounding(secondary, solved.wished)
}

/** Sets to 0 what is rounding beside the size of what was projected. */
export function zeroRounding(projected: Float64Array, size: number): void {
  const rounding = PROJECTION_ROUNDING * size
  for (let j = 0; j < projected.length; j++) if (Math.abs(projected[j]!) <= rounding) projected[j] = 0
}

/** vector = its parts along `count` orthonormal rows. */
function keepOnly(rows: Float64Array, count: number, vector: Float64Array, scratch: Float64Array): void {
  const n = vector.length
  for (let j = 0; j < n; j++) {
    scratch[j] = vector[j]!
    vector[j] = 0
  }
  for (let at = 0; at < count * n; at += n) {
    let along = 0
    for (let j = 0; j < n; j++) along += rows[at + j]! * scratch[j]!
    for (let j = 0; j < n; j++) vector[j]! += along * rows[at + j]!
  }
}

function takeOut(rows: Float64Array, rank: number, vector: Float64Array): void {
  const n = vector.length
  for (let k = 0; k < rank; k++) {
    let along = 0
    for (let j = 0; j < n; j++) along += rows[k * n + j]! * vector[j]!
    for (let j = 0; j < n; j++) vector[j]! -= along * rows[k * n + j]!
  }
}
