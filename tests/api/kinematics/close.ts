import { expect } from 'vitest'

type Numbers = number | readonly Numbers[]

/** Checks nested lists of numbers entry by entry. tolerance: absolute. */
export function expectClose(actual: Numbers | undefined, expected: Numbers, tolerance = 1e-9, place = ''): void {
  if (typeof expected === 'number') {
    expect(typeof actual, place).toBe('number')
    expect(Math.abs((actual as number) - expected), `${place}: ${String(actual)} for ${expected}`).toBeLessThanOrEqual(tolerance)
    return
  }
  expect((actual as readonly Numbers[] | undefined)?.length, place).toBe(expected.length)
  expected.forEach((entry, i) => expectClose((actual as readonly Numbers[])[i], entry, tolerance, `${place}[${i}]`))
}
