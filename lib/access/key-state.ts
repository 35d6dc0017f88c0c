import type { Key } from '@/lib/contract/key-operations'

/** Whether a key still opens anything. */
export function stateOf({ revokedAt, expiresAt }: { readonly revokedAt: Date | null; readonly expiresAt: Date | null }): Key['state'] {
  if (revokedAt !== null) return 'revoked'
  return expiresAt !== null && expiresAt.getTime() <= Date.now() ? 'expired' : 'active'
}
