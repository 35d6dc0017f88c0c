import { norm } from './norm'
import { quaternionOf } from './quaternion'

/** The rotation vector ϑ·r (rad) of a transform's rotation, the short way round. At ϑ = 180° both axes are as short: the sign
 *  is then the quaternion's (first of x, y, z beyond 1e-9 positive). Accurate near 0 and near 180°, where an arc cosine is not. */
export function rotationVectorOf(transform: ArrayLike<number>): [number, number, number] {
  const [x, y, z, w] = quaternionOf(transform)
  const sine = norm([x, y, z])
  // Below this the series sin(ϑ/2) = ϑ/2 is exact to the last bit, and the division by a tiny sine is spared.
  const factor = sine < 1e-9 ? 2 : (2 * Math.atan2(sine, w)) / sine
  return [factor * x, factor * y, factor * z]
}
