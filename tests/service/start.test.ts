import { existsSync, rmSync } from 'node:fs'
import { afterAll, describe, expect, it, onTestFinished, vi } from 'vitest'
import { freePort, startServer, temporaryFolder } from '@/tests/api/support/server'

const dataDir = temporaryFolder()
afterAll(() => rmSync(dataDir, { recursive: true, force: true }))

/** What a server that must not start says: its last line of the log. */
async function refusal(options: Parameters<typeof startServer>[0]): Promise<string> {
  const error = await startServer({ dataDir, seeded: false, ...options }).then(
    async (server) => {
      await server.stop()
      throw new Error('it started')
    },
    (reason: Error) => reason,
  )
  const lines = error.message.split('\n').filter((line) => line.startsWith('{'))
  return (JSON.parse(lines.at(-1) ?? '{"msg":""}') as { msg: string }).msg
}

describe('a server that cannot start', () => {
  it('says that the session secret is missing', async () => {
    expect(await refusal({ env: { ELBOWROOM_SECRET: '' } })).toMatch(/^cannot start: ELBOWROOM_SECRET is missing or shorter than 32 characters\./)
  })

  it('says that DATABASE_URL is of the wrong kind', async () => {
    expect(await refusal({ databaseUrl: 'mysql://127.0.0.1/x' })).toMatch(/^cannot start: DATABASE_URL must start with postgres:\/\//)
  })

  it('says that the PostgreSQL server is not there', async () => {
    const port = await freePort()
    expect(await refusal({ databaseUrl: `postgres://elbowroom@127.0.0.1:${port}/x` })).toMatch(/^cannot start: .*(ECONNREFUSED|refused)/)
  })

  it('leaves no database behind', () => {
    expect(existsSync(`${dataDir}/database`)).toBe(false)
  })
})

describe('a server on an empty database', () => {
  /** Started on the empty folder; what it prints may arrive a little later than its first answer. */
  async function started() {
    const server = await startServer({ dataDir, seeded: false })
    onTestFinished(async () => void (await server.stop()))
    const says = (pattern: RegExp) => vi.waitFor(() => expect(server.log()).toMatch(pattern), { timeout: 10_000 })
    const code = async () => {
      await says(/setup code: \S+"/)
      return /setup code: (\S+)"/.exec(server.log())![1]
    }
    return { server, says, code }
  }

  it('prints a setup code, sends the first visitor to where it is asked for, and closes the database when told to end', async () => {
    const { server, says, code } = await started()
    await code()
    const front = await fetch(`${server.url}/`, { redirect: 'manual' })
    expect(new URL(front.headers.get('location') ?? '', server.url).pathname).toBe('/setup')
    expect(await server.stop()).toBe(0)
    await says(/database closed on SIGTERM/)
  })

  it('prints another setup code at each start until it is set up', async () => {
    const first = await started()
    const before = await first.code()
    await first.server.stop()
    const second = await started()
    expect(await second.code()).not.toBe(before)
  })
})
