import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'

const ROOT = path.resolve(import.meta.dirname, '../..')

const sources = ['app', 'components', 'lib', 'db', 'openapi'].flatMap((folder) =>
  readdirSync(path.join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .map((file) => path.join(folder, file))
    .filter((file) => /\.tsx?$/.test(file)),
)

/** Files outside `owner` whose code, comments aside, contains `pattern`. */
function trespassers(pattern: RegExp, owner: RegExp): string[] {
  const withoutComments = (text: string) => text.replace(/\/\*[\s\S]*?\*\/|(^|\s)\/\/.*$/gm, '')
  return sources.filter((file) => !owner.test(file) && pattern.test(withoutComments(readFileSync(path.join(ROOT, file), 'utf8'))))
}

describe('things with one owner', () => {
  it.each([
    ['the environment', 'lib/env.ts', /process\.env\b/, /^lib\/env\.ts$/],
    ['the console', 'lib/log.ts', /\bconsole\./, /^lib\/log\.ts$/],
    ['the factor between degrees and radians', 'lib/units.ts', /Math\.PI\s*\/\s*180|180\s*\/\s*Math\.PI/, /^lib\/units\.ts$/],
    ['SQL text', 'db', /\bsql`/, /^db\//],
  ])('%s is known to %s alone', (_what, _owner, pattern, owner) => {
    expect(trespassers(pattern, owner)).toEqual([])
  })

  it('are looked for in the whole of the source', () => {
    expect(sources.length).toBeGreaterThan(100)
  })
})
