import { expect } from 'vitest'

/** Every number within `tolerance` of the expected one, compared as a whole so that a failure shows both. */
export function expectClose(actual: ArrayLike<number>, expected: ArrayLike<number>, tolerance: number): void {
  expect(actual.length).toBe(expected.length)
  const away = Array.from(actual).map((value, i) => Math.abs(value - expected[i]!))
  const worst = Math.max(...away)
  expect(worst <= tolerance, `${Array.from(actual).join(', ')} is ${worst} away from ${Array.from(expected).join(', ')}`).toBe(true)
}
