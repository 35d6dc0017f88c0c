import { describe, expect, it } from 'vitest'
import { RULES, type RuleId } from '@/lib/urdf/rules'
import { ARCHIVE_RULES } from '@/lib/urdf/rules-of-archive'
import { parse, rulesOf } from './urdf-text'

/** Their examples are shortened with an ellipsis; other tests trigger them at full length. Those of archives are directories:
 *  tests/lib/archive triggers each. */
const SHORTENED: readonly RuleId[] = ['too-large', 'reading-given-up', 'too-deep', 'too-many-elements', 'too-many-attributes', 'name-too-long']
const ids = Object.keys(RULES) as RuleId[]

describe('RULES', () => {
  it.each(ids.filter((id) => !SHORTENED.includes(id) && !(id in ARCHIVE_RULES)))('shows for %s an example that triggers exactly this rule, and one that triggers none', (id) => {
    expect(rulesOf(parse(RULES[id].before).findings)).toEqual([id])
    expect(parse(RULES[id].after).findings).toEqual([])
  })

  it.each(ids)('words %s in whole sentences and with a slug fit for an address', (id) => {
    const rule = RULES[id]
    expect(id).toMatch(/^[a-z]+(-[a-z]+)*$/)
    for (const text of [rule.meaning, rule.effect, rule.remedy]) expect(text).toMatch(/^[A-Z<].*\.$/s)
    expect(rule.title).toMatch(/^[A-Z].*[^.]$/)
  })

  it('has the rules of archive, text and model as errors, and what changes no number as notes', () => {
    const errors = ids.filter((id) => RULES[id].severity === 'error')
    expect(errors).toEqual([
      'archive-malformed', 'archive-headers-differ', 'archive-path-unsafe', 'archive-link', 'archive-encrypted', 'archive-packing-unknown',
      'archive-too-many-entries', 'archive-too-large', 'archive-ratio', 'archive-nested', 'archive-name-twice', 'archive-without-urdf',
      'archive-several-urdfs', 'archive-entry-missing',
      'not-xml', 'xml-malformed', 'encoding-unsupported', 'doctype-refused', 'too-large', 'reading-given-up', 'too-deep', 'too-many-elements', 'too-many-attributes',
      'name-too-long', 'text-after-robot', 'not-urdf', 'no-links', 'duplicate-link', 'duplicate-joint', 'name-missing',
      'joint-incomplete', 'joint-type-unknown', 'link-undeclared', 'several-roots', 'two-parents', 'cycle', 'axis-zero',
      'number-malformed', 'limit-missing', 'limit-inverted', 'mimic-missing', 'mimic-self', 'mimic-cycle', 'orientation-twice',
      'xacro-unexpanded',
    ])
    expect(ids.filter((id) => RULES[id].severity === 'note')).toEqual([
      'archive-file-unused',
      'limit-rounded-up', 'range-beyond-turn', 'inertia-implausible', 'visual-only-element', 'unknown-element', 'name-unusual',
    ])
  })
})
