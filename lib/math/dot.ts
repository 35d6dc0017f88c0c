/** Scalar product of `count` numbers of `a` from `atA` with as many of `b` from `atB`. */
export function dot(a: ArrayLike<number>, atA: number, b: ArrayLike<number>, atB: number, count: number): number {
  let sum = 0
  for (let i = 0; i < count; i++) sum += a[atA + i]! * b[atB + i]!
  return sum
}
