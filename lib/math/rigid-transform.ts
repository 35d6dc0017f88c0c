/** Rigid transforms as row-major 3 x 4: r11 r12 r13 px, r21 r22 r23 py, r31 r32 r33 pz (12 numbers, lengths in m). */

/** How many numbers a rigid transform has. */
export const TRANSFORM_SIZE = 12

/** A new transform that changes nothing. */
export function identityTransform(): Float64Array {
  return Float64Array.of(1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0)
}

/** out = a · b, each found at its own offset. `out` may be `a` itself, never `b`. */
export function multiplyTransforms(
  a: ArrayLike<number>, atA: number, b: ArrayLike<number>, atB: number, out: Float64Array, atOut: number,
): void {
  const b11 = b[atB]!, b12 = b[atB + 1]!, b13 = b[atB + 2]!, bx = b[atB + 3]!
  const b21 = b[atB + 4]!, b22 = b[atB + 5]!, b23 = b[atB + 6]!, by = b[atB + 7]!
  const b31 = b[atB + 8]!, b32 = b[atB + 9]!, b33 = b[atB + 10]!, bz = b[atB + 11]!
  for (let row = 0; row < TRANSFORM_SIZE; row += 4) {
    const x = a[atA + row]!, y = a[atA + row + 1]!, z = a[atA + row + 2]!, p = a[atA + row + 3]!
    out[atOut + row] = x * b11 + y * b21 + z * b31
    out[atOut + row + 1] = x * b12 + y * b22 + z * b32
    out[atOut + row + 2] = x * b13 + y * b23 + z * b33
    out[atOut + row + 3] = x * bx + y * by + z * bz + p
  }
}

/** out = a⁻¹, for a proper rotation: transpose and turn the position back. `out` is not `a`. */
export function invertTransform(a: ArrayLike<number>, out: Float64Array): void {
  const x = a[3]!, y = a[7]!, z = a[11]!
  for (let row = 0; row < 3; row++) {
    const r1 = a[row]!, r2 = a[row + 4]!, r3 = a[row + 8]!
    out[4 * row] = r1
    out[4 * row + 1] = r2
    out[4 * row + 2] = r3
    out[4 * row + 3] = -(r1 * x + r2 * y + r3 * z)
  }
}

/** The position part of a transform, as a new triple in m. */
export function positionOf(transform: ArrayLike<number>): [number, number, number] {
  return [transform[3]!, transform[7]!, transform[11]!]
}
