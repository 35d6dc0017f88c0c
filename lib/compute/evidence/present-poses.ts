import type { ReferencePosesRow } from '@/db/queries/reference-poses'
import type { ReferencePosesResult, ReferencePosesSummary } from '@/lib/contract/reference-poses'

/** A stored set of reference poses as the contract shows it in a list. */
export const presentPoses = (row: ReferencePosesRow): ReferencePosesSummary => ({
  number: row.number,
  by: row.byName,
  at: row.at.toISOString(),
  ...(row.note === null ? {} : { note: row.note }),
  // Written by addReferencePoses and by nothing else, so of this shape; the edge parses it once more before it leaves.
  ...(row.outcome as unknown as Omit<ReferencePosesResult, 'rows'>),
})
