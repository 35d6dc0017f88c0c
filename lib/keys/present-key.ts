import type { KeyRow } from '@/db/queries/keys'
import { keyPrefix } from '@/lib/access/key-text'
import type { Key, Scope } from '@/lib/contract/key-operations'

function stateOf(revokedAt: Date | null, expiresAt: Date | null): Key['state'] {
  if (revokedAt !== null) return 'revoked'
  return expiresAt !== null && expiresAt.getTime() <= Date.now() ? 'expired' : 'active'
}

/** A key as the contract shows it: never the key itself. */
export function presentKey({ key, createdByName }: KeyRow): Key {
  const optional = { expiresAt: key.expiresAt, revokedAt: key.revokedAt, lastUsedAt: key.lastUsedAt }
  return {
    id: key.id,
    prefix: keyPrefix(key.id),
    label: key.label,
    scopes: key.scopes as Scope[],
    state: stateOf(key.revokedAt, key.expiresAt),
    createdAt: key.createdAt.toISOString(),
    createdBy: createdByName,
    ...Object.fromEntries(Object.entries(optional).flatMap(([name, at]) => (at === null ? [] : [[name, at.toISOString()]]))),
  }
}
