import { norm } from '@/lib/math/norm'
import { factorSix, fillInverseTrace, projectSix, solveAndProjectSix, solveSix } from '@/lib/math/six'
import type { Workspace } from './create-workspace'
import { rankTolerance, undampedFrom, type Inverse } from './inverse'
import { fillWish, needSingularValues, type Objective } from './objectives'
import { zeroRounding } from './solve-rates'
import type { Solved } from './solved'
import { TWIST_SIZE, type Task } from './task'

/** Up to this square of the condition number one correction makes the written-out way as accurate as a factorisation of the Jacobian
 *  itself, and up to this much less it is so without: what is lost stays below 1e-13 of the rates. */
const WIDEST = 1e8
const WIDE = 4e3

/** Rates alone, without rank, singular values and null space, for a task of six components at a pose that is proved to be easy: fills
 *  work.primary and work.secondary. The trace of (J·Jᵀ)⁻¹ bounds the smallest singular value from below. False, and nothing decided, for
 *  anything else. `j` is the 6 x n Jacobian. */
export function solveSixOnly(
  work: Workspace, j: Float64Array, task: Task, inverse: Inverse, secondary: readonly Objective[], solved: Solved,
): boolean {
  const n = work.q.length
  const damped = inverse.method === 'damped' && inverse.damping > 0
  if (n < TWIST_SIZE || (damped ? secondary.length > 0 : needSingularValues(secondary))) return false
  const { six } = work
  const squared = damped ? inverse.damping * inverse.damping : 0
  factorSix(j, n, squared, six)
  // Bounds of the largest and the smallest square of a singular value, and of the square of the condition number. Each comparison is
  // written so that a number that is not finite is not easy.
  const largest = six.sizes[1]! + squared
  let spread = largest / squared
  if (!(spread < WIDE)) {
    fillInverseTrace(six)
    const inverted = six.sizes[2]!
    spread = largest * inverted
    if (!(inverted > 0 && spread < WIDEST)) return false
    if (!damped) {
      const floor = undampedFrom(inverse)
      const tolerance = rankTolerance(inverse)
      if (!(floor * floor * inverted <= 1 && tolerance * tolerance * spread < 1)) return false
    }
  }
  const corrections = spread < WIDE ? 0 : 1
  solved.easy = !damped
  solved.rank = damped ? 0 : TWIST_SIZE
  solved.damping = damped ? inverse.damping : 0
  solved.wished = 0
  if (secondary.length === 0) {
    solveSix(j, n, six, work.asked, work.primary, corrections)
    for (let k = 0; k < n; k++) work.secondary[k] = 0
    return true
  }
  fillWish(work, task, TWIST_SIZE, secondary, work.secondary)
  solved.wished = norm(work.secondary)
  if (corrections === 0) solveAndProjectSix(j, n, six, work.asked, work.primary, work.secondary)
  else {
    solveSix(j, n, six, work.asked, work.primary, corrections)
    projectSix(j, n, six, work.secondary, corrections)
  }
  zeroRounding(work.secondary, solved.wished)
  return true
}
