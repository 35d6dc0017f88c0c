import { spawnSync } from 'node:child_process'
import { writeFileSync } from 'node:fs'
import { availableParallelism } from 'node:os'
import { benchArm, benchConfigurations } from './arms'
import { startKdl } from './kdl-child'
import { ours, type Ask } from './ours'

/** Time per call, ours beside Orocos KDL, mathjs and ml-matrix, on one core, in turns within one run; ratios of medians.
 *  --json FILE also writes [{asked, beside, ratio, target}]; --rounds N sets how many turns each has (default 200). */

/** One turn lasts about so long (ns): short enough to fall between the interruptions of a busy machine. */
const TURN = 1e6
const CONFIGURATIONS = 256

const argument = (name: string) => process.argv[process.argv.indexOf(name) + 1]
const rounds = process.argv.includes('--rounds') ? Number(argument('--rounds')) : 200

interface Contestant {
  readonly name: string
  /** Nanoseconds a call over `count` calls. */
  time(count: number): number | Promise<number>
  calls: number
  readonly seen: number[]
}

function contestant(name: string, time: Contestant['time']): Contestant {
  return { name, time, calls: 1, seen: [] }
}

function inThisProcess(ask: Ask, configurations: readonly Float64Array[]): (count: number) => number {
  return (count) => {
    const start = process.hrtime.bigint()
    for (let i = 0, at = 0; i < count; i++) {
      ask(configurations[at]!)
      if (++at === configurations.length) at = 0
    }
    const took = Number(process.hrtime.bigint() - start)
    return took / count
  }
}

const median = (values: readonly number[]) => values.toSorted((a, b) => a - b)[Math.floor(values.length / 2)]!

/** Lets everyone warm up, then takes turns. */
async function race(contestants: readonly Contestant[]): Promise<Map<string, number>> {
  for (const one of contestants) {
    for (let spent = 0, count = 1; spent < 30 * TURN; count = Math.min(2 * count, 20_000)) spent += count * (await one.time(count))
    one.calls = Math.max(1, Math.round(TURN / (await one.time(Math.max(1, Math.round(TURN / (await one.time(10))))))))
  }
  for (let round = 0; round < rounds; round++) for (const one of contestants) one.seen.push(await one.time(one.calls))
  return new Map(contestants.map(({ name, seen }) => [name, median(seen)]))
}

const QUESTIONS = [
  { key: 'fk', asked: 'FK', kdl: 'fk', target: null },
  { key: 'fk-jacobian', asked: 'FK + Jacobian', kdl: 'fk-jacobian', target: 0.2 },
  { key: 'damped', asked: 'FK + Jacobian + damped least squares', kdl: 'damped', target: 0.1 },
  { key: 'spare', asked: 'FK + Jacobian + minimum norm, posture gradient, scaling', kdl: 'spare', target: 0.2 },
  { key: 'everything', asked: 'everything (rates, singular values, rank, basis, projector)', kdl: 'spare', target: 0.5 },
  { key: 'null-space', asked: 'FK + Jacobian + null space (singular values, rank, basis, lost directions)', kdl: null, target: null },
] as const
const KDL_NAMES = { fk: 'KDL FK', 'fk-jacobian': 'KDL FK + JntToJac', damped: 'KDL FK + ikvel_wdls', spare: 'KDL FK + ikvel_pinv_nso' } as const

interface Row {
  readonly asked: string
  readonly beside: string
  readonly ratio: number | null
  readonly target: number | null
}

const rows: Row[] = []
const lines: string[][] = [['asked', 'joints', 'ours', 'ours/joint', 'KDL', 'mathjs', 'ml-matrix', 'ours/KDL', 'target']]
const ns = (value: number | undefined) => (value === undefined ? '–' : value < 1e4 ? `${value.toFixed(0)} ns` : `${(value / 1000).toFixed(1)} µs`)

// On one core, this process with all its threads and what it starts from here on: on two, whatever else runs on one of them, or on the
// other half of its hardware, would count against one side alone. Where that cannot be asked for, they run where they run.
spawnSync('taskset', ['--all-tasks', '--cpu-list', '--pid', String(availableParallelism() - 1), String(process.pid)], { stdio: 'ignore' })

const kdl = startKdl()
const hasKdl = !('missing' in kdl)
if (!hasKdl) process.stdout.write(`Without Orocos KDL: ${kdl.missing}\n`)

