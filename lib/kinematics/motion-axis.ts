import type { Line } from '@/lib/math/lines'
import { AXIS_SIZE } from '@/lib/math/place-axes'
import type { Workspace } from './create-workspace'

/** The axis that a motion turns about or slides along at the pose in `work`, base frame (see forwardKinematics). */
export function motionAxis({ motionAxes }: Workspace, motion: number): Line {
  const at = AXIS_SIZE * motion
  return {
    along: [motionAxes[at]!, motionAxes[at + 1]!, motionAxes[at + 2]!],
    point: [motionAxes[at + 3]!, motionAxes[at + 4]!, motionAxes[at + 5]!],
  }
}
