import { getDb } from '@/db/client'
import { getFindingRows } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'

/** What the importer had to say about a revision's file. */
export const getFindings: UseCase<'getFindings'> = async (_caller, { at }) => ({
  body: { items: [...(await getFindingRows(await getDb(), at.revision.id))] },
})
