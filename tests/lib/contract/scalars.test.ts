import { describe, expect, it } from 'vitest'
import { Instant, Name, Note, wholeNumber } from '@/lib/contract/scalars'

const takes = (schema: { safeParse(value: unknown): { success: boolean } }) => (value: unknown) => schema.safeParse(value).success

describe('a whole number in a query', () => {
  const limit = wholeNumber(1, 200)
  it.each(['1', '200', '007'])('is read from "%s"', (text) => expect(limit.parse(text)).toBe(Number(text)))
  it.each(['', ' ', '0', '201', '-1', '+1', '1.0', '1e2', '0x1', ' 5', '5 ', '٣', '9999999999'])('is not read from "%s"', (text) => {
    const parsed = limit.safeParse(text)
    expect(parsed.error?.issues.map(({ message }) => message)).toEqual(['a whole number from 1 to 200'])
  })
})

describe('text that people read', () => {
  it('is trimmed, not empty, and free of control characters', () => {
    expect(Name.parse('  Skerry 7 ')).toBe('Skerry 7')
    expect(['', '   ', 'a\tb', 'a\nb', 'a\0', 'a\x7f', 'a\u0085', '\ud800', 'x'.repeat(121)].map(takes(Name))).toEqual(new Array(9).fill(false))
    expect(['Ø', '机器人', 'a – b', '🦾', 'x'.repeat(120)].map(takes(Name))).toEqual(new Array(5).fill(true))
  })

  it('may have lines and tabs in a note', () => {
    expect(['one\ntwo\r\n\tthree', ''].map(takes(Note))).toEqual([true, true])
    expect(['\x07', 'a\0b', '\udc00', 'x'.repeat(2001)].map(takes(Note))).toEqual(new Array(4).fill(false))
  })
})

describe('a time', () => {
  it('is UTC and exists', () => {
    expect(['2026-12-01T14:05:00Z', '2026-12-01T14:05:00.123Z', '2028-02-29T00:00:00Z'].map(takes(Instant))).toEqual([true, true, true])
    expect(['2026-12-01', '2026-12-01T14:05:00', '2026-12-01T14:05:00+01:00', '2027-02-29T00:00:00Z', '2026-12-01T24:00:00Z', 'now', 0].map(takes(Instant))).toEqual(new Array(7).fill(false))
  })
})
