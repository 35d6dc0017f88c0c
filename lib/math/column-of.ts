import type { Triple } from './lines'

/** One of the columns of the transform at `at` (12 numbers): 0, 1, 2 are its axes, 3 its origin. */
export function columnOf(transforms: ArrayLike<number>, at: number, column: 0 | 1 | 2 | 3): Triple {
  return [transforms[at + column]!, transforms[at + 4 + column]!, transforms[at + 8 + column]!]
}
