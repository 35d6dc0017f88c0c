import { describe, expect, it } from 'vitest'
import type { Caller } from '@/lib/access/caller'
import { may, type Permission, PERMISSIONS } from '@/lib/access/permissions'
import { includesRole, ROLES } from '@/lib/access/roles'
import { SCOPES } from '@/lib/contract/key-operations'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'

const team = { id: 't', slug: 't', name: 'T', fourEyes: true, reviewRequired: true, evidenceRequired: false }
const names = Object.keys(OPERATIONS) as OperationName[]
const keyWith = (scopes: readonly (typeof SCOPES)[number][]): Caller => ({ kind: 'key', keyId: 'k', label: 'K', userId: 'u', scopes, team })

describe('the permission table', () => {
  it('lets no key manage keys, change a status or archive', () => {
    const never = names.filter((name) => !may(keyWith(SCOPES), name))
    expect(never.sort()).toEqual(['archiveModel', 'createKey', 'editKey', 'getKey', 'listKeys', 'revokeKey', 'transitionRevision'])
  })

  it('gives a reader what only reads or computes', () => {
    const byReaders = names.filter((name) => (PERMISSIONS[name] as Permission).role === 'reader')
    for (const name of byReaders) expect(OPERATIONS[name].method === 'GET' || 'pinned' in OPERATIONS[name], name).toBe(true)
  })

  it('wants the scope catalog:write for whatever a key may change', () => {
    for (const name of names) {
      const { scope }: Permission = PERMISSIONS[name]
      if (scope === null || OPERATIONS[name].method === 'GET' || 'pinned' in OPERATIONS[name]) continue
      expect(scope, name).toBe('catalog:write')
    }
  })

  it('gives each role at least what the role below it has', () => {
    const person = (role: (typeof ROLES)[number]): Caller => ({ kind: 'person', sessionId: 's', userId: 'u', name: 'N', email: 'n@tarnholm.example', team, role })
    for (const name of names) {
      const verdicts = ROLES.map((role) => may(person(role), name))
      expect([...verdicts].sort(), name).toEqual(verdicts)
      expect(verdicts.at(-1), name).toBe(true)
    }
    expect(includesRole('reader', 'engineer')).toBe(false)
  })
})
