import { ROTATION_CONVENTIONS, type RotationConvention } from '@/lib/contract/rotation-conventions'
import { transformOfRotationVector, transformOfTurns } from '@/lib/math/orientation'
import { transformOfPose } from '@/lib/math/quaternion'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import type { Kind } from '../si'

/** How far from 1 the norm of a measured quaternion may be: what four digits leave. */
const QUATERNION_SLACK = 1e-3

const isQuaternion = (convention: RotationConvention) => convention === 'quaternion-xyzw' || convention === 'quaternion-wxyz'

/** What the numbers of an orientation measure. */
export const orientationKind = (convention: RotationConvention): Kind | null => (isQuaternion(convention) ? null : 'angle')

/** The transform of a position (m) and the numbers of an orientation (rad, or a quaternion) in this convention; a sentence when they
 *  are no orientation. */
export function transformOfMeasured(position: readonly number[], convention: RotationConvention, numbers: readonly number[]): Float64Array | string {
  const [a, b, c, d] = numbers as [number, number, number, number]
  if (isQuaternion(convention)) {
    const length = Math.hypot(...numbers)
    if (Math.abs(length - 1) > QUATERNION_SLACK) return `the norm of the quaternion is ${Number(length.toPrecision(6))}, and must be within 0.001 of 1`
    return transformOfPose(position, convention === 'quaternion-xyzw' ? [a, b, c, d] : [b, c, d, a])
  }
  if (convention === 'rotation-vector') return transformOfRotationVector(position, numbers)
  if (convention === 'fixed-xyz') return transformOfRollPitchYaw(position, numbers)
  const { turns } = ROTATION_CONVENTIONS[convention as 'intrinsic-zyx' | 'intrinsic-xyz' | 'intrinsic-zyz']
  return transformOfTurns(position, turns, numbers)
}
