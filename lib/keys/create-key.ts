import { getDb } from '@/db/client'
import { findKey, insertKey } from '@/db/queries/keys'
import { digestKey, drawKey } from '@/lib/access/key-text'
import type { UseCase } from '@/lib/access/use-case'
import { versionTag } from '@/lib/access/version-tag'
import { dateOf } from './expiry'
import { presentKey } from './present-key'

/** Makes a key. The answer is the only place where it can be read. */
export const createKey: UseCase<'createKey'> = async (caller, { body }) => {
  const { id, key } = drawKey()
  const db = await getDb()
  await insertKey(db, {
    id,
    teamId: caller.team.id,
    label: body.label,
    scopes: body.scopes,
    keyDigest: digestKey(key),
    expiresAt: dateOf(body.expiresAt),
    createdBy: caller.userId,
    createdAt: new Date(),
  })
  const row = (await findKey(db, caller.team.id, id))!
  return { body: { ...presentKey(row), key }, location: `/teams/${caller.team.slug}/keys/${id}`, etag: versionTag(row.key) }
}
