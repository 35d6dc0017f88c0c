import { spawn, spawnSync } from 'node:child_process'
import { readFileSync, rmSync, statSync } from 'node:fs'
import { createServer } from 'node:net'
import path from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { environmentFor, freePort, ROOT, runTypeScript, startServer, temporaryFolder } from '@/tests/api/support/server'
import { signIn } from '@/tests/api/support/sign-in'

const folder = temporaryFolder()
const dataDir = path.join(folder, 'data')
afterAll(() => rmSync(folder, { recursive: true, force: true }))

interface Run {
  /** Everything printed so far. */
  printed(): string
  /** Waits until the demo has printed `text`; fails with what it printed when it ends before. */
  until(text: string): Promise<void>
  readonly exited: Promise<number | null>
  interrupt(): void
}

/** The demo on its own data folder, without the secrets that tests otherwise set. */
function runDemo(env: Readonly<Record<string, string>>): Run {
  const { ELBOWROOM_SECRET: _, DEMO_PASSWORD: __, LOG_LEVEL: ___, NODE_ENV: ____, ...inherited } = environmentFor(dataDir)
  const child = spawn(process.execPath, ['samples/demo/demo.mjs'], { cwd: ROOT, env: { ...inherited, ...env } as NodeJS.ProcessEnv, stdio: ['ignore', 'pipe', 'pipe'] })
  let printed = ''
  let wake = () => {}
  for (const stream of [child.stdout, child.stderr]) {
    stream.setEncoding('utf8').on('data', (text: string) => {
      printed += text
      wake()
    })
  }
  let hasEnded = false
  const exited = new Promise<number | null>((resolve) =>
    child.once('close', (code) => {
      hasEnded = true
      wake()
      resolve(code)
    }),
  )
  return {
    printed: () => printed,
    exited,
    interrupt: () => void child.kill('SIGINT'),
    async until(text) {
      while (!printed.includes(text)) {
        if (hasEnded) throw new Error(`the demo ended before it said "${text}":\n${printed}`)
        await new Promise<void>((resolve) => (wake = resolve))
      }
    },
  }
}

const kept = (name: string) => readFileSync(path.join(dataDir, name), 'utf8').trim()
const SECRETS = ['session-secret', 'demo-password', 'demo-key', 'kestrel-key']

describe('npm run demo', () => {
  it('serves a scenario that its printed password, key and request open, and ends cleanly', async () => {
    const port = await freePort()
    const run = runDemo({ PORT: String(port) })
    await run.until('Stop with Ctrl-C')
    const url = `http://127.0.0.1:${port}`
    expect(run.printed()).toContain(`Elbowroom is ready at ${url}`)
    expect(run.printed()).toContain(kept('demo-key'))

    const password = /with the password {2}(\S+)/.exec(run.printed())?.[1] ?? ''
    for (const person of run.printed().match(/\w+@\w+\.example/g) ?? []) {
      await expect(signIn(url, person, password)).resolves.toHaveProperty('cookie')
    }
    const command = /curl -s [\s\S]*?\]\]\}'/.exec(run.printed())?.[0] ?? 'false'
    const { stdout } = spawnSync('bash', ['-euc', command], { cwd: ROOT, encoding: 'utf8' })
    const { results } = JSON.parse(stdout) as { results: { pose: { position: number[] } }[] }
    // x and y of three links of 1 m at 0.5, 1.5 and 1.0 rad.
    const [x, y] = [0, 1].map((axis) => [0.5, 1.5, 1].reduce((sum, angle) => sum + (axis === 0 ? Math.cos(angle) : Math.sin(angle)), 0))
    expect(results[0]!.pose.position).toEqual([expect.closeTo(x!, 12), expect.closeTo(y!, 12), 0])

    run.interrupt()
    expect(await run.exited).toBe(0)
    expect(run.printed()).toContain('Stopped; the database is closed.')
  })

  it('keeps its secrets readable by their owner only', () => {
    expect(SECRETS.map((name) => statSync(path.join(dataDir, name)).mode & 0o777)).toEqual(SECRETS.map(() => 0o600))
    expect(statSync(dataDir).mode & 0o077).toBe(0)
  })

  it('keeps its data and secrets in a second run, installs and builds nothing, and takes a new password when told', async () => {
    const before = SECRETS.map(kept)
    const port = await freePort()
    const run = runDemo({ PORT: String(port), DEMO_PASSWORD: 'another-password-7' })
    await run.until('Stop with Ctrl-C')
    expect(run.printed()).toContain('Packages are up to date.')
    expect(run.printed()).toContain('The build is up to date.')
    const session = await signIn(`http://127.0.0.1:${port}`, 'ines@tarnholm.example', 'another-password-7')
    const answer = await fetch(`http://127.0.0.1:${port}/api/v1/teams/tarnholm/models/skerry-7`, { headers: { ...session } })
    expect(await answer.json()).toMatchObject({ revisions: 2, released: 2 })
    run.interrupt()
    expect(await run.exited).toBe(0)
    expect(SECRETS.map(kept)).toEqual(before.map((secret, index) => (SECRETS[index] === 'demo-password' ? 'another-password-7' : secret)))
  })

  it('says that its port is in use', async () => {
    const other = createServer()
    await new Promise<void>((resolve) => other.listen(0, '127.0.0.1', resolve))
    const { port } = other.address() as { port: number }
    const run = runDemo({ PORT: String(port) })
    expect(await run.exited).toBe(1)
    expect(run.printed()).toBe(`Port ${port} is in use by another program. Stop it, or choose another: PORT=${port + 1} npm run demo\n`)
    other.close()
  })

  it('says that its data folder is in use', async () => {
    const server = await startServer({ dataDir, seeded: false })
    const run = runDemo({ PORT: String(await freePort()) })
    expect(await run.exited).toBe(1)
    expect(run.printed()).toMatch(/The database folder \S+ is in use by another process\./)
    await server.stop()
  })

  it('does not mix its scenario into an installation that is somebody\'s', async () => {
    const stranger = path.join(folder, 'stranger')
    expect(runTypeScript('tests/service/support/add-person.ts', [], environmentFor(stranger)).status).toBe(0)
    const run = runDemo({ PORT: String(await freePort()), ELBOWROOM_DATA_DIR: stranger })
    expect(await run.exited).toBe(1)
    expect(run.printed()).toContain('The database holds another installation.')
  })
})
