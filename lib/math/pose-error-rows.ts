import { turnErrorSlope } from './turn-error'

const slope = new Float64Array(9)

/** Replaces the 6 x n Jacobian `rows` by that of a pose error: how the position difference and the rotation vector that are left
 *  (`error`, 6) shrink with the joints. In base axes the position rows are as they are; in tip axes, which turn themselves, e × ω comes
 *  on top. Both are the plain Jacobian where no error is left. */
export function errorRows(rows: Float64Array, n: number, error: ArrayLike<number>, axes: 'base' | 'tip'): void {
  turnErrorSlope([error[3]!, error[4]!, error[5]!], axes, slope)
  const x = error[0]!, y = error[1]!, z = error[2]!
  for (let j = 0; j < n; j++) {
    const a = rows[3 * n + j]!, b = rows[4 * n + j]!, c = rows[5 * n + j]!
    if (axes === 'tip') {
      rows[j]! -= y * c - z * b
      rows[n + j]! -= z * a - x * c
      rows[2 * n + j]! -= x * b - y * a
    }
    rows[3 * n + j] = slope[0]! * a + slope[1]! * b + slope[2]! * c
    rows[4 * n + j] = slope[3]! * a + slope[4]! * b + slope[5]! * c
    rows[5 * n + j] = slope[6]! * a + slope[7]! * b + slope[8]! * c
  }
}
