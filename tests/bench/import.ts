import { spawnSync } from 'node:child_process'
import path from 'node:path'
import { TYPESCRIPT } from '@/samples/demo/typescript.mjs'
import { WORST_FILES } from './worst-files'

/** Time and memory of the importer for the worst files, each in a process of its own. --limit MB sets the reader's memory limit
 *  (default 256, as in the service). */

const argument = process.argv.indexOf('--limit')
const limit = argument === -1 ? '256' : process.argv[argument + 1]!
const rows = [['file', 'MB', 'time', 'processor', 'memory', 'what came of it']]
for (const name of Object.keys(WORST_FILES)) {
  const { stdout, stderr } = spawnSync(process.execPath, [...TYPESCRIPT, path.join(import.meta.dirname, 'import-child.ts'), name, limit], { encoding: 'utf8' })
  if (!stdout.startsWith('{')) throw new Error(`${name}: ${stdout}${stderr}`)
  const { bytes, ms, cpu, mb, came } = JSON.parse(stdout) as { bytes: number; ms: number; cpu: number; mb: number; came: string }
  rows.push([name, (bytes / 2 ** 20).toFixed(1), `${ms.toFixed(0)} ms`, `${cpu.toFixed(0)} ms`, `${mb.toFixed(0)} MB`, came])
}
const widths = rows[0]!.map((_cell, i) => Math.max(...rows.map((row) => row[i]!.length)))
for (const row of rows) process.stdout.write(`${row.map((cell, i) => (i === 0 || i === 5 ? cell.padEnd(widths[i]!) : cell.padStart(widths[i]!))).join('  ').trimEnd()}\n`)
process.stdout.write('\nThe middle of three readings in one thread, by the clock and by the processor (all threads, the collection of garbage included);\nmemory is what the process grew by at most, the file and the answer included.\n')
