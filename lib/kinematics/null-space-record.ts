import { createBasisRoom, fillCanonicalBasis, type BasisRoom } from '@/lib/math/canonical-basis'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { TWIST_SIZE } from './task'

/** The null space of a task at one pose, in arrays that are kept, so that a batch allocates nothing. n x n each: fit for chains of tens of
 *  joints. */
export interface NullSpaceRecord {
  nullity: number
  /** `nullity` rows of n: the canonical basis vectors one after the other. */
  readonly basis: Float64Array
  /** n x n, row-major: I − J⁺J. */
  readonly projector: Float64Array
  readonly room: BasisRoom
}

/** An empty record for the null spaces of `chain`. */
export function createNullSpaceRecord(chain: Chain): NullSpaceRecord {
  const n = chain.joints.length
  return { nullity: 0, basis: new Float64Array(n * n), projector: new Float64Array(n * n), room: createBasisRoom(n, Math.min(n, TWIST_SIZE)) }
}

/** Fills `record` with the null space that the last resolveRatesInto met in `work`, by the same factors and the same rank. */
export function fillNullSpace(work: Workspace, record: NullSpaceRecord): void {
  const { rows, rank } = work.solved
  const { basis, projector, room } = record
  const n = work.q.length
  record.nullity = n - rank
  fillCanonicalBasis(rows, n, rank, room, basis)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = i === j ? 1 : 0
      for (let at = 0; at < rank * n; at += n) sum -= rows[at + i]! * rows[at + j]!
      projector[i * n + j] = sum
      projector[j * n + i] = sum
    }
  }
}
