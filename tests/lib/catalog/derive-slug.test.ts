import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { commonStart, deriveSlug, freeSlug } from '@/lib/catalog/derive-slug'
import { RESERVED_SLUGS, Slug } from '@/lib/contract/scalars'

describe('deriveSlug', () => {
  it.each([
    ['Skerry 7', 'skerry-7'],
    ['  --Skerry__7!!  ', 'skerry-7'],
    ['Ångström Ébène', 'angstrom-ebene'],
    ['Größe Øst Łódź', 'grosse-ost-lodz'],
    ['ﬁne ²', 'fine-2'],
    ['机器人', 'model'],
    ['', 'model'],
    ['Released', 'model-released'],
    ['x'.repeat(70), 'x'.repeat(64)],
    [`${'x'.repeat(63)} y`, 'x'.repeat(63)],
  ])('makes of "%s" the slug %s', (name, slug) => expect(deriveSlug(name)).toBe(slug))

  it('makes a valid slug of any name, and so does numbering it', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 120, unit: 'grapheme' }), fc.integer({ min: 0, max: 120 }), (name, count) => {
        const stem = deriveSlug(name)
        const taken: string[] = []
        for (let i = 0; i < count; i++) taken.push(freeSlug(stem, taken))
        const next = freeSlug(stem, taken)
        expect(Slug.safeParse(stem).success).toBe(true)
        expect(Slug.safeParse(next).success).toBe(true)
        expect(taken).not.toContain(next)
        for (const slug of [...taken, next]) expect(slug.startsWith(commonStart(stem))).toBe(true)
      }),
      { seed: 7, numRuns: 200 },
    )
  })
})

describe('freeSlug', () => {
  it('takes the lowest number that is free', () => {
    expect(freeSlug('arm', [])).toBe('arm')
    expect(freeSlug('arm', ['arm'])).toBe('arm-2')
    expect(freeSlug('arm', ['arm', 'arm-2', 'arm-4'])).toBe('arm-3')
    expect(freeSlug('arm', ['arm-2'])).toBe('arm')
  })

  it('makes room for the number in the longest slugs', () => {
    const stem = 'x'.repeat(64)
    expect(freeSlug(stem, [stem])).toBe(`${'x'.repeat(62)}-2`)
    expect(freeSlug(`${'x'.repeat(61)}-yz`, [`${'x'.repeat(61)}-yz`])).toBe(`${'x'.repeat(61)}-2`)
  })
})

describe('Slug', () => {
  it.each(RESERVED_SLUGS)('refuses the reserved word %s', (word) => expect(Slug.safeParse(word).success).toBe(false))
})
