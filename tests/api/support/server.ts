import { spawn, spawnSync, type ChildProcess } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { createServer, type AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { TYPESCRIPT } from '@/samples/demo/typescript.mjs'
import { setTimeout as pause } from 'node:timers/promises'

export const ROOT = path.resolve(import.meta.dirname, '../../..')
const NEXT = path.join(ROOT, 'node_modules/next/dist/bin/next')

/** The password of every person of the demo scenario in the tests. */
export const PASSWORD = 'correct-elbow-room-42'

export interface ServerOptions {
  /** Folder of the embedded database; a temporary one, removed at the end, when left out. */
  readonly dataDir?: string
  /** PostgreSQL server to use; the embedded database when left out. */
  readonly databaseUrl?: string
  /** False leaves the database empty. */
  readonly seeded?: boolean
  readonly env?: Readonly<Record<string, string>>
}

export interface Server {
  readonly url: string
  readonly port: number
  readonly dataDir: string
  readonly process: ChildProcess
  /** Everything the server has printed. */
  log(): string
  /** Ends it as an operator does (SIGTERM) and waits; returns its exit code. */
  stop(): Promise<number | null>
  /** Ends it without warning (SIGKILL) and waits. The data folder stays. */
  kill(): Promise<void>
}

export async function freePort(): Promise<number> {
  const probe = createServer()
  await new Promise<void>((resolve) => probe.listen(0, '127.0.0.1', resolve))
  const { port } = probe.address() as AddressInfo
  await new Promise((resolve) => probe.close(resolve))
  return port
}

export const temporaryFolder = (): string => mkdtempSync(path.join(tmpdir(), 'elbowroom-test-'))

/** Environment of a server or command on this folder and database, free of what the caller's shell happens to hold. */
export function environmentFor(dataDir: string, options: ServerOptions = {}): NodeJS.ProcessEnv {
  const { DATABASE_URL: _url, PORT: _port, HOST: _host, ELBOWROOM_URL: _site, NODE_OPTIONS: _options, VITEST: _vitest, ...inherited } = process.env
  return {
    ...inherited,
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    NEXT_MANUAL_SIG_HANDLE: 'true',
    LOG_LEVEL: 'info',
    ELBOWROOM_DATA_DIR: dataDir,
    ELBOWROOM_SECRET: 'a secret for tests only, long enough to be taken',
    DEMO_PASSWORD: PASSWORD,
    ...(options.databaseUrl === undefined ? {} : { DATABASE_URL: options.databaseUrl }),
    ...options.env,
  }
}

/** Runs a command of this project, written in TypeScript, to its end. */
export const runTypeScript = (file: string, args: readonly string[], env: NodeJS.ProcessEnv) =>
  spawnSync(process.execPath, [...TYPESCRIPT, file, ...args], { cwd: ROOT, env, encoding: 'utf8' })

/** Fills an empty database with the demo scenario, as `npm run demo` does. */
export function seed(dataDir: string, options: ServerOptions = {}): void {
  const { status, stdout, stderr } = runTypeScript('samples/demo/seed.ts', [], environmentFor(dataDir, options))
  if (status !== 0) throw new Error(`the demo scenario could not be made:\n${stdout}${stderr}`)
}

export const readKey = (dataDir: string, name: 'demo-key' | 'kestrel-key'): string => readFileSync(path.join(dataDir, name), 'utf8').trim()

/** Starts the built server on a free loopback port and waits until it is ready. Fails with what it printed when it ends before. */
export async function startServer(options: ServerOptions = {}): Promise<Server> {
  const dist = path.join(ROOT, process.env.NEXT_DIST_DIR ?? '.next')
  if (!existsSync(path.join(dist, 'BUILD_ID'))) throw new Error('There is no build to start: run `npm run build` first.')
  const dataDir = options.dataDir ?? temporaryFolder()
  const removeFolder = () => options.dataDir === undefined && rmSync(dataDir, { recursive: true, force: true })
  try {
    if (options.seeded !== false) seed(dataDir, options)
  } catch (error) {
    removeFolder()
    throw error
  }
  const port = await freePort()
  const url = `http://127.0.0.1:${port}`
  const child = spawn(process.execPath, [NEXT, 'start', '-H', '127.0.0.1', '-p', String(port)], {
    cwd: ROOT,
    env: { ...environmentFor(dataDir, options), PORT: String(port) },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let printed = ''
  for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', (text: string) => (printed += text))
  const exited = new Promise<number | null>((resolve) => child.once('exit', resolve))
  const lastResort = () => child.kill('SIGKILL')
  process.once('exit', lastResort)
  const end = async (signal: NodeJS.Signals) => {
    child.kill(signal)
    const timer = setTimeout(lastResort, 20_000)
    const code = await exited
    clearTimeout(timer)
    process.off('exit', lastResort)
    return code
  }
  await untilReady(url, child, () => printed).catch(async (error: unknown) => {
    await end('SIGKILL')
    removeFolder()
    throw error
  })
  return {
    url,
    port,
    dataDir,
    process: child,
    log: () => printed,
    stop: async () => {
      const code = await end('SIGTERM')
      removeFolder()
      return code
    },
    kill: async () => void (await end('SIGKILL')),
  }
}

async function untilReady(url: string, child: ChildProcess, printed: () => string): Promise<void> {
  for (let attempt = 0; attempt < 1200; attempt += 1) {
    if (child.exitCode !== null || child.signalCode !== null) throw new Error(`the server ended before it was ready:\n${printed()}`)
    const answer = await fetch(`${url}/api/health/ready`).catch(() => null)
    if (answer?.ok === true) return
    await pause(100)
  }
  throw new Error(`the server was not ready within two minutes:\n${printed()}`)
}
