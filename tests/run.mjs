import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { buildIfStale } from '../samples/demo/build.mjs'
import { installIfStale } from '../samples/demo/install.mjs'
import { requireNode } from '../samples/demo/require-node.mjs'
import { startPostgres } from './db/support/postgres.mjs'
import { countCheck, countPlaywright, countVitest } from './runner/counts.mjs'
import { endStages, runStage } from './runner/stage.mjs'
import { installSystemPackages } from './runner/system-packages.mjs'

// `npm test`: installs what the tests need, then runs all of them, the quick ones first. The last line it prints is the sum.

const root = fileURLToPath(new URL('..', import.meta.url))
const bin = (path) => join(root, 'node_modules', path)
const scratch = mkdtempSync(join(tmpdir(), 'elbowroom-run-'))
// Open to pass through, because PostgreSQL's own user has its folder in it.
chmodSync(scratch, 0o711)
const environment = { ...process.env, TMPDIR: scratch, NEXT_TELEMETRY_DISABLED: '1', NO_COLOR: '1' }
for (const name of ['DATABASE_URL', 'ELBOWROOM_DATA_DIR', 'ELBOWROOM_URL', 'ELBOWROOM_SECRET', 'DEMO_PASSWORD', 'PORT', 'HOST']) delete environment[name]

const results = []

function record(name, counts, startedAt) {
  results.push({ name, ...counts, seconds: Math.round((Date.now() - startedAt) / 1000) })
}

async function stage(name, command, args, count, { env = {}, minutes = 10, isQuiet = false } = {}) {
  process.stdout.write(`\n=== ${name}\n`)
  const startedAt = Date.now()
  const exitCode = await runStage(command, args, { cwd: root, env: { ...environment, ...env }, minutes, isQuiet })
  record(name, count(exitCode), startedAt)
}

const check = (name, path, args, more) => stage(name, process.execPath, [bin(path), ...args], countCheck, more)

function vitest(project, { name = project, ...more } = {}) {
  const report = join(scratch, `${name.replaceAll(' ', '-')}.json`)
  const args = [bin('vitest/vitest.mjs'), 'run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  return stage(name, process.execPath, args, (code) => countVitest(report, code), more)
}

/** Something that must succeed before the tests that rest on it; its failure counts as theirs. */
async function prepare(name, act) {
  const startedAt = Date.now()
  process.stdout.write(`\n=== ${name}\n`)
  try {
    return (await act()) ?? true
  } catch (error) {
    process.stdout.write(`${error.message}\n`)
    record(name, { passed: 0, failed: 1 }, startedAt)
    return undefined
  }
}

async function onPostgres() {
  const postgres = await prepare('PostgreSQL', startPostgres)
  if (postgres === undefined) return
  stopPostgres = postgres.stop
  await vitest('api', { name: 'api on PostgreSQL', env: { DATABASE_URL: postgres.createDatabase('elbowroom') }, minutes: 12 })
  await postgres.stop()
  stopPostgres = undefined
}

let stopPostgres
async function end() {
  endStages()
  await stopPostgres?.()
  rmSync(scratch, { recursive: true, force: true })
}
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.once(signal, () => {
    process.stdout.write(`\nEnded by ${signal}.\n`)
    void end().finally(() => process.exit(1))
  })
}

async function runAll() {
  await installSystemPackages()
  await installIfStale(root)
  await stage('packages agree (npm ls)', 'npm', ['ls', '--all'], countCheck, { isQuiet: true })
  await check('route types', 'next/dist/bin/next', ['typegen'])
  await check('types', 'typescript/bin/tsc', ['--noEmit', '-p', '.'])
  await check('lint', 'eslint/bin/eslint.js', ['--max-warnings=0', '.'])
  await check('nothing unused (knip)', 'knip/bin/knip.js', [])
  await vitest('unit')
  await vitest('reference')
  if ((await prepare('build', () => buildIfStale(root))) === undefined) return
  await vitest('api', { name: 'api on the embedded database', minutes: 12 })
  await onPostgres()
  await vitest('service', { minutes: 12 })
  const report = join(scratch, 'browser.json')
  await stage('browser', process.execPath, [bin('@playwright/test/cli.js'), 'test'], (code) => countPlaywright(report, code), {
    env: { PLAYWRIGHT_JSON_OUTPUT_FILE: report },
    minutes: 20,
  })
}

try {
  requireNode(root)
  await runAll()
} catch (error) {
  process.stdout.write(`\n${error.message}\n`)
  results.push({ name: 'preparation', passed: 0, failed: 1, seconds: 0 })
}
await end()

process.stdout.write('\n')
for (const { name, passed, failed, seconds } of results) {
  process.stdout.write(`${name.padEnd(30)} ${String(passed).padStart(6)} passed ${String(failed).padStart(5)} failed ${String(seconds).padStart(5)} s\n`)
}
const sum = (field) => results.reduce((total, result) => total + result[field], 0)
process.stdout.write(`${sum('passed')} passed, ${sum('failed')} failed\n`)
process.exitCode = sum('failed') === 0 ? 0 : 1
