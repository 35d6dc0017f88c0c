import { describe, expect, it } from 'vitest'
import type { RuleId } from '@/lib/urdf/rules'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { parse, rulesOf } from './urdf-text'

/** Nearly all that is read, with room for what stands around the filling. */
const LARGE = 8 * 1024 * 1024 - 1024
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
  ['8 MiB of blanks inside a tag', 'no-links', () => `<robot name="r"${fill(' ')}/>`],
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
  ['50 000 links that nothing joins', 'several-roots', () => `<robot name="r">${Array.from({ length: 50_000 }, (_, i) => `<link name="${i}"/>`).join('')}</robot>`],
  ['50 000 links of one name', 'duplicate-link', () => `<robot name="r">${fill('<link name="a"/>', 16 * 50_000)}</robot>`],
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
})
