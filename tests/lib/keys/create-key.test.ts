import { createHash } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { database } from '@/db/client'
import { findKeyOfAnyTeam } from '@/db/queries/keys'
import { insertTeam, insertUser } from '@/db/queries/people'
import type { Caller } from '@/lib/access/caller'
import { createKey } from '@/lib/keys/create-key'

let caller: Caller

beforeAll(async () => {
  vi.stubEnv('ELBOWROOM_DATA_DIR', 'memory')
  vi.stubEnv('DATABASE_URL', '')
  const { db } = await database()
  const user = await insertUser(db, { email: 'mira@tarnholm.example', name: 'Mira Lund', passwordHash: '' })
  const team = await insertTeam(db, { slug: 'tarnholm', name: 'Tarnholm' })
  caller = { kind: 'person', sessionId: 's', userId: user.id, name: user.name, email: user.email, team, role: 'administrator' }
})
afterAll(async () => {
  await (await database()).close()
  vi.unstubAllEnvs()
})

describe('createKey', () => {
  it('stores the SHA-256 of the key and nothing that the key could be made of', async () => {
    const ask = { at: { team: caller.team }, body: { label: 'Cell 4', scopes: ['compute' as const] }, query: undefined, form: undefined, file: undefined }
    const { body, etag } = await createKey(caller, ask as unknown as Parameters<typeof createKey>[1])
    const stored = (await findKeyOfAnyTeam((await database()).db, body.id))!
    expect(stored.key.keyDigest).toBe(createHash('sha256').update(body.key).digest('hex'))
    const secret = body.key.slice(`elb_${body.id}_`.length)
    expect(JSON.stringify(stored)).not.toContain(secret.slice(0, 20))
    expect(etag).toBe(`${body.id}.1`)
  })
})
