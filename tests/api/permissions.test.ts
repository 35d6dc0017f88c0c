import { beforeAll, describe, expect, it } from 'vitest'
import { drawKey } from '@/lib/access/key-text'
import { type Permission, PERMISSIONS } from '@/lib/access/permissions'
import { SCOPES } from '@/lib/contract/key-operations'
import type { ProblemCode } from '@/lib/errors'
import { ALL_OPERATIONS, exampleRequest, PLACES } from './example-request'
import { expectProblem } from './expect-problem'
import { makeExpiredKey, makeKey, makeRevokedKey, mistype } from './make-key'
import { asKey, asPerson } from './support/callers'
import { type Headers, send } from './send'

/** Each role with everything it includes, spelled out here so that the order in the code has a witness. */
const ROLES = [
  { role: 'reader', person: 'kofi', includes: ['reader'] },
  { role: 'engineer', person: 'ines', includes: ['reader', 'engineer'] },
  { role: 'approver', person: 'tomas', includes: ['reader', 'engineer', 'approver'] },
  { role: 'administrator', person: 'mira', includes: ['reader', 'engineer', 'approver', 'administrator'] },
] as const

interface Walker {
  readonly title: string
  readonly headers: () => Promise<Headers>
  /** How an operation with this permission refuses the walker; null where it lets the walker through. */
  readonly refusal: (permission: Permission) => ProblemCode | null
}

const always = (code: ProblemCode) => () => code
const keyRefusal = (scope: string) => (permission: Permission) =>
  permission.scope === null ? 'session-only' : permission.scope === scope ? null : 'scope-missing'

const WALKERS: readonly Walker[] = [
  { title: 'nobody', headers: async () => ({}), refusal: always('sign-in-required') },
  ...ROLES.map(({ role, person, includes }) => ({
    title: `the role ${role}`,
    headers: () => asPerson(person),
    refusal: (permission: Permission) => (includes.some((included) => included === permission.role) ? null : ('role-missing' as const)),
  })),
  ...SCOPES.map((scope) => ({ title: `a key with the scope ${scope}`, headers: async () => asKey((await keys.withScope[scope]).key), refusal: keyRefusal(scope) })),
  { title: 'a revoked key', headers: async () => asKey((await keys.revoked).key), refusal: always('key-revoked') },
  { title: 'an expired key', headers: async () => asKey((await keys.expired).key), refusal: always('key-expired') },
  { title: 'a mistyped key', headers: async () => asKey(mistype((await keys.withScope.compute).key)), refusal: always('key-mistyped') },
  { title: 'a key of another installation', headers: async () => asKey(drawKey().key), refusal: always('key-unknown') },
  { title: "the other team's administrator", headers: () => asPerson('runa'), refusal: always('team-not-found') },
  { title: "the other team's key with every scope", headers: async () => asKey((await keys.kestrel).key), refusal: always('team-not-found') },
]

const keys = {
  withScope: {} as Record<(typeof SCOPES)[number], ReturnType<typeof makeKey>>,
  revoked: undefined as unknown as ReturnType<typeof makeKey>,
  expired: undefined as unknown as ReturnType<typeof makeKey>,
  kestrel: undefined as unknown as ReturnType<typeof makeKey>,
}
let places = PLACES

beforeAll(async () => {
  for (const scope of SCOPES) keys.withScope[scope] = makeKey([scope])
  keys.revoked = makeRevokedKey(SCOPES)
  keys.expired = makeExpiredKey(SCOPES)
  keys.kestrel = makeKey(SCOPES, {}, 'runa')
  places = { ...PLACES, key: (await makeKey(['gateway'])).id }
  await Promise.all([...Object.values(keys.withScope), keys.revoked, keys.expired, keys.kestrel])
})

describe.each(ALL_OPERATIONS)('%s', (name, operation) => {
  it.each(WALKERS)('answers $title as the permission table says', async ({ headers, refusal }) => {
    const response = await send(exampleRequest(operation, await headers(), places))
    const expected = refusal(PERMISSIONS[name])
    if (expected !== null) return expectProblem(response, expected)
    expect([401, 403, 404], response.text).not.toContain(response.status)
    expect(response.status, response.text).toBeLessThan(500)
  })
})

describe('the walk', () => {
  it('covers every operation, each of which has a row in the permission table', () => {
    expect(ALL_OPERATIONS.map(([name]) => name).sort()).toEqual(Object.keys(PERMISSIONS).sort())
    expect(ALL_OPERATIONS.length).toBeGreaterThan(20)
  })
})
