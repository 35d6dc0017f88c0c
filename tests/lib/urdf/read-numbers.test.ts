import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readNumbers } from '@/lib/urdf/read-numbers'

const LARGEST = 1e9
const finite = fc.double({ min: -LARGEST, max: LARGEST, noNaN: true })

describe('readNumbers', () => {
  it('gives back the binary64 that was written, to the last bit, with -0 as 0', () => {
    const blank = fc.constantFrom(' ', '  ', '\t', '\n', '\r\n', ' \n ')
    fc.assert(
      fc.property(fc.array(fc.tuple(finite, blank), { minLength: 1, maxLength: 8 }), (parts) => {
        const text = parts.map(([value, gap]) => `${gap}${value}`).join('')
        expect(readNumbers(text, parts.length, LARGEST)).toEqual(parts.map(([value]) => value + 0))
      }),
      { seed: 1 },
    )
  })

  it.each([
    ['0 0 nan', "has 'nan', which is not a number"],
    ['0 0 -Infinity', "has '-Infinity'; infinity is not a number to compute with"],
    ['0 0 INF', "has 'INF'; infinity is not a number to compute with"],
    ['0 0 0x1F', "has '0x1F'; hexadecimal numbers are not read"],
    ['0 0 1,57', "has '1,57' with a decimal comma"],
    ['0 0 1e', "has '1e', which is not a decimal number"],
    ['0 0 .', "has '.', which is not a decimal number"],
    ['0 0 1_000', "has '1_000', which is not a decimal number"],
    ['0 0 1.5f', "has '1.5f', which is not a decimal number"],
    ['0 0 +-1', "has '+-1', which is not a decimal number"],
    ['0, 0, 0', "has '0,', which is not a decimal number"],
    ['0 0 １', "has '１', which is not a decimal number"],
    ['0\u00a00 0', "has '0\u00a00', which is not a decimal number"],
    ['0 0', 'has 2 numbers where 3 are expected'],
    ['0 0 0 0', 'has 4 numbers where 3 are expected'],
    ['', 'has 0 numbers where 3 are expected'],
    ['0 0 1000000001', "has the number 1000000001, which is too large to compute with (beyond 1e9)"],
    ['0 0 -1e400', 'has the number -1e400, which is too large to compute with (beyond 1e9)'],
  ])('refuses %j and says why', (text, wrong) => {
    expect(readNumbers(text, 3, LARGEST)).toEqual({ wrong })
  })

  it('takes what is too small for binary64 as 0', () => {
    expect(readNumbers('1e-400 -1e-400 5e-324', 3, LARGEST)).toEqual([0, 0, 5e-324])
  })
})
