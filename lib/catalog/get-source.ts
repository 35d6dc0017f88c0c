import { getDb } from '@/db/client'
import { getSourceBytes } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'

/** The file of a revision as it was uploaded. */
export const getSource: UseCase<'getSource'> = async (_caller, { at }) => ({
  body: await getSourceBytes(await getDb(), at.revision.id),
  fileName: at.revision.fileName,
  etag: at.revision.sourceDigest,
})
