import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { createRequire } from 'node:module'
import path from 'node:path'
import { describe, expect, it } from 'vitest'

const ROOT = path.resolve(import.meta.dirname, '../..')
const CONFIG = path.join(ROOT, '.dependency-cruiser.cjs')
const PLACES = ['app', 'components', 'lib', 'db', 'openapi', 'samples', 'instrumentation.ts', 'proxy.ts'].filter((place) => existsSync(path.join(ROOT, place)))

interface Report {
  readonly summary: {
    readonly totalCruised: number
    readonly violations: readonly { readonly rule: { readonly name: string }; readonly from: string; readonly to: string }[]
  }
}

const law = createRequire(import.meta.url)(CONFIG) as { readonly forbidden: readonly { readonly name: string }[] }

function cruise(): Report {
  const program = path.join(ROOT, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs')
  const { stdout, stderr } = spawnSync(process.execPath, [program, '--config', CONFIG, '--output-type', 'json', ...PLACES], {
    cwd: ROOT,
    encoding: 'utf8',
    maxBuffer: 256 * 1024 * 1024,
  })
  if (!stdout.startsWith('{')) throw new Error(`dependency-cruiser gave no report:\n${stderr}`)
  return JSON.parse(stdout) as Report
}

describe('the layer law', () => {
  const { summary } = cruise()

  it('is checked over the whole of the source', () => {
    expect(summary.totalCruised).toBeGreaterThan(100)
  })

  it.each(law.forbidden.map(({ name }) => name))('%s', (name) => {
    expect(summary.violations.filter(({ rule }) => rule.name === name).map(({ from, to }) => `${from} -> ${to}`)).toEqual([])
  })
})
