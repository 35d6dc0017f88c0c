import { quaternionOf } from './quaternion'
import { identityTransform, invertTransform, multiplyTransforms } from './rigid-transform'

/** How far one pose stands from another: between the origins (m), and the angle of the turn between them, 0 to pi (rad). */
export interface PoseDifference {
  readonly distance: number
  readonly angle: number
}

/** The difference of two transforms of 12 numbers in the same base. The same numbers give exactly 0; accurate near 0 and near pi,
 *  where an arc cosine is not. */
export function poseDifference(a: ArrayLike<number>, b: ArrayLike<number>): PoseDifference {
  const distance = Math.hypot(b[3]! - a[3]!, b[7]! - a[7]!, b[11]! - a[11]!)
  return { distance, angle: sameTurn(a, b) ? 0 : angleBetween(a, b) }
}

function sameTurn(a: ArrayLike<number>, b: ArrayLike<number>): boolean {
  for (let i = 0; i < 12; i++) if (i % 4 !== 3 && a[i] !== b[i]) return false
  return true
}

function angleBetween(a: ArrayLike<number>, b: ArrayLike<number>): number {
  const between = identityTransform()
  invertTransform(a, between)
  multiplyTransforms(between, 0, b, 0, between, 0)
  const [x, y, z, w] = quaternionOf(between)
  return 2 * Math.atan2(Math.hypot(x, y, z), Math.abs(w))
}
