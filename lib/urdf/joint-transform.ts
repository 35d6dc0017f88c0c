import { axisFrame } from '@/lib/math/axis-frame'
import { slideAlongZ, turnAboutZ } from '@/lib/math/move-along-z'
import { norm } from '@/lib/math/norm'
import { transformOfPose } from '@/lib/math/quaternion'
import { identityTransform, invertTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import type { DescribedJoint, Origin } from '@/lib/urdf/description'

/** The transform of an origin, row-major 3 x 4, in m: parent link from joint frame. */
export const transformOfOrigin = (origin: Origin): Float64Array =>
  'rpy' in origin ? transformOfRollPitchYaw(origin.xyz, origin.rpy) : transformOfPose(origin.xyz, origin.quaternion)

/** Parent link from child link of a joint that stands still at `value` (rad or m). */
export function stillTransform(joint: DescribedJoint, value: number): Float64Array {
  const parentFromChild = transformOfOrigin(joint.origin)
  if (value === 0 || joint.type === 'fixed') return parentFromChild
  const length = norm(joint.axis)
  const jointFromAxis = identityTransform()
  axisFrame(joint.axis.map((part) => part / length), jointFromAxis)
  const axisFromJoint = identityTransform()
  invertTransform(jointFromAxis, axisFromJoint)
  multiplyTransforms(parentFromChild, 0, jointFromAxis, 0, parentFromChild, 0)
  if (joint.type === 'prismatic') slideAlongZ(parentFromChild, 0, value)
  else turnAboutZ(parentFromChild, 0, value)
  multiplyTransforms(parentFromChild, 0, axisFromJoint, 0, parentFromChild, 0)
  return parentFromChild
}
