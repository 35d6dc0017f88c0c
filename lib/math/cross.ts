/** Adds weight · a × b to the three numbers of `out` from `at` on. */
export function addCross(
  a: ArrayLike<number>, atA: number, b: ArrayLike<number>, atB: number, weight: number, out: Float64Array, at: number,
): void {
  const a1 = a[atA]!, a2 = a[atA + 1]!, a3 = a[atA + 2]!
  const b1 = b[atB]!, b2 = b[atB + 1]!, b3 = b[atB + 2]!
  out[at]! += weight * (a2 * b3 - a3 * b2)
  out[at + 1]! += weight * (a3 * b1 - a1 * b3)
  out[at + 2]! += weight * (a1 * b2 - a2 * b1)
}
