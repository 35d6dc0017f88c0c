import type { KeyRow } from '@/db/queries/keys'
import { stateOf } from '@/lib/access/key-state'
import { keyPrefix } from '@/lib/access/key-text'
import type { Key, Scope } from '@/lib/contract/key-operations'

/** A key as the contract shows it: never the key itself. */
export function presentKey({ key, createdByName }: KeyRow): Key {
  const optional = { expiresAt: key.expiresAt, revokedAt: key.revokedAt, lastUsedAt: key.lastUsedAt }
  return {
    id: key.id,
    prefix: keyPrefix(key.id),
    label: key.label,
    scopes: key.scopes as Scope[],
    state: stateOf(key),
    createdAt: key.createdAt.toISOString(),
    createdBy: createdByName,
    ...Object.fromEntries(Object.entries(optional).flatMap(([name, at]) => (at === null ? [] : [[name, at.toISOString()]]))),
  }
}
