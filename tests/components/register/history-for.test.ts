import { describe, expect, it } from 'vitest'
import { historyFor } from '@/components/register/history-for'

describe('historyFor', () => {
  it.each([
    ['a filter that was not there', { query: 'a' }, '', 'push'],
    ['typing on', { query: 'ab' }, 'query=a', 'replace'],
    ['typing on beside another filter', { joints: 17 }, 'joints=1&status=draft', 'replace'],
    ['another status', { status: 'draft' }, 'status=released', 'push'],
    ['taking a filter away', { query: null }, 'query=a', 'push'],
    ['taking all away', { query: null, status: null, joints: null }, 'query=a&joints=3', 'push'],
  ])('answers what goes back one step at a time, for %s', (_what, change, address, history) => {
    expect(historyFor(change, new URLSearchParams(address))).toBe(history)
  })
})
