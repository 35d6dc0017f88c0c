import { createHash } from 'node:crypto'
import { setTimeout as pause } from 'node:timers/promises'
import { describe, expect, it } from 'vitest'
import type { Key } from '@/lib/contract/key-operations'
import { expectProblem, pointersOf } from './expect-problem'
import { makeExpiredKey, makeKey, makeRevokedKey } from './make-key'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'

const KEYS = '/teams/tarnholm/keys'
const asked = async (id: string) => get(`${KEYS}/${id}`, await asPerson('mira'))
const edit = async (id: string, json: object, ifMatch = '*') => send({ method: 'PATCH', path: `${KEYS}/${id}`, headers: { ...(await asPerson('mira')), 'if-match': ifMatch }, json })
const revoke = async (id: string) => send({ method: 'DELETE', path: `${KEYS}/${id}`, headers: await asPerson('mira') })
const inDays = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString()

/** Whether a key is let in, by an operation that it has the scope for. */
const knock = async (key: string) => get('/teams/tarnholm/models', asKey(key))

describe('making a key', () => {
  it('shows the key once, in the form that the contract gives it', async () => {
    const expiresAt = inDays(30)
    const made = await send({ method: 'POST', path: KEYS, headers: await asPerson('mira'), json: { label: ' Cell 4 ', scopes: ['compute', 'catalog:read'], expiresAt } })
    expect(made.status).toBe(201)
    const { key, ...rest } = made.body as Key & { key: string }
    expect(key).toMatch(/^elb_[0-9A-Za-z]{12}_[0-9A-Za-z]{49}$/)
    expect(key).toHaveLength(66)
    expect(rest).toEqual({
      id: key.slice(4, 16), prefix: key.slice(0, 16), label: 'Cell 4', scopes: ['compute', 'catalog:read'], state: 'active', createdAt: rest.createdAt, createdBy: 'Mira Lund', expiresAt,
    })
    expect(made.headers.location).toBe(`/api/v1${KEYS}/${rest.id}`)
    expect(made.headers['cache-control']).toBe('no-store')

    const digest = createHash('sha256').update(key).digest('hex')
    const secret = key.slice(17, 60)
    const listed = await get(`${KEYS}?limit=200`, await asPerson('mira'))
    for (const text of [(await asked(rest.id)).text, listed.text, (await edit(rest.id, { label: 'Cell 4' })).text]) {
      expect(text).toContain(rest.prefix)
      expect(text).not.toContain(secret)
      expect(text).not.toContain(digest)
    }
  })

  it.each([
    [{ scopes: ['compute'] }, '/label'],
    [{ label: '', scopes: ['compute'] }, '/label'],
    [{ label: 'a', scopes: [] }, '/scopes'],
    [{ label: 'a', scopes: ['compute', 'compute'] }, '/scopes'],
    [{ label: 'a', scopes: ['admin'] }, '/scopes/0'],
    [{ label: 'a', scopes: 'compute' }, '/scopes'],
    [{ label: 'a', scopes: ['compute'], expiresAt: 'tomorrow' }, '/expiresAt'],
    [{ label: 'a', scopes: ['compute'], expiresAt: '2001-01-01T00:00:00Z' }, '/expiresAt'],
    [{ label: 'a', scopes: ['compute'], expiresAt: '2099-01-01T00:00:00+02:00' }, '/expiresAt'],
    [{ label: 'a', scopes: ['compute'], expiresAt: '2099-02-30T00:00:00Z' }, '/expiresAt'],
    [{ label: 'a', scopes: ['compute'], expiresAt: null }, '/expiresAt'],
    [{ label: 'a', scopes: ['compute'], rate: { requests: 1, seconds: 1 } }, '/rate'],
  ])('refuses %j', async (json, pointer) => {
    const response = await send({ method: 'POST', path: KEYS, headers: await asPerson('mira'), json })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })
})

