import { getDb } from '@/db/client'
import { findModel, updateModel } from '@/db/queries/models'
import type { UseCase } from '@/lib/access/use-case'
import { versionTag } from '@/lib/access/version-tag'
import { fail } from '@/lib/errors'
import { presentModel } from './present-model'

/** Changes name or note of the state that the caller has seen. */
export const editModel: UseCase<'editModel'> = async (caller, { at, body }) => {
  const { model } = at.model
  const db = await getDb()
  const change = {
    ...(body.name === undefined ? {} : { name: body.name }),
    ...(body.note === undefined ? {} : { note: body.note || null }),
  }
  if (!(await updateModel(db, model.id, model.version, change, new Date()))) fail('stale')
  const row = (await findModel(db, caller.team.id, model.slug))!
  return { body: presentModel(row), etag: versionTag(row.model) }
}
