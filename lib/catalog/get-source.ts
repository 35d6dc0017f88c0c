import { getDb } from '@/db/client'
import { getSourceBytes } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'
import { getFile } from '@/lib/storage/kept-file'

/** The file of a revision as it was uploaded; of an archive the description alone where that is asked for. */
export const getSource: UseCase<'getSource'> = async (_caller, { at, query }) => {
  const { id, entry, fileName, sourceDigest } = at.revision
  if (entry === null) return { body: await getSourceBytes(await getDb(), id), fileName, etag: sourceDigest }
  if (query?.part === 'description') return { body: await getSourceBytes(await getDb(), id), fileName: entry.split('/').at(-1)! }
  return { body: await getFile(sourceDigest), fileName, etag: sourceDigest, mediaType: 'application/zip' }
}
