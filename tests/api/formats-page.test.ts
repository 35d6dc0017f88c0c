import { spawnSync } from 'node:child_process'
import { readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { afterAll, describe, expect, inject, it } from 'vitest'
import { FORMAT_EXAMPLES } from '@/app/docs/formats/examples'
import { resultOf } from './kinematics/ask'
import { bytesOf, numbersOf, readCsv } from './kinematics/records'
import { temporaryFolder } from './support/server'

const Q = [0, -0.6, 0, 1.2, 0, 0.8, 0]
const TWIST = [0.05, 0, 0, 0, 0, 0]
const revision = () => `${inject('served').url}/api/v1/teams/tarnholm/models/skerry-7/revisions/1`

function run(command: string, args: readonly string[], cwd: string): string {
  const env = { ...process.env, ELBOWROOM_KEY: inject('served').tarnholmKey }
  const { status, stdout, stderr } = spawnSync(command, args, { cwd, env, encoding: 'utf8' })
  expect({ status, stderr }).toEqual({ status: 0, stderr: '' })
  return stdout
}

describe('the page on formats', () => {
  const folder = temporaryFolder()
  afterAll(() => rmSync(folder, { recursive: true }))

  it('is there, and shows the examples that are executed here', async () => {
    const page = await (await fetch(`${inject('served').url}/docs/formats`)).text()
    for (const line of ['--data-binary @records.bin', 'Accept: text/csv', 'import urllib.request']) expect(page).toContain(line)
  })

  it('has a request for CSV that is answered with a pose', async () => {
    const [header, row] = readCsv(run('bash', ['-euc', FORMAT_EXAMPLES.csv(revision())], folder))
    const { pose } = await resultOf('forward-kinematics', 'skerry-7', { configurations: [Q] })
    expect(header!.slice(0, 3)).toEqual(['pose.position.0', 'pose.position.1', 'pose.position.2'])
    expect(row!.slice(0, 3).map(Number)).toEqual(pose!.position)
    expect([header!.at(-1), row!.at(-1)]).toEqual(['withinLimits', 'true'])
  })

  it('has a request with binary records that is answered with rates', async () => {
    writeFileSync(path.join(folder, 'records.bin'), bytesOf([...Q, ...TWIST]))
    run('bash', ['-euc', FORMAT_EXAMPLES.binary(revision())], folder)
    expect(readFileSync(path.join(folder, 'fields.txt'), 'utf8')).toMatch(/^record-layout: rates;length=7, scale\r$/im)
    const { rates, scale } = await resultOf('joint-rates', 'skerry-7', { configurations: [Q], twists: [TWIST] })
    expect(numbersOf(new Uint8Array(readFileSync(path.join(folder, 'rates.bin'))).buffer)).toEqual([...rates!, scale])
  })

  it('has a Python program that prints the rates of each record', async () => {
    const { rates, scale } = await resultOf('joint-rates', 'skerry-7', { configurations: [Q], twists: [TWIST] })
    const printed = run('python3', ['-c', FORMAT_EXAMPLES.python(revision())], folder)
    const lines = printed.trim().split('\n').map((line) => /^rates (\[.*\]) scale (\S+)$/.exec(line)!)
    expect(lines).toHaveLength(2)
    for (const [, list, printedScale] of lines) expect([JSON.parse(list!), Number(printedScale)]).toEqual([rates, scale])
  })
})
