import { getDb } from '@/db/client'
import { getReferencePosesContent } from '@/db/queries/reference-poses'
import type { UseCase } from '@/lib/access/use-case'
import type { ReferencePoseRow } from '@/lib/contract/reference-poses'
import { presentPoses } from './evidence/present-poses'

/** One set of reference poses with its rows and its table. */
export const getReferencePoses: UseCase<'getReferencePoses'> = async (_caller, { at }) => {
  const { rows, source } = await getReferencePosesContent(await getDb(), at.set.id)
  return { body: { ...presentPoses(at.set), rows: [...(rows as readonly ReferencePoseRow[])], table: source } }
}
