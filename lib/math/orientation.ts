import { transformOfPose } from './quaternion'
import { identityTransform, multiplyTransforms } from './rigid-transform'

/** The transform of a position (m) and a rotation vector ϑ·r (rad). */
export function transformOfRotationVector(position: ArrayLike<number>, vector: ArrayLike<number>): Float64Array {
  const x = vector[0]!, y = vector[1]!, z = vector[2]!
  const angle = Math.hypot(x, y, z)
  // Below this sin(ϑ/2) is ϑ/2 to the last bit.
  const factor = angle < 1e-9 ? 0.5 : Math.sin(angle / 2) / angle
  return transformOfPose(position, [factor * x, factor * y, factor * z, Math.cos(angle / 2)])
}

/** The transform of a position (m) and turns by `angles` (rad) about `axes`, one after the other, each in the frame that the turns
 *  before it have reached: R = R₁·R₂·R₃. */
export function transformOfTurns(position: ArrayLike<number>, axes: readonly ('x' | 'y' | 'z')[], angles: ArrayLike<number>): Float64Array {
  const out = identityTransform()
  axes.forEach((axis, i) => multiplyTransforms(out, 0, turnAbout(axis, angles[i]!), 0, out, 0))
  for (let row = 0; row < 3; row++) out[4 * row + 3] = position[row]!
  return out
}

function turnAbout(axis: 'x' | 'y' | 'z', angle: number): Float64Array {
  const cos = Math.cos(angle)
  const sin = Math.sin(angle)
  if (axis === 'x') return Float64Array.of(1, 0, 0, 0, 0, cos, -sin, 0, 0, sin, cos, 0)
  if (axis === 'y') return Float64Array.of(cos, 0, sin, 0, 0, 1, 0, 0, -sin, 0, cos, 0)
  return Float64Array.of(cos, -sin, 0, 0, sin, cos, 0, 0, 0, 0, 1, 0)
}
