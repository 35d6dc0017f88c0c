import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import type { RuleId } from '@/lib/urdf/rules'
import { compileChain } from '@/lib/urdf/compile-chain'
import { listChains } from '@/lib/urdf/default-chain'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { parse, rulesOf } from './urdf-text'

const LARGE = 8 * 1024 * 1024
const fill = (piece: string, length = LARGE): string => piece.repeat(Math.floor(length / piece.length))
const inJoint = (origin: string): string =>
  `<robot name="r"><link name="a"/><link name="b"/><joint name="j" type="fixed"><parent link="a"/><child link="b"/><origin ${origin}/></joint></robot>`

/** Each would take minutes if any part of reading it were quadratic; the time limit of the test runner is the measure. */
const HOSTILE: readonly (readonly [string, RuleId, () => string])[] = [
  ['1 MB of nesting', 'too-deep', () => fill('<a>', 1e6)],
  ['entities that multiply', 'doctype-refused', () => `<!DOCTYPE r [<!ENTITY a "${fill('x', 1e4)}"><!ENTITY b "${fill('&a;', 1e4)}">]><robot name="&b;"/>`],
  ['an external entity', 'doctype-refused', () => '<!DOCTYPE r [<!ENTITY a SYSTEM "file:///etc/passwd">]><robot name="&a;"/>'],
  ['100 000 attributes', 'too-many-attributes', () => `<robot ${Array.from({ length: 100_000 }, (_, i) => `a${i}=""`).join(' ')}/>`],
  ['8 MiB of blanks between elements', 'no-links', () => `<robot name="r">${fill(' ')}</robot>`],
  ['8 MiB of blanks inside a tag', 'no-links', () => `<robot${fill(' ')}/>`],
  ['8 MiB of blanks inside the XML declaration', 'xml-malformed', () => `<?xml ${fill(' ')}?><robot/>`],
  ['8 MiB of lines', 'no-links', () => `<robot name="r">${fill('\n')}</robot>`],
  ['8 MiB of blanks in a vector', 'number-malformed', () => inJoint(`xyz="${fill(' ')}"`)],
  ['8 MiB of digits in a vector', 'number-malformed', () => inJoint(`xyz="${fill('1')}"`)],
  ['8 MiB of numbers in a vector', 'number-malformed', () => inJoint(`xyz="${fill('1 ')}"`)],
  ['8 MiB of comments', 'no-links', () => `<robot name="r">${fill('<!---->')}</robot>`],
  ['8 MiB of processing instructions', 'no-links', () => `<robot name="r">${fill("<?a '?>")}</robot>`],
  ['8 MiB of references', 'no-links', () => `<robot name="r">${fill('&amp;')}</robot>`],
  ['8 MiB of brackets', 'no-links', () => `<robot name="r">${fill(']]')}</robot>`],
  ['8 MiB of opening angles', 'xml-malformed', () => fill('<')],
  ['8 MiB of opening quotes', 'xml-malformed', () => fill('<a b="')],
  ['8 MiB behind a quote that is not closed', 'xml-malformed', () => `<robot name="${fill('x')}`],
  ['8 MiB of comments before a robot that does not come', 'xml-malformed', () => fill('<!-- -->')],
  ['50 000 links that nothing joins', 'several-roots', () => `<robot>${Array.from({ length: 50_000 }, (_, i) => `<link name="${i}"/>`).join('')}</robot>`],
  ['50 000 links of one name', 'duplicate-link', () => `<robot>${fill('<link name="a"/>', 16 * 50_000)}</robot>`],
]

describe('parseUrdf', () => {
  it.each(HOSTILE)('survives %s', (_what, rule, text) => {
    const { description, findings } = parse(text())
    expect(description).toBeNull()
    expect(new Set(rulesOf(findings))).toEqual(new Set([rule]))
  })

  it('survives 8 MiB of garbage', () => {
    const bytes = Uint8Array.from({ length: LARGE }, (_, i) => (i * 7919 + ((i * i) >> 3)) % 256)
    expect(rulesOf(parseUrdf(bytes).findings)).toEqual(['encoding-unsupported'])
  })

  it('answers every one of 2 000 seeded mutations of real files without throwing, with places that exist', () => {
    const random = mulberry32(20_240_229)
    const sources = ['skerry-7', 'gannet-4', 'flawed-error', 'flawed-warning'].map((name) => readFileSync(`samples/${name}.urdf`))
    let accepted = 0
    for (let i = 0; i < 2000; i++) {
      const bytes = mutated(sources[i % sources.length]!, random)
      const { description, findings } = parseUrdf(bytes)
      expect(description === null).toBe(findings.some(({ severity }) => severity === 'error'))
      for (const { line, column, message } of findings) expect(line >= 1 && column >= 1 && message.length > 0).toBe(true)
      if (!description) continue
      accepted++
      expect(fingerprint(description)).toMatch(/^[0-9a-f]{64}$/)
      expect(listChains(description).filter((chain) => chain.default)).toHaveLength(1)
      const numbers = compileChain(description).constants.flat()
      expect(numbers.every(Number.isFinite)).toBe(true)
    }
    expect(accepted).toBeGreaterThan(120)
  })
})

/** A small seeded generator of numbers in [0, 1): mulberry32, public domain, from memory. */
function mulberry32(seed: number): () => number {
  let state = seed
  return () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state)
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

const TOKENS = ['<', '>', '"', '&', '&#0;', '<!--', '-->', '<![CDATA[', ']]>', '<?x ', '/>', '</link>', '<link name="base_link"/>', '0', '1e999', ',', '${', 'nan', '\0', '\uD83E', 'é', '\r']

/** One to three bytes, tokens or pieces of a file changed, dropped, doubled or moved. */
function mutated(source: Uint8Array, random: () => number): Uint8Array {
  let bytes = [...source]
  const upTo = (limit: number): number => Math.floor(random() * limit)
  for (let edits = 1 + upTo(3); edits > 0; edits--) {
    const at = upTo(bytes.length)
    const length = upTo(random() < 0.5 ? 4 : 200)
    const piece = bytes.slice(at, at + length)
    const how = upTo(5)
    if (how === 0) bytes[at] = upTo(256)
    else if (how === 1) bytes.splice(at, 0, ...Buffer.from(TOKENS[upTo(TOKENS.length)]!))
    else if (how === 2) bytes.splice(at, length)
    else if (how === 3) bytes.splice(at, 0, ...piece)
    else bytes = [...bytes.slice(0, at), ...bytes.slice(at + length), ...piece]
  }
  return Uint8Array.from(bytes)
}
