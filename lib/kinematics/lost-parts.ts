import { dot } from '@/lib/math/dot'
import { norm } from '@/lib/math/norm'
import type { Workspace } from './create-workspace'
import { inTwist } from './null-space'
import { structuralSplit, type StructuralLoss } from './structural-loss'
import type { Task } from './task'

/** A direction counts as lost when the inverse delivers less than this part of it. */
const DELIVERED = 0.01
/** A loss counts when it is more than this part of what was asked. */
const WORTH_SAYING = 1e-6
/** The sign of a direction is that of its first component from this part of the largest on (see canonicalBasis). */
const PIVOT_PART = 0.499

/** Why a direction is lost: no pose has it, another is missing at each pose, or only this pose lacks it. */
export type Cause = 'never' | 'always-one' | 'pose'

/** A direction that was asked for and is not delivered. */
export interface LostPart {
  /** Unit, 6 numbers in twist order, in the task's frame. */
  readonly direction: number[]
  /** Whether the twist asks for it or for its opposite. */
  readonly asked: 1 | -1
  readonly cause: Cause
}

/** The directions in which the asked twist in `work` (work.asked, with work.delivered and work.taskValues of the same pose) is lost:
 *  at most one that is lost for good and one that only this pose lacks. Empty when no more than 1e-6 of the twist is lost. */
export function lostParts(work: Workspace, task: Task, rank: number, known: StructuralLoss): LostPart[] {
  const m = task.rows.length
  const { delivered } = work
  const { left } = work.taskValues
  const count = Math.min(m, work.q.length)
  const threshold = WORTH_SAYING * norm(work.asked, 0, m)
  const lost = new Float64Array(m)
  for (let k = 0; k < m; k++) {
    if (k < count && delivered[k]! >= DELIVERED) continue
    const along = dot(left, k * m, work.asked, 0, m)
    for (let i = 0; i < m; i++) lost[i]! += along * left[k * m + i]!
  }
  if (!(norm(lost) > threshold)) return []

  const split = structuralSplit(left, m, rank, known)
  const forGood = outside(lost, split.reached, split.reachedCount)
  const here = lost.map((part, i) => part - forGood[i]!)
  const never = norm(outside(forGood, known.reached, known.reachedCount)) > (1 - WORTH_SAYING) * norm(forGood)
  const parts = [
    { part: forGood, cause: never ? 'never' : 'always-one' },
    { part: here, cause: 'pose' },
  ] as const
  // Either may be below the threshold that both together exceed: then the larger one speaks.
  const loudest = Math.min(threshold, Math.max(norm(forGood), norm(here)))
  // A subnormal wish makes the threshold 0, and a part of length 0 has no direction.
  return parts
    .filter(({ part }) => norm(part) > 0 && norm(part) >= loudest)
    .map(({ part, cause }) => ({ direction: inTwist(unit(part), task), asked: signOf(part), cause }))
}

/** What of `vector` is orthogonal to the first `count` of the orthonormal rows. */
function outside(vector: Float64Array, rows: Float64Array, count: number): Float64Array {
  const rest = vector.slice()
  const m = rest.length
  for (let k = 0; k < count; k++) {
    const along = dot(rest, 0, rows, k * m, m)
    for (let i = 0; i < m; i++) rest[i]! -= along * rows[k * m + i]!
  }
  return rest
}

function unit(part: Float64Array): Float64Array {
  const length = signOf(part) * norm(part)
  return part.map((value) => value / length + 0)
}

/** The sign of the pivot (see canonicalBasis). */
function signOf(part: Float64Array): 1 | -1 {
  const largest = part.reduce((most, value) => Math.max(most, Math.abs(value)), 0)
  const pivot = part.find((value) => Math.abs(value) >= PIVOT_PART * largest) ?? 1
  return pivot < 0 ? -1 : 1
}
