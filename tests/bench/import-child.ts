import type { ReaderQuestion } from '@/lib/catalog/answer-reader'
import { createWorkerPool } from '@/lib/catalog/worker-pool'
import { readerThread } from '../lib/catalog/reader-thread'
import { WORST_FILES } from './worst-files'

/** One file of WORST_FILES, named by the first argument, read three times in a thread with the memory limit of the second (MB).
 *  Prints JSON: the middle times in ms by the clock and by the processor, how much the process grew in MB, what came out. */

const middle = (values: readonly number[]): number => values.toSorted((a, b) => a - b)[1]!
const [, , name = '', limit = ''] = process.argv
const pool = createWorkerPool<ReaderQuestion, string>({ spawn: () => readerThread({ maxOldGenerationSizeMb: Number(limit) }), size: 1, queue: 100, limitMs: 120_000, idleMs: 60_000 })
const bytes = new TextEncoder().encode(WORST_FILES[name]!())
await pool.ask({ name: 'small.urdf', bytes: new TextEncoder().encode('<robot name="r"><link name="a"/></robot>'), as: 'json' })

const before = process.memoryUsage.rss()
let peak = before
const watch = setInterval(() => (peak = Math.max(peak, process.memoryUsage.rss())), 5)
const seen: number[] = []
const cpu: number[] = []
let came = ''
for (let i = 0; i < 3; i++) {
  const start = performance.now()
  const used = process.cpuUsage()
  const outcome = await pool.ask({ name: 'worst.urdf', bytes, as: 'json' })
  seen.push(performance.now() - start)
  const { user, system } = process.cpuUsage(used)
  cpu.push((user + system) / 1000)
  if (!('answer' in outcome)) came = `given up: ${outcome.givenUp}`
  else {
    const { findings, structure } = JSON.parse(outcome.answer) as { findings: unknown[]; structure?: object }
    came = `${structure === undefined ? 'refused' : 'accepted'}, ${findings.length} findings`
  }
}
clearInterval(watch)
await pool.end()
process.stdout.write(JSON.stringify({ bytes: bytes.length, ms: middle(seen), cpu: middle(cpu), mb: (peak - before) / 2 ** 20, came }))
