import { spawn, spawnSync } from 'node:child_process'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as pause } from 'node:timers/promises'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { environmentFor, freePort, ROOT, seed, startServer, temporaryFolder, type Server } from '@/tests/api/support/server'
import { findPostgres, startPostgres } from '@/tests/db/support/postgres.mjs'

const readme = readFileSync(path.join(ROOT, 'README.md'), 'utf8')
const { scripts } = JSON.parse(readFileSync(path.join(ROOT, 'package.json'), 'utf8')) as { scripts: Record<string, string> }

const blocks = [...readme.matchAll(/^```(\w+)\n([\s\S]*?)^```$/gm)].map(([, language = '', text = '']) => ({ language, text }))
const inLanguage = (language: string) => blocks.filter((block) => block.language === language).map(({ text }) => text)

/** Every command of the README, continuation lines joined. */
const commands = inLanguage('bash').flatMap((text) => text.replace(/\\\n\s*/g, '').trim().split('\n'))
const commandsLike = (pattern: RegExp) => commands.filter((command) => pattern.test(command))

const folder = temporaryFolder()
const dataDir = path.join(folder, 'served')
let server: Server

beforeAll(async () => {
  server = await startServer({ dataDir })
})
afterAll(async () => {
  await server?.stop()
  rmSync(folder, { recursive: true, force: true })
})

/** The text with this test's address and folder in place of the default ones. */
const here = (text: string) => text.replaceAll('http://127.0.0.1:3000', server.url).replaceAll('.data/', `${dataDir}/`)

function sh(command: string, env: NodeJS.ProcessEnv = environmentFor(dataDir)) {
  const { status, stdout, stderr } = spawnSync('bash', ['-euc', here(command)], { cwd: ROOT, env, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 })
  return { status, stdout, stderr }
}

// What proves each command: the table below must know every one.
const PROOFS: readonly (readonly [RegExp, string])[] = [
  [/^npm run demo$/, 'tests/service/demo.test.ts runs what the script names'],
  [/^npm test$/, 'this test runs within it'],
  [/^npm ci$/, 'the packages that this test imports were installed by it'],
  [/^npm run build$/, 'the server of this test is what it built'],
  [/^export ELBOWROOM_SECRET=/, 'executed below'],
  [/^npm start$/, 'executed below'],
  [/^curl -s /, 'executed below'],
  [/^(ELBOWROOM_DATA_DIR=\S+ )?npm run (dump|restore) -- /, 'executed below'],
  [/^pg_(dump|restore) /, 'executed below'],
  [/^tar -[cx]f /, 'executed below'],
]

