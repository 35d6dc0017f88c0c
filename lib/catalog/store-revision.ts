import type { Db } from '@/db/client'
import { insertMeshes } from '@/db/queries/meshes'
import { appendTransition, insertRevision } from '@/db/queries/revisions'
import { type Caller, callerName } from '@/lib/access/caller'
import type { Provenance } from '@/lib/contract/provenance'
import { countIndependent } from './present-structure'
import type { AcceptedUpload } from './read-upload'

export interface NewRevision {
  readonly modelId: string
  readonly number: number
  readonly upload: AcceptedUpload
  readonly note: string | undefined
  /** An empty text is one left out. */
  readonly provenance: Provenance
  readonly now: Date
}

/** Stores an upload as a draft, with the first line of its history. To be called inside a transaction, when its files are kept. */
export async function storeRevision(db: Db, caller: Caller, { modelId, number, upload, note, provenance, now }: NewRevision): Promise<void> {
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
      entry: upload.archive?.entry?.path ?? null,
      robotName: description.robotName,
      note: note ?? null,
      serialNumber: provenance.serialNumber || null,
      geometry: provenance.geometry ?? null,
      supplierNote: provenance.supplierNote || null,
      independent: countIndependent(description),
      description,
      findings: upload.findings,
      importedBy: caller.userId,
      importedByKey: caller.kind === 'key' ? callerName(caller) : null,
      importedAt: now,
    },
    upload.archive?.entry?.bytes ?? upload.bytes,
  )
  await insertMeshes(db, (upload.archive?.files ?? []).map(({ path, digest, mediaType, bytes }) => ({ revisionId, path, digest, mediaType, size: bytes.length })))
  await appendTransition(db, { revisionId, status: 'draft', byName: callerName(caller), byUser: caller.userId, at: now })
}
