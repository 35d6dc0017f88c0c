import { rmSync } from 'node:fs'
import { runTypeScript, environmentFor, PASSWORD, seed, startServer, temporaryFolder } from '@/tests/api/support/server'
import { signIn } from '@/tests/api/support/sign-in'

/** Times of the register over HTTP, on the embedded database, in a team of 10 000 models with five revisions each. The target is 50 ms for
 *  the 95th percentile of every question. Needs a build. --models N, --rounds N (default 60). */

const TARGET_MS = 50
const numberAfter = (flag: string, otherwise: number): number => {
  const at = process.argv.indexOf(flag)
  return at === -1 ? otherwise : Number(process.argv[at + 1])
}
const models = numberAfter('--models', 10_000)
const rounds = numberAfter('--rounds', 60)

const middle = `arm-${String(Math.floor(models / 2)).padStart(5, '0')}`
const cursor = Buffer.from(JSON.stringify([middle])).toString('base64url')

/** What is asked, with a different model each time where one is looked for. */
const QUESTIONS: readonly (readonly [what: string, query: (round: number) => Record<string, string>])[] = [
  ['first page', () => ({})],
  ['first page of 200', () => ({ limit: '200' })],
  ['page from the middle', () => ({ cursor })],
  ['models by name', (round) => ({ query: `gannet ${round * 12 + 8}` })],
  ['one model by serial number', (round) => ({ query: `LR-${String(round * 97 * 7919).padStart(9, '0')}` })],
  ['models by robot name', (round) => ({ query: `arm_${round * 31 + 5}` })],
  ['a word of many, accents left out', () => ({ query: 'storche' })],
  ['a word in every note', () => ({ query: 'arm for' })],
  ['two letters', () => ({ query: 'kn' })],
  ['one letter that nobody has', () => ({ query: '§' })],
  ['a word that nobody has', () => ({ query: 'albatross' })],
  ['hebrew', () => ({ query: 'חסידה' })],
  ['a common status', () => ({ status: 'superseded' })],
  ['a rare status', () => ({ status: 'in-review' })],
  ['joints', () => ({ joints: '7' })],
  ['joints that nobody has', () => ({ joints: '40' })],
  ['all three', () => ({ query: 'gluing', status: 'released', joints: '5' })],
]

const dataDir = temporaryFolder()
try {
  const begun = performance.now()
  seed(dataDir)
  const filled = runTypeScript('tests/bench/fill-register.ts', [String(models)], environmentFor(dataDir))
  if (filled.status !== 0) throw new Error(`the register could not be filled:\n${filled.stdout}${filled.stderr}`)
  process.stdout.write(`${models} models of five revisions, made in ${((performance.now() - begun) / 1000).toFixed(0)} s\n`)
  const starting = performance.now()
  const server = await startServer({ dataDir, seeded: false })
  process.stdout.write(`server ready after ${((performance.now() - starting) / 1000).toFixed(1)} s\n`)
  try {
    const { cookie } = await signIn(server.url, 'ines@tarnholm.example', PASSWORD)
    const ask = async (path: string) => {
      const start = performance.now()
      const answer = await fetch(server.url + path, { headers: { cookie, accept: 'application/json' } })
      const text = await answer.text()
      if (!answer.ok) throw new Error(`${path}: ${answer.status} ${text}`)
      return { ms: performance.now() - start, found: (JSON.parse(text) as { items: unknown[] }).items.length }
    }
    process.stdout.write(`${'ms'.padEnd(36)}${'rows'.padStart(6)}${'p50'.padStart(8)}${'p95'.padStart(8)}${'most'.padStart(8)}\n`)
    let worst = 0
    for (const [what, query] of QUESTIONS) {
      const path = (round: number) => `/api/v1/teams/tarnholm/models?${new URLSearchParams(query(round))}`
      for (let round = 0; round < 5; round++) await ask(path(round))
      const seen: Awaited<ReturnType<typeof ask>>[] = []
      for (let round = 0; round < rounds; round++) seen.push(await ask(path(round)))
      const times = seen.map(({ ms }) => ms).toSorted((a, b) => a - b)
      const at = (part: number) => times[Math.min(times.length - 1, Math.floor(part * times.length))]!
      worst = Math.max(worst, at(0.95))
      process.stdout.write(`${what.padEnd(36)}${String(seen[0]!.found).padStart(6)}${[at(0.5), at(0.95), at(1)].map((ms) => ms.toFixed(1).padStart(8)).join('')}\n`)
    }
    process.stdout.write(`worst p95 ${worst.toFixed(1)} ms, ${(worst / TARGET_MS).toFixed(2)} of the target of ${TARGET_MS} ms\n`)
  } finally {
    await server.stop()
  }
} finally {
  rmSync(dataDir, { recursive: true, force: true })
}