describe('the README', () => {
  it('has no command without a proof', () => {
    expect(commands.length).toBeGreaterThanOrEqual(12)
    expect(commands.filter((command) => PROOFS.filter(([pattern]) => pattern.test(command)).length !== 1)).toEqual([])
  })

  it('names only npm scripts that exist', () => {
    const named = [...readme.matchAll(/npm (?:run ([\w:-]+)|(test|start)\b)/g)].map(([, run, short]) => run ?? short ?? '')
    expect(named.length).toBeGreaterThan(5)
    expect(named.filter((name) => scripts[name] === undefined)).toEqual([])
  })

  it('has code in no other language than those proved here and the Structured Text', () => {
    expect([...new Set(blocks.map(({ language }) => language))].sort()).toEqual(['bash', 'iecst', 'json', 'python'])
  })

  it('has a row for every variable that the environment is asked for', () => {
    const asked = [...readFileSync(path.join(ROOT, 'lib/env.ts'), 'utf8').matchAll(/text\('(\w+)'\)/g)].map(([, name]) => name)
    const rows = [...readme.matchAll(/^\| `(\w+)` \|/gm)].map(([, name]) => name)
    expect(asked.length).toBeGreaterThan(4)
    expect(asked.filter((name) => !rows.includes(name))).toEqual([])
  })

  it('shows the answer that the first call gives', () => {
    const [first] = commandsLike(/forward-kinematics/)
    const { status, stdout } = sh(first!)
    expect(status).toBe(0)
    const shown = JSON.parse(inLanguage('json')[0]!) as { results: [{ pose: { position: number[]; quaternion: number[] } }] }
    const answer = JSON.parse(stdout) as typeof shown
    const { position, quaternion } = shown.results[0].pose
    const closeTo = (values: readonly number[]): unknown[] => values.map((value) => expect.closeTo(value, 9))
    const expected = { ...shown, results: [{ ...shown.results[0], pose: { position: closeTo(position), quaternion: closeTo(quaternion) } }] }
    expect(answer).toMatchObject(expected)
  })

  it.each(commandsLike(/^curl -s /))('gets an answer to %s', (command) => {
    const { status, stdout } = sh(`${command} -f`)
    expect(status).toBe(0)
    expect(() => JSON.parse(stdout) as unknown).not.toThrow()
  })

  it('has a Python program that prints a pose and rates that are not a hold', () => {
    const { status, stdout, stderr } = spawnSync('python3', ['-'], { input: here(inLanguage('python')[0]!), encoding: 'utf8' })
    expect({ status, stderr }).toEqual({ status: 0, stderr: '' })
    expect(stdout).toMatch(/^tool at \[[-\d.e, ]+\] revision 2$/m)
    const rates = JSON.parse(/^rates (.*)$/m.exec(stdout)?.[1] ?? '[]') as number[]
    expect(rates).toHaveLength(7)
    expect(Math.max(...rates.map(Math.abs))).toBeGreaterThan(1e-3)
  })

  it('starts a server of its own with the commands for running it for real', async () => {
    const port = await freePort()
    const lines = commandsLike(/^export ELBOWROOM_SECRET=|^npm start$/)
    expect(lines).toHaveLength(2)
    const { ELBOWROOM_SECRET: _, NEXT_MANUAL_SIG_HANDLE: __, ...inherited } = environmentFor(path.join(folder, 'real'))
    const child = spawn('bash', ['-euc', lines.join('\nexec ')], { cwd: ROOT, env: { ...inherited, PORT: String(port) }, stdio: ['ignore', 'pipe', 'pipe'] })
    const exited = new Promise<number | null>((resolve) => child.once('exit', resolve))
    let printed = ''
    for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', (text: string) => (printed += text))
    for (let attempt = 0; attempt < 300 && child.exitCode === null; attempt += 1) {
      if ((await fetch(`http://127.0.0.1:${port}/api/health/ready`).catch(() => null))?.ok === true) break
      await pause(100)
    }
    expect((await fetch(`http://127.0.0.1:${port}/api/health/ready`)).status, printed).toBe(200)
    child.kill('SIGTERM')
    await exited
    expect(printed).toMatch(/setup code: /)
    expect(printed).toContain('database closed on SIGTERM')
  })

  it('dumps and restores the embedded database', () => {
    const stopped = path.join(folder, 'stopped')
    seed(stopped)
    const lines = commandsLike(/npm run (dump|restore) -- /).map((line) => line.replace(/\b(elbowroom\.tar\.gz|restored)\b/g, `${folder}/$1`))
    expect(lines).toHaveLength(2)
    for (const line of lines) expect(sh(line, environmentFor(stopped))).toMatchObject({ status: 0 })
    expect(existsSync(path.join(folder, 'restored/database/PG_VERSION'))).toBe(true)
  })

  it('copies the files of archives and meshes beside the restored database', () => {
    const digest = '0'.repeat(64)
    mkdirSync(path.join(dataDir, 'files/00'), { recursive: true })
    writeFileSync(path.join(dataDir, 'files/00', digest), 'kept')
    mkdirSync(path.join(folder, 'restored'), { recursive: true })
    const lines = commandsLike(/^tar /).map((line) => line.replace(/\b(elbowroom-files\.tar|restored)\b/g, `${folder}/$1`))
    expect(lines).toHaveLength(2)
    for (const line of lines) expect(sh(line)).toMatchObject({ status: 0 })
    expect(readFileSync(path.join(folder, 'restored/files/00', digest), 'utf8')).toBe('kept')
  })

  it('dumps and restores a PostgreSQL database', async () => {
    const postgres = await startPostgres()
    try {
      const [full, empty] = [postgres.createDatabase('full'), postgres.createDatabase('empty')]
      seed(path.join(folder, 'beside-postgres'), { databaseUrl: full })
      const env = { PATH: `${findPostgres()}:${process.env.PATH}`, DATABASE_URL: full, EMPTY_DATABASE_URL: empty }
      const lines = commandsLike(/^pg_/).map((line) => line.replace('elbowroom.pgdump', path.join(folder, 'elbowroom.pgdump')))
      expect(lines).toHaveLength(2)
      for (const line of lines) expect(sh(line, { ...process.env, ...env })).toMatchObject({ status: 0 })
      const restored = await startServer({ dataDir: path.join(folder, 'beside-postgres'), databaseUrl: empty, seeded: false })
      expect(restored.log()).not.toContain('setup code')
      expect(await restored.stop()).toBe(0)
    } finally {
      await postgres.stop()
    }
  })
})
