import type { Db } from '@/db/client'
import { appendTransition, insertRevision } from '@/db/queries/revisions'
import { type Caller, callerName } from '@/lib/access/caller'
import { countIndependent } from './present-structure'
import type { AcceptedUpload } from './read-upload'

export interface NewRevision {
  readonly modelId: string
  readonly number: number
  readonly upload: AcceptedUpload
  readonly note: string | undefined
  readonly now: Date
}

/** Stores an upload as a draft, with the first line of its history. To be called inside a transaction. */
export async function storeRevision(db: Db, caller: Caller, { modelId, number, upload, note, now }: NewRevision): Promise<void> {
  const { description, fingerprint } = upload.read
  const revisionId = await insertRevision(
    db,
    {
      modelId,
      number,
      status: 'draft',
      fingerprint,
      sourceDigest: upload.sourceDigest,
      fileName: upload.fileName,
      robotName: description.robotName,
      note: note ?? null,
      independent: countIndependent(description),
      description,
      findings: upload.findings,
      importedBy: caller.userId,
      importedByKey: caller.kind === 'key' ? callerName(caller) : null,
      importedAt: now,
    },
    upload.bytes,
  )
  await appendTransition(db, { revisionId, status: 'draft', byName: callerName(caller), byUser: caller.userId, at: now })
}
