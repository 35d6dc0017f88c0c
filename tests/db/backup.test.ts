import { existsSync, mkdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { gzipSync } from 'node:zlib'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { environmentFor, PASSWORD, readKey, runTypeScript, startServer, temporaryFolder, type Server } from '@/tests/api/support/server'
import { signIn } from '@/tests/api/support/sign-in'

const folder = temporaryFolder()
const original = path.join(folder, 'original')
const restored = path.join(folder, 'restored')
const file = path.join(folder, 'dump.tar.gz')
afterAll(() => rmSync(folder, { recursive: true, force: true }))

const dump = (dataDir: string, to: string) => runTypeScript('db/dump.ts', [to], environmentFor(dataDir))
const restore = (dataDir: string, from: string) => runTypeScript('db/restore.ts', [from], environmentFor(dataDir))

/** Everything of both teams that the API tells, as text. */
async function everything(server: Server): Promise<string> {
  const told: string[] = []
  for (const [team, email] of [['tarnholm', 'mira@tarnholm.example'], ['kestrel', 'runa@kestrel.example']] as const) {
    const session = await signIn(server.url, email, PASSWORD)
    const get = async (at: string) => {
      const answer = await fetch(`${server.url}/api/v1/teams/${team}${at}`, { headers: { ...session } })
      if (answer.status !== 200) throw new Error(`${at}: ${answer.status}`)
      const text = await answer.text()
      told.push(`${at}\n${text}`)
      return text
    }
    const { items } = JSON.parse(await get('/models')) as { items: { slug: string; revisions: number }[] }
    for (const { slug, revisions } of items) {
      for (let revision = 1; revision <= revisions; revision += 1) {
        for (const part of ['', '/source', '/findings']) await get(`/models/${slug}/revisions/${revision}${part}`)
      }
    }
    await get('/keys')
  }
  return told.join('\n')
}

describe('a dump of the embedded database', () => {
  let before: string

  beforeAll(async () => {
    const server = await startServer({ dataDir: original })
    before = await everything(server)
    await server.stop()
  })

  it('is written whole and readable by its owner only', () => {
    const { status, stdout } = dump(original, file)
    expect({ status, stdout }).toEqual({ status: 0, stdout: `Wrote ${statSync(file).size} bytes to ${file}.\n` })
    expect(statSync(file).mode & 0o777).toBe(0o600)
  })

  it('does not replace a file that is there', () => {
    const { status, stderr } = dump(original, file)
    expect(status).toBe(1)
    expect(stderr).toMatch(/exists already/)
  })

  it('is refused where there is no database', () => {
    const { status, stderr } = dump(path.join(folder, 'nowhere'), path.join(folder, 'nothing.tar.gz'))
    expect(status).toBe(1)
    expect(stderr).toMatch(/There is no database in/)
    expect(existsSync(path.join(folder, 'nowhere'))).toBe(false)
  })

  it('is refused for a PostgreSQL server, with the name of the tool to use', () => {
    const env = environmentFor(original, { databaseUrl: 'postgres://127.0.0.1/elbowroom' })
    const { status, stderr } = runTypeScript('db/dump.ts', [path.join(folder, 'other.tar.gz')], env)
    expect(status).toBe(1)
    expect(stderr).toMatch(/pg_dump/)
  })

  it('restores to the same data: every model, revision, file and finding, the keys and the people', async () => {
    expect(restore(restored, file).status).toBe(0)
    const server = await startServer({ dataDir: restored, seeded: false })
    try {
      expect(await everything(server)).toBe(before)
      const answer = await fetch(`${server.url}/api/v1/teams/tarnholm/models/trainer-3r/revisions/released/forward-kinematics`, {
        method: 'POST',
        headers: { authorization: `Bearer ${readKey(original, 'demo-key')}`, 'content-type': 'application/json' },
        body: JSON.stringify({ configurations: [[0, 0, 0]] }),
      })
      expect(answer.status).toBe(200)
    } finally {
      await server.stop()
    }
  })

  it('does not restore over a folder that holds something, and leaves that alone', () => {
    const occupied = path.join(folder, 'occupied')
    mkdirSync(path.join(occupied, 'database'), { recursive: true })
    writeFileSync(path.join(occupied, 'database', 'PG_VERSION'), '18\n')
    const { status, stderr } = restore(occupied, file)
    expect(status).toBe(1)
    expect(stderr).toMatch(/is not empty/)
    expect(readFileSync(path.join(occupied, 'database', 'PG_VERSION'), 'utf8')).toBe('18\n')
  })

  it.each([
    ['a file that is not there', null],
    ['a file of another kind', Buffer.from('not a dump')],
    ['an archive of something else', gzipSync(Buffer.alloc(2048))],
    ['a dump that was cut off', 'cut'],
  ] as const)('is refused from %s, leaving no database', (what, content) => {
    const damaged = path.join(folder, 'damaged')
    rmSync(damaged, { force: true })
    if (content !== null) writeFileSync(damaged, content === 'cut' ? readFileSync(file).subarray(0, 100_000) : content)
    const target = path.join(folder, 'target')
    const { status, stderr } = restore(target, damaged)
    expect(status, what).toBe(1)
    expect(stderr.trim().split('\n'), stderr).toHaveLength(1)
    expect(existsSync(path.join(target, 'database'))).toBe(false)
  })
})
