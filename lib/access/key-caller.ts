import { timingSafeEqual } from 'node:crypto'
import { getDb } from '@/db/client'
import { findKeyOfAnyTeam, touchKey } from '@/db/queries/keys'
import { fail } from '@/lib/errors'
import type { Scope } from '@/lib/contract/key-operations'
import { sharedBriefCache } from './brief-cache'
import type { KeyHolder } from './caller'
import { digestKey, parseKey } from './key-text'
import { createUseNoter } from './note-use'

const cache = sharedBriefCache('keys', async (id) => findKeyOfAnyTeam(await getDb(), id))

/** Makes the next call with this key ask the database. */
export const forgetKey = (id: string): void => cache.forget(id)

/** Last use is written at most this often for a key. */
const TOUCH_MS = 10_000
const noteUse = createUseNoter('key', TOUCH_MS, touchKey)

const sameDigest = (a: string, b: string) => timingSafeEqual(Buffer.from(a, 'hex'), Buffer.from(b, 'hex'))

/** Who holds this key. Fails with key-mistyped, key-unknown, key-revoked or key-expired. */
export async function identifyKey(key: string): Promise<KeyHolder> {
  const id = parseKey(key)
  if (id === null) fail('key-mistyped')
  const found = await cache.get(id)
  if (found === null || !sameDigest(digestKey(key), found.key.keyDigest)) fail('key-unknown')
  if (found.key.revokedAt !== null) fail('key-revoked')
  if (found.key.expiresAt !== null && found.key.expiresAt.getTime() <= Date.now()) fail('key-expired')
  noteUse(id)
  return {
    kind: 'key',
    keyId: id,
    label: found.key.label,
    userId: found.key.createdBy,
    scopes: found.key.scopes as readonly Scope[],
    team: found.team,
  }
}
