import { getDb } from '@/db/client'
import { lockModel, setModel } from '@/db/queries/models'
import { findRevision, findRevisionByFingerprint } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'
import { keepFiles } from './keep-files'
import { presentRevision } from './present-revision'
import { acceptUpload } from './read-upload'
import { storeRevision } from './store-revision'

/** Imports a file as a further revision of a model. */
export const createRevision: UseCase<'createRevision'> = async (caller, { at, form, file }) => {
  const upload = await acceptUpload(file, form.entry)
  await keepFiles(upload)
  const { id: modelId } = at.model.model
  const db = await getDb()
  const number = await db.transaction(async (inside) => {
    const now = new Date()
    const model = await lockModel(inside, modelId)
    const twin = await findRevisionByFingerprint(inside, modelId, upload.read.fingerprint)
    if (twin !== null && form.allowSame !== 'true') {
      fail('same-content', `Revision ${twin.number} computes the same numbers. Nothing was stored.`, { members: { twin: twin.number } })
    }
    const next = model.latest + 1
    await storeRevision(inside, caller, { modelId, number: next, upload, note: form.note || undefined, provenance: form, now })
    await setModel(inside, modelId, { latest: next }, now)
    return next
  })
  const row = (await findRevision(db, modelId, number))!
  return {
    body: await presentRevision(db, at.model.model, row),
    location: `/teams/${caller.team.slug}/models/${at.model.model.slug}/revisions/${number}`,
  }
}
