import { describe, expect, it } from 'vitest'
import { formatNumber, formatSignificant } from '@/components/ui/format-number'

describe('formatNumber', () => {
  it.each([
    [1.5, 2, '1.50'],
    [-35.2, 2, '−35.20'],
    [0, 3, '0.000'],
    [-0, 3, '0.000'],
    [-0.0004, 3, '0.000'],
    [null, 1, '–'],
    [undefined, 1, '–'],
    [Number.NaN, 1, '–'],
    [Number.NEGATIVE_INFINITY, 1, '−∞'],
  ])('writes %s with %i digits as %s: a true minus, no negative zero, a dash for none', (value, digits, text) => {
    expect(formatNumber(value, digits)).toBe(text)
  })
})

describe('formatSignificant', () => {
  it('keeps the digits that count over decades, with a true minus in number and exponent', () => {
    expect(formatSignificant(0.019337, 3)).toBe('0.0193')
    expect(formatSignificant(-1.2e-9, 2)).toBe('−1.2e−9')
    expect(formatSignificant(null, 3)).toBe('–')
  })
})
