import { readFileSync, rmSync } from 'node:fs'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { PASSWORD, ROOT, startServer, temporaryFolder, type Server } from '@/tests/api/support/server'
import { signIn, type SessionFields } from '@/tests/api/support/sign-in'

const ROUNDS = 5
const TEAM = '/api/v1/teams/tarnholm'
const file = new Blob([new Uint8Array(readFileSync(path.join(ROOT, 'samples/trainer-3r.urdf')))])

const dataDir = temporaryFolder()
afterAll(() => rmSync(dataDir, { recursive: true, force: true }))

/** Something that was answered with 201: where it must be found, and what must be found there. */
interface Promised {
  readonly at: string
  readonly holds: Record<string, unknown>
}

async function createModel(server: Server, session: SessionFields, name: string): Promise<Promised> {
  const body = new FormData()
  body.set('name', name)
  body.set('file', file, 'trainer-3r.urdf')
  const answer = await fetch(`${server.url}${TEAM}/models`, { method: 'POST', headers: { ...session }, body })
  if (answer.status !== 201) throw new Error(`${answer.status} ${await answer.text()}`)
  const { model } = (await answer.json()) as { model: { slug: string; createdAt: string } }
  return { at: `${TEAM}/models/${model.slug}`, holds: { name, createdAt: model.createdAt, revisions: 1 } }
}

async function createKey(server: Server, session: SessionFields, label: string): Promise<Promised> {
  const headers = { ...session, 'content-type': 'application/json' }
  const answer = await fetch(`${server.url}${TEAM}/keys`, { method: 'POST', headers, body: JSON.stringify({ label, scopes: ['compute'] }) })
  if (answer.status !== 201) throw new Error(`${answer.status} ${await answer.text()}`)
  const { id, prefix } = (await answer.json()) as { id: string; prefix: string }
  return { at: `${TEAM}/keys/${id}`, holds: { label, prefix } }
}

/** Writes with several hands at once until the server is killed in the midst of it, and returns what was answered. */
async function writeUntilKilled(server: Server, session: SessionFields, round: number): Promise<Promised[]> {
  const promised: Promised[] = []
  const enough = 6 + 5 * round
  let isKilled = false
  let killed: Promise<void> | undefined
  const hand = async (number: number) => {
    for (let count = 0; !isKilled; count += 1) {
      const name = `Round ${round} hand ${number} count ${count}`
      const write = number % 2 === 0 ? createModel : createKey
      const written = await write(server, session, name).catch((error: unknown) => {
        // A request that the kill cut off has promised nothing; any other failure is one.
        if (!isKilled) throw error
        return null
      })
      if (written !== null) promised.push(written)
      if (promised.length >= enough && !isKilled) {
        isKilled = true
        killed = server.kill()
      }
    }
  }
  await Promise.all([0, 1, 2, 3].map(hand))
  await killed
  return promised
}

describe('a server that is killed while it writes', () => {
  it(`has kept everything that it had answered, in each of ${ROUNDS} rounds`, async () => {
    let server = await startServer({ dataDir })
    let session = await signIn(server.url, 'mira@tarnholm.example', PASSWORD)
    const promised: Promised[] = []
    for (let round = 0; round < ROUNDS; round += 1) {
      const answered = await writeUntilKilled(server, session, round)
      expect(answered.length).toBeGreaterThanOrEqual(6 + 5 * round)
      promised.push(...answered)
      server = await startServer({ dataDir, seeded: false })
      // The session is one more thing that was answered; the origin moves with the port.
      session = { ...session, origin: server.url }
      for (const { at, holds } of promised) {
        const found = await fetch(`${server.url}${at}`, { headers: { ...session } })
        expect({ at, status: found.status, body: await found.json() }).toMatchObject({ at, status: 200, body: holds })
      }
    }
    await server.stop()
  })
})
