import { createBasisRoom, fillCanonicalBasis, makeCanonical, type BasisRoom } from '@/lib/math/canonical-basis'
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
  const { rows, nullRows, rank } = work.solved
  const { basis, projector, room } = record
  const n = work.q.length
  record.nullity = n - rank
  if (nullRows === null) {
    fillCanonicalBasis(rows, n, rank, room, basis)
    addProducts(rows, rank, n, 1, -1, projector)
  } else {
    makeCanonical(nullRows, n, n - rank, room, basis)
    addProducts(nullRows, n - rank, n, 0, 1, projector)
  }
}

/** out (n x n) = unit · I + sign · Σ row·rowᵀ over `count` rows of n. */
function addProducts(rows: Float64Array, count: number, n: number, unit: number, sign: number, out: Float64Array): void {
  for (let at = 0; at < n * n; at++) out[at] = 0
  for (let i = 0; i < n; i++) out[i * n + i] = unit
  for (let at = 0; at < count * n; at += n) {
    for (let i = 0; i < n; i++) {
      const part = sign * rows[at + i]!
      for (let j = 0; j < n; j++) out[i * n + j]! += part * rows[at + j]!
    }
  }
}