const arm = benchArm(7)
const configurations = benchConfigurations(7, CONFIGURATIONS)
const mine = ours(arm)
if (hasKdl) kdl.load(arm, configurations)
const sevens = new Map<string, Map<string, number>>()
for (const { key, kdl: question } of QUESTIONS) {
  const contestants = [contestant('ours', inThisProcess(mine[key], configurations))]
  if (hasKdl && question !== null) contestants.push(contestant('kdl', (count) => kdl.time(question, count)))
  if (hasKdl && key === 'fk-jacobian') contestants.push(contestant('lean', (count) => kdl.time('lean', count)))
  sevens.set(key, await race(contestants))
}

const [ten, hundred] = [benchArm(10), benchArm(100)]
const [tens, hundreds] = [benchConfigurations(10, CONFIGURATIONS), benchConfigurations(100, CONFIGURATIONS)]
const long = [
  contestant('ten', inThisProcess(ours(ten)['fk-jacobian'], tens)),
  contestant('hundred', inThisProcess(ours(hundred)['fk-jacobian'], hundreds)),
]
if (hasKdl) {
  kdl.load(hundred, hundreds)
  long.push(contestant('kdl', (count) => kdl.time('fk-jacobian', count)))
}
const longs = await race(long)
if (hasKdl) kdl.end()

// Loaded only now, and racing by themselves: that they are there makes every typed array of the process slower by about a fifth, and
// what they leave to the garbage collector would be swept in the turn of the next.
const { byMathjs, byMlMatrix } = await import('./others')
const others = { mathjs: byMathjs(arm), 'ml-matrix': byMlMatrix(arm) }
for (const { key, asked, kdl: question, target } of QUESTIONS) {
  const found = sevens.get(key)!
  const contestants = Object.entries(others).flatMap(([name, answers]) => {
    const ask = answers[key]
    return ask === undefined ? [] : [contestant(name, inThisProcess(ask, configurations))]
  })
  for (const [name, time] of await race(contestants)) found.set(name, time)
  const time = found.get('ours')!
  const ratio = found.has('kdl') ? time / found.get('kdl')! : null
  lines.push([asked, '7', ns(time), ns(time / 7), ns(found.get('kdl')), ns(found.get('mathjs')), ns(found.get('ml-matrix')), ratio?.toFixed(3) ?? '–', target === null ? '' : `<= ${target}`])
  if (target !== null) rows.push({ asked, beside: KDL_NAMES[question], ratio, target })
  if (key === 'fk-jacobian') {
    const lean = hasKdl ? time / found.get('lean')! : null
    lines.push([`${asked}, beside lean Eigen -O3`, '7', ns(time), ns(time / 7), ns(found.get('lean')), '', '', lean?.toFixed(3) ?? '–', '<= 1.25'])
    rows.push({ asked, beside: 'lean fixed-size Eigen, -O3', ratio: lean, target: 1.25 })
  }
}

const [short, time] = [longs.get('ten')!, longs.get('hundred')!]
const ratio = hasKdl ? time / longs.get('kdl')! : null
lines.push(['FK + Jacobian', '100', ns(time), ns(time / 100), ns(longs.get('kdl')), '', '', ratio?.toFixed(3) ?? '–', '<= 0.06'])
rows.push({ asked: 'FK + Jacobian at 100 joints', beside: 'KDL FK + JntToJac', ratio, target: 0.06 })
const growth = time / 100 / (short / 10)
lines.push(['FK + Jacobian per joint, 100 beside 10', '10', ns(short), ns(short / 10), '', '', '', growth.toFixed(3), '<= 1.15'])
rows.push({ asked: 'FK + Jacobian per joint, 100 joints against 10', beside: 'itself', ratio: growth, target: 1.15 })

const widths = lines[0]!.map((_cell, i) => Math.max(...lines.map((line) => line[i]!.length)))
for (const line of lines) process.stdout.write(`${line.map((cell, i) => (i === 0 ? cell.padEnd(widths[i]!) : cell.padStart(widths[i]!))).join('  ')}\n`)
process.stdout.write(`\nNanoseconds a call, medians of ${rounds} turns of about a millisecond each, in turns within one run\n`)
if (process.argv.includes('--json')) writeFileSync(argument('--json')!, `${JSON.stringify(rows, null, 2)}\n`)
