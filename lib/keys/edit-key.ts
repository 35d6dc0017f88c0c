import { getDb } from '@/db/client'
import { findKey, updateKey } from '@/db/queries/keys'
import { forgetKey } from '@/lib/access/key-caller'
import type { UseCase } from '@/lib/access/use-case'
import { versionTag } from '@/lib/access/version-tag'
import { fail } from '@/lib/errors'
import { dateOf } from './expiry'
import { presentKey } from './present-key'

/** Changes label or expiry of the state that the caller has seen. */
export const editKey: UseCase<'editKey'> = async (caller, { at, body }) => {
  const { id, version } = at.key.key
  const change = {
    ...(body.label === undefined ? {} : { label: body.label }),
    ...(body.expiresAt === undefined ? {} : { expiresAt: dateOf(body.expiresAt) }),
  }
  const db = await getDb()
  if (!(await updateKey(db, id, version, change))) fail('stale')
  forgetKey(id)
  const row = (await findKey(db, caller.team.id, id))!
  return { body: presentKey(row), etag: versionTag(row.key) }
}
