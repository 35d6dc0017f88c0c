import { describe, expect, it } from 'vitest'
import { dayOf, expiryInstant } from '@/components/keys/expiry-choice'
import { KeyEditFields, NewKeyFields } from '@/components/keys/key-fields'

const NOW = Date.UTC(2026, 11, 1, 12)

describe('expiryInstant', () => {
  it('counts a span from now', () => expect(expiryInstant('30', '', NOW)).toBe('2026-12-31T12:00:00.000Z'))
  it('is null for never', () => expect(expiryInstant('never', '2027-01-01', NOW)).toBeNull())
  it('takes a date as the end of that day where the reader is', () => {
    const at = new Date(expiryInstant('date', '2027-03-05', NOW)!)
    expect(dayOf(at)).toBe('2027-03-05')
    expect(at.getHours()).toBe(23)
  })
})

describe('the fields of a key', () => {
  const fields = { label: 'Cell 4', scopes: ['compute'], preset: 'date', date: '2099-01-01' }

  it('are accepted when complete', () => expect(NewKeyFields.safeParse(fields).success).toBe(true))

  it.each([
    [{ label: '  ' }, 'label'],
    [{ scopes: [] }, 'scopes'],
    [{ date: '' }, 'date'],
    [{ date: '2020-01-01' }, 'date'],
  ])('refuse %j at its field', (change, field) => {
    const { error } = NewKeyFields.safeParse({ ...fields, ...change })
    expect(error?.issues.map((issue) => issue.path[0])).toEqual([field])
  })

  it('need no date where none is chosen', () => {
    expect(KeyEditFields.safeParse({ label: 'x', preset: 'never', date: '' }).success).toBe(true)
  })
})