describe('the list of keys', () => {
  it('is newest first and whole over its pages', async () => {
    for (let i = 0; i < 3; i++) await makeKey(['gateway'])
    const ids = async (query: string) => {
      const { items, nextCursor } = (await get(`${KEYS}?${query}`, await asPerson('mira'))).body as { items: Key[]; nextCursor?: string }
      return { ids: items.map(({ id }) => id), times: items.map(({ createdAt }) => createdAt), nextCursor }
    }
    const all = await ids('limit=200')
    expect(all.times).toEqual([...all.times].sort().reverse())
    const seen: string[] = []
    for (let cursor: string | undefined = ''; cursor !== undefined; ) {
      const page = await ids(`limit=2${cursor && `&cursor=${cursor}`}`)
      seen.push(...page.ids)
      cursor = page.nextCursor
    }
    expect(seen).toEqual(all.ids)
  })

  it.each(['garbage', 'WzFd', 'WyJhIiwiYiJd', 'WzFlOTksImIiXQ', 'WzEsIlx1MDAwMCJd'])('refuses the cursor "%s"', async (cursor) => {
    expectProblem(await get(`${KEYS}?cursor=${cursor}`, await asPerson('mira')), 'invalid-request')
  })
})

describe('using a key', () => {
  it('notes when it was last used, and leaves its ETag alone', async () => {
    const { id, key } = await makeKey(['catalog:read'])
    const before = await asked(id)
    expect(before.body).not.toHaveProperty('lastUsedAt')
    expect((await knock(key)).status).toBe(200)
    let after = await asked(id)
    for (let tries = 0; !('lastUsedAt' in (after.body as Key)) && tries < 100; tries++) {
      await pause(50)
      after = await asked(id)
    }
    expect(after.body).toMatchObject({ lastUsedAt: expect.stringMatching(/Z$/) })
    expect(after.headers.etag).toBe(before.headers.etag)
    expect((await get(`${KEYS}/${id}`, { ...(await asPerson('mira')), 'if-none-match': before.headers.etag! })).status).toBe(304)
  })

  it('ends with its time', async () => {
    const { id, key } = await makeExpiredKey(['catalog:read'])
    expectProblem(await knock(key), 'key-expired')
    expect((await asked(id)).body).toMatchObject({ state: 'expired' })
  })

  it('ends with its revocation, at once', async () => {
    const { id, key } = await makeKey(['catalog:read'])
    expect((await knock(key)).status).toBe(200)
    const revoked = await revoke(id)
    expect([revoked.status, revoked.text]).toEqual([204, ''])
    expectProblem(await knock(key), 'key-revoked')
    expect((await asked(id)).body).toMatchObject({ state: 'revoked', revokedAt: expect.any(String) })
  })
})

describe('changing a key', () => {
  it('changes label and expiry of the state that was read', async () => {
    const { id } = await makeKey(['compute'])
    const { etag } = (await asked(id)).headers
    const expiresAt = inDays(7)
    const edited = await edit(id, { label: 'Spare', expiresAt }, etag)
    expect(edited.body).toMatchObject({ label: 'Spare', expiresAt, scopes: ['compute'] })
    expectProblem(await edit(id, { label: 'Late' }, etag), 'stale')
    const endless = await edit(id, { expiresAt: null }, edited.headers.etag)
    expect(endless.body).not.toHaveProperty('expiresAt')
    expect(endless.body).toMatchObject({ label: 'Spare' })
  })

  it('takes hold at once', async () => {
    const { id, key } = await makeKey(['catalog:read'], { expiresAt: inDays(1) })
    expect((await knock(key)).status).toBe(200)
    await edit(id, { expiresAt: new Date(Date.now() + 1000).toISOString() })
    while ((await knock(key)).status === 200) await pause(50)
    expectProblem(await knock(key), 'key-expired')
    await edit(id, { expiresAt: inDays(1) })
    expect((await knock(key)).status).toBe(200)
  })

  it('finds an expiry in the past before it asks for If-Match', async () => {
    const { id } = await makeKey(['compute'])
    const response = await send({ method: 'PATCH', path: `${KEYS}/${id}`, headers: await asPerson('mira'), json: { expiresAt: '2001-01-01T00:00:00Z' } })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/expiresAt'])
  })

  it('cannot give scopes or bring a revoked key back', async () => {
    const { id, key } = await makeRevokedKey(['catalog:read'])
    expectProblem(await edit(id, { scopes: ['compute'] }), 'invalid-request')
    expect((await edit(id, { expiresAt: inDays(1) })).body).toMatchObject({ state: 'revoked' })
    expectProblem(await knock(key), 'key-revoked')
    const { revokedAt } = (await asked(id)).body as Key
    expect((await revoke(id)).status).toBe(204)
    expect((await asked(id)).body).toMatchObject({ revokedAt })
  })
})
