import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { InForceNotice } from '@/components/sheet/in-force-notice'
import type { Status } from '@/lib/contract/scalars'

const notice = (status: Status, released: number | undefined) =>
  renderToStaticMarkup(<InForceNotice status={status} revision={1} released={released} href={(revision) => `/r/${revision}`} />)

describe('InForceNotice', () => {
  it('is absent on the revision in force', () => expect(notice('released', 1)).toBe(''))

  it('leads from a superseded or withdrawn revision to the one in force', () => {
    expect(notice('superseded', 3)).toContain('href="/r/3"')
    expect(notice('withdrawn', 3)).toMatch(/must not be used.*href="\/r\/3"/)
  })

  it('says so where none is in force', () => expect(notice('withdrawn', undefined)).toContain('No revision of this model is in force'))
})
