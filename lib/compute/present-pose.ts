import type { Pose } from '@/lib/contract/kinematic-quantities'
import { quaternionOf } from '@/lib/math/quaternion'
import { positionOf } from '@/lib/math/rigid-transform'
import { POSITION_KINDS, type SiWriter } from './si'

/** A transform of 12 numbers (m) as a pose of the answer. */
export function presentPose(transform: ArrayLike<number>, write: SiWriter, withMatrix = false): Pose {
  const position = write.list(positionOf(transform), POSITION_KINDS)
  const pose = { position, quaternion: quaternionOf(transform) }
  if (!withMatrix) return pose
  const row = (i: number) => [transform[4 * i]!, transform[4 * i + 1]!, transform[4 * i + 2]!, position[i]!]
  return { ...pose, matrix: [row(0), row(1), row(2), [0, 0, 0, 1]] }
}
