import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { daysUntil } from '@/components/desk/days-until'
import { DeskReviews } from '@/components/desk/desk-reviews'

const review = { model: 'fulmar-6', name: 'Fulmar 6', revision: 2, submittedBy: 'Ines', at: '2026-12-01T10:00:00.000Z', own: false }
const desk = (own: boolean, mayRelease: boolean, fourEyes: boolean) =>
  renderToStaticMarkup(<DeskReviews team="t" reviews={[{ ...review, own }]} mayRelease={mayRelease} fourEyes={fourEyes} />)

describe('DeskReviews', () => {
  it('makes each line an action that leads to the sheet', () => {
    const html = desk(false, true, true)
    expect(html).toContain('href="/teams/t/models/fulmar-6/revisions/2"')
    expect(html).toContain('Decide on Fulmar 6, revision 2')
  })

  it('says why a revision of one’s own is for somebody else to release', () => {
    expect(desk(true, true, true)).toContain('somebody else releases it')
    expect(desk(true, true, true)).not.toContain('Decide on')
  })

  it('lets one decide on one’s own where the team does not ask for four eyes', () => expect(desk(true, true, false)).toContain('Decide on'))

  it('offers no decision to those who cannot release', () => expect(desk(false, false, true)).toContain('Look at'))
})

describe('daysUntil', () => {
  const now = Date.UTC(2026, 11, 1)
  it.each([
    [3_600_000, 'within a day'],
    [86_400_000, 'in 1 day'],
    [12.5 * 86_400_000, 'in 12 days'],
  ])('says %d ms as %j', (ms, words) => expect(daysUntil(new Date(now + ms).toISOString(), now)).toBe(words))
})
