import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fullUnits, SiReader, SiWriter } from '@/lib/compute/si'
import { Problem } from '@/lib/errors'
import { degFromRad, mFromMm, mmFromM, radFromDeg } from '@/lib/units'

const SHOP = { length: 'mm', angle: 'deg' } as const
const SI = { length: 'm', angle: 'rad' } as const

function refusal(act: () => unknown): Problem {
  try {
    act()
  } catch (error) {
    if (error instanceof Problem) return error
  }
  throw new Error('nothing was refused')
}

describe('conversion', () => {
  it('is exact where the decimal is: 350 mm are 0.35 m to the last bit', () => {
    expect([mFromMm(350), mFromMm(0.1), mFromMm(1234.5)]).toEqual([0.35, 0.0001, 1.2345])
    for (let mm = 0; mm <= 10_000; mm++) expect(mFromMm(mm)).toBe(Number(`${mm}e-3`))
    expect([radFromDeg(180), radFromDeg(90), radFromDeg(-360), degFromRad(Math.PI)]).toEqual([Math.PI, Math.PI / 2, -2 * Math.PI, 180])
  })

  it('comes back to where it started, to the last bits', () => {
    // Subnormal numbers have fewer bits to come back with.
    fc.assert(
      fc.property(fc.double({ min: -1e9, max: 1e9, noNaN: true }), (value) => {
        expect(Math.abs(mmFromM(mFromMm(value)) - value)).toBeLessThanOrEqual(4e-16 * Math.abs(value) + Number.MIN_VALUE * 2000)
        expect(Math.abs(degFromRad(radFromDeg(value)) - value)).toBeLessThanOrEqual(8e-16 * Math.abs(value) + Number.MIN_VALUE * 2000)
      }),
      { seed: 3 },
    )
  })

  it('leaves SI untouched', () => {
    const read = new SiReader(SI)
    expect(read.list([0.1, 1e9, -0], ['length', 'angle', null], '/q', 'the chain')).toEqual([0.1, 1e9, -0])
    read.finish()
    expect(fullUnits(undefined)).toEqual(SI)
    expect(fullUnits({ angle: 'deg' })).toEqual({ length: 'm', angle: 'deg' })
  })
})

describe('SiReader', () => {
  it('converts by what each number measures', () => {
    const read = new SiReader(SHOP)
    expect(read.list([500, 90, 7], ['length', 'angle', null], '/q', 'the chain')).toEqual([0.5, Math.PI / 2, 7])
    read.finish()
  })

  it('collects lengths and tells them before magnitudes', () => {
    const read = new SiReader(SI)
    read.list([1, 2], ['angle'], '/configurations/0', 'the chain')
    read.number(2e9, 'angle', '/gain')
    read.matched(2, 3, '/twists')
    const { code, more } = refusal(() => read.finish())
    expect(code).toBe('length-mismatch')
    expect(more.errors).toEqual([
      { pointer: '/configurations/0', detail: 'has 2 entries; the chain has 1' },
      { pointer: '/twists', detail: 'has 2 entries; send one for each of the 3 configurations, or one for all' },
    ])
  })

  it('measures the largest magnitude in SI and points at each number beyond it', () => {
    const read = new SiReader(SHOP)
    read.list([1e12, 1.001e12, 5.7e10, 5.8e10], ['length', 'length', 'angle', 'angle'], '/q', 'the chain')
    const { code, more } = refusal(() => read.finish())
    expect(code).toBe('invalid-request')
    expect(more.errors).toEqual([{ pointer: '/q/1', detail: 'is beyond 1e9 m' }, { pointer: '/q/3', detail: 'is beyond 1e9 rad' }])
  })

  it('takes one for all or one for each', () => {
    const read = new SiReader(SI)
    read.matched(1, 5, '/twists')
    read.matched(5, 5, '/twists')
    read.finish()
  })

  it('lists at most fifty faults and says how many there are', () => {
    const read = new SiReader(SI)
    for (let i = 0; i < 80; i++) read.number(1e10, null, `/x/${i}`)
    const { detail, more } = refusal(() => read.finish())
    expect(more.errors).toHaveLength(50)
    expect(detail).toContain('79 more')
  })
})

describe('SiWriter', () => {
  it('writes a Jacobian in the units of row over column, and leaves it alone where they are the same', () => {
    const [arc, slide] = [0.123456789, 0.987654321]
    const values = [arc, slide, 0, 0, 0, 0, arc, slide, 0, 0, 0, 0]
    const matrix = new SiWriter(SHOP).jacobian(values, ['angle', 'length'])
    expect(matrix[0]![0]).toBeCloseTo((arc * 1000 * Math.PI) / 180, 12)
    expect(matrix[0]![1]).toBe(slide)
    expect(matrix[3]![0]).toBe(arc)
    expect(matrix[3]![1]).toBeCloseTo((slide * 180) / Math.PI / 1000, 12)
    expect(new SiWriter(SI).jacobian(values, ['angle', 'length'])).toEqual([[arc, slide], [0, 0], [0, 0], [arc, slide], [0, 0], [0, 0]])
  })

  it('keeps a bound that does not exist', () => {
    const write = new SiWriter(SHOP)
    expect([write.nullable(null, 'angle'), write.nullable(Math.PI, 'angle')]).toEqual([null, 180])
  })
})
