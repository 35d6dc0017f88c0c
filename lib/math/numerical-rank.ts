/** Under this a singular value cannot be divided by without leaving the range of numbers. */
const SMALLEST_DIVISOR = 1e-200

/** How many of the first `count` singular values (descending) exceed `tolerance` times the largest. A tolerance finer than
 *  rounding (`size` times 2⁻⁵², `size` the larger side of the matrix) is taken as that. */
export function numericalRank(values: ArrayLike<number>, count: number, tolerance: number, size: number): number {
  if (count === 0) return 0
  const threshold = Math.max(Math.max(tolerance, size * Number.EPSILON) * values[0]!, SMALLEST_DIVISOR)
  let rank = 0
  while (rank < count && values[rank]! > threshold) rank++
  return rank
}
