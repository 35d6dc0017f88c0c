import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { daysUntil } from '@/components/desk/days-until'
import { DeskReviews } from '@/components/desk/desk-reviews'
import { waitingTime } from '@/components/desk/waiting-time'
import { waitsFor } from '@/components/desk/waits-for'
import { whatChanged } from '@/components/desk/what-changed'

const NOW = Date.UTC(2026, 11, 6, 12)
const inForce = { revision: 1, independent: 6, sameNumbers: false }
const review = {
  model: 'fulmar-6', name: 'Fulmar 6', revision: 2, fingerprint: '0123456789abcdef'.repeat(4), independent: 7, submittedBy: 'Ines', at: '2026-12-01T10:00:00.000Z',
  own: [] as ('imported' | 'submitted')[], releasers: ['Tomas'], inForce,
}
const desk = (own: ('imported' | 'submitted')[], mayRelease: boolean, fourEyes: boolean, total = 1) =>
  renderToStaticMarkup(<DeskReviews team="t" queue={{ reviews: [{ ...review, own }], total }} mayRelease={mayRelease} fourEyes={fourEyes} now={NOW} />)
const textOf = (html: string) => html.replace(/<[^>]*>/g, '')

describe('DeskReviews', () => {
  it('makes each line an action that leads to the sheet', () => {
    const html = desk([], true, true)
    expect(html).toContain('href="/teams/t/models/fulmar-6/revisions/2"')
    expect(textOf(html)).toContain('Decide on Fulmar 6, revision 2')
  })

  it('says how long it waits and for whom, what it changes, and leads to the comparison with what is in force', () => {
    const html = desk([], true, true)
    expect(textOf(html)).toContain('waits for 5 days')
    expect(textOf(html)).toContain('waits for Tomas.')
    expect(textOf(html)).toContain('It computes other numbers than revision 1, which is in force, and has 7 independent joints instead of 6.')
    expect(textOf(html)).toContain('0123 4567 89ab cdef')
    expect(html).toContain('href="/teams/t/models/fulmar-6/comparison?from=1&amp;to=2"')
  })

  it('says why a revision of one’s own is for somebody else to release', () => {
    expect(desk(['imported'], true, true)).toContain('You imported it, so under four eyes somebody else releases it.')
    expect(desk(['imported', 'submitted'], true, true)).toContain('You imported and submitted it')
    expect(desk(['submitted'], true, true)).not.toContain('Decide on')
  })

  it('lets one decide on one’s own where the team does not ask for four eyes', () => expect(desk(['imported'], true, false)).toContain('Decide on'))

  it('offers no decision to those who cannot release', () => expect(desk([], false, true)).toContain('Look at'))

  it('says how many wait when it shows fewer, and where they all are', () => {
    const html = desk([], true, true, 45)
    expect(textOf(html)).toContain('45')
    expect(html).toContain('href="/teams/t/models?status=in-review"')
  })
})

describe('whatChanged', () => {
  it('says what a revision in review would change', () => {
    expect(whatChanged({ independent: 6 })).toBe('Nothing is in force yet: it would be the first.')
    expect(whatChanged({ independent: 6, inForce })).toBe('It computes other numbers than revision 1, which is in force.')
    expect(whatChanged({ independent: 1, inForce })).toContain('has 1 independent joint instead of 6')
    expect(whatChanged({ independent: 6, inForce: { ...inForce, sameNumbers: true } })).toContain('the same numbers')
  })
})

describe('waitsFor', () => {
  it.each([
    [['Tomas'], 'Tomas'],
    [['Mira', 'Tomas'], 'Mira or Tomas'],
    [['A', 'B', 'C'], 'A, B or C'],
    [['A', 'B', 'C', 'D', 'E'], 'A, B, C or 2 more'],
  ])('names %j as %j', (names, words) => expect(waitsFor(names)).toBe(words))

  it('says that nobody is left', () => expect(waitsFor([])).toMatch(/^nobody: /))
})

describe('waitingTime', () => {
  it.each([
    [-5000, 'less than an hour'],
    [3_599_000, 'less than an hour'],
    [3_600_000, '1 hour'],
    [47.5 * 3_600_000, '47 hours'],
    [48 * 3_600_000, '2 days'],
  ])('says %d ms as %j', (ms, words) => expect(waitingTime(new Date(NOW - ms).toISOString(), NOW)).toBe(words))
})

describe('daysUntil', () => {
  const now = Date.UTC(2026, 11, 1)
  it.each([
    [3_600_000, 'within a day'],
    [86_400_000, 'in 1 day'],
    [12.5 * 86_400_000, 'in 12 days'],
  ])('says %d ms as %j', (ms, words) => expect(daysUntil(new Date(now + ms).toISOString(), now)).toBe(words))
})
