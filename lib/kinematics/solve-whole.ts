import { bidiagonalise, solveBidiagonal } from '@/lib/math/bidiagonal'
import { bidiagonalValues } from '@/lib/math/bidiagonal-values'
import { numericalRank } from '@/lib/math/numerical-rank'
import type { Workspace } from './create-workspace'
import { rankTolerance, undampedFrom, type Inverse } from './inverse'
import { SMALLEST } from './solve-rates'
import type { Solved } from './solved'

/** Rates with rank, singular values and null space from one bidiagonal form of the task Jacobian `j` (m x n), at a pose where it is
 *  of full rank and nothing is damped: fills work.primary, solved.nullRows and `values`. It pays while the null space is no larger than
 *  the task. False, and nothing decided, for anything else. */
export function solveWhole(work: Workspace, j: Float64Array, m: number, inverse: Inverse, solved: Solved, values: Float64Array): boolean {
  const n = work.q.length
  const floor = undampedFrom(inverse)
  if (m > n || n > 2 * m || floor === Number.POSITIVE_INFINITY) return false
  const { bidiagonal } = work
  bidiagonalise(j, m, n, bidiagonal)
  if (!bidiagonalValues(bidiagonal.diagonal, bidiagonal.beside, m, work.valuesRoom, values)) return false
  // Written so that a number that is not finite is not easy.
  if (!(values[m - 1]! >= Math.max(floor, SMALLEST) && numericalRank(values, m, rankTolerance(inverse), n) === m)) return false
  solveBidiagonal(bidiagonal, work.asked, work.primary, work.nullRows)
  solved.easy = true
  solved.jacobian = j
  solved.nullRows = work.nullRows
  solved.rank = m
  solved.damping = 0
  return true
}
