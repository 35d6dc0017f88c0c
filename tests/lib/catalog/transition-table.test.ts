import { describe, expect, it } from 'vitest'
import { findTransition, skipsReview, TRANSITIONS } from '@/lib/catalog/transition-table'
import { Status } from '@/lib/contract/scalars'

const STATUSES = Status.options

describe('the table of changes of status', () => {
  it('has at most one row for each change', () => {
    for (const from of STATUSES) for (const to of STATUSES) expect(TRANSITIONS.filter((row) => row.to === to && row.from.includes(from)).length, `${from} to ${to}`).toBeLessThanOrEqual(1)
  })

  it('leads nowhere from withdrawn, and nobody to superseded by hand', () => {
    for (const status of STATUSES) {
      expect(findTransition('withdrawn', status)).toBeUndefined()
      expect(findTransition(status, 'superseded')).toBeUndefined()
      expect(findTransition(status, status)).toBeUndefined()
    }
  })

  it('lets everything be withdrawn, by an approver once it was released', () => {
    const roles = (['draft', 'in-review', 'released', 'superseded'] as const).map((from) => findTransition(from, 'withdrawn')?.role)
    expect(roles).toEqual(['engineer', 'engineer', 'approver', 'approver'])
  })

  it('knows the one change that passes the review by', () => {
    const skipping = STATUSES.flatMap((from) => STATUSES.filter((to) => skipsReview(from, to)).map((to) => `${from} to ${to}`))
    expect(skipping).toEqual(['draft to released'])
  })
})
