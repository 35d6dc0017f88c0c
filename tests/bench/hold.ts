import { spawn, type ChildProcess } from 'node:child_process'
import { rmSync } from 'node:fs'
import { request as httpRequest, type IncomingMessage } from 'node:http'
import path from 'node:path'
import { environmentFor, freePort, readKey, ROOT, seed, temporaryFolder } from '@/tests/api/support/server'
import { HELD, type Held } from './held-requests'

/** The longest time that the built server holds its event loop while it answers batches, by operation and format. The server is a
 *  process of its own with a probe loaded before it (hold-probe.mjs). Two phases: until the first byte of the answer (reading,
 *  parsing, computing, checking, writing into memory) and until the last (sending). Computing time is what the service itself holds; by
 *  the clock, other programs add theirs.
 *  --rounds N: each request so often, medians and the worst are printed (default 5). --only TEXT: requests with it in their name. */

const LIMIT_MS = 10
const argument = (name: string) => (process.argv.includes(name) ? process.argv[process.argv.indexOf(name) + 1] : undefined)
const rounds = Number(argument('--rounds') ?? 5)
const only = argument('--only') ?? ''

interface Longest {
  readonly clock: number
  readonly computing: number
  readonly collecting: number
}

interface Measured {
  readonly first: Longest
  readonly rest: Longest
  readonly took: number
  readonly status: number
  readonly bytes: number
}

const dataDir = temporaryFolder()
seed(dataDir)
const key = readKey(dataDir, 'demo-key')
const port = await freePort()
const next = path.join(ROOT, 'node_modules/next/dist/bin/next')
const server = spawn(process.execPath, ['--import', path.join(import.meta.dirname, 'hold-probe.mjs'), next, 'start', '-H', '127.0.0.1', '-p', String(port)], {
  cwd: ROOT,
  env: { ...environmentFor(dataDir), LOG_LEVEL: 'error', PORT: String(port) },
  stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
})

const longestOf = (child: ChildProcess): Promise<Longest> =>
  new Promise((resolve) => {
    child.once('message', (message) => resolve(message as Longest))
    child.send('ask')
  })

const post = ({ path: at, headers, body }: Held): Promise<IncomingMessage> =>
  new Promise((resolve, reject) => {
    const sending = httpRequest(
      {
        host: '127.0.0.1', port, method: 'POST', path: `/api/v1/teams/tarnholm/models/skerry-7/revisions/1/${at}`,
        headers: { authorization: `Bearer ${key}`, 'content-length': body.length, ...headers },
      },
      resolve,
    )
    sending.once('error', reject)
    sending.end(body)
  })

async function measure(held: Held): Promise<Measured> {
  await longestOf(server)
  const started = performance.now()
  const answer = await post(held)
  const first = await longestOf(server)
  let bytes = 0
  for await (const piece of answer) bytes += (piece as Buffer).length
  const took = performance.now() - started
  return { first, rest: await longestOf(server), took, status: answer.statusCode!, bytes }
}

const median = (values: readonly number[]) => values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)]!
const ms = (value: number) => value.toFixed(1).padStart(7)
const COLUMNS = [['first', 'computing'], ['first', 'clock'], ['first', 'collecting'], ['rest', 'computing'], ['rest', 'clock']] as const

try {
  for (let attempt = 0; attempt < 600; attempt++) {
    if ((await fetch(`http://127.0.0.1:${port}/api/health/ready`).catch(() => null))?.ok === true) break
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  process.stdout.write(`Longest hold of the event loop, ms, median and worst of ${rounds}; promised: at most ${LIMIT_MS}.\n`)
  const heads = ['to first byte', '  by the clock', '  garbage', 'to the end', '  by the clock']
  process.stdout.write(`${''.padEnd(56)}${heads.map((head) => head.padStart(16)).join('')}    took     MiB\n`)
  for (const held of HELD.filter(({ name }) => name.includes(only))) {
    // The first two find nothing compiled.
    for (let warm = 0; warm < 2; warm++) await measure(held)
    const seen: Measured[] = []
    for (let round = 0; round < rounds; round++) seen.push(await measure(held))
    const cells = COLUMNS.map(([phase, what]) => {
      const values = seen.map((one) => one[phase][what])
      return ` ${ms(median(values))} ${ms(Math.max(...values))}`
    })
    const { bytes, status } = seen.at(-1)!
    process.stdout.write(`${held.name.padEnd(56)}${cells.join('')}${ms(median(seen.map(({ took }) => took)))} ${ms(bytes / 1024 / 1024)}  ${status}\n`)
  }
} finally {
  server.kill('SIGTERM')
  await new Promise((resolve) => server.once('exit', resolve))
  rmSync(dataDir, { recursive: true, force: true })
}
