import { AXIS_SIZE } from '@/lib/math/place-axes'
import { addSliding, addTurning, fillColumns, turnIntoFrame } from '@/lib/math/twist-columns'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import type { TaskFrame } from './task'

/** The geometric Jacobian of the pose in `work` (see forwardKinematics): 6 x n row-major, rows vx vy vz wx wy wz, reference
 *  point the tool's, in base axes or turned into the tool's. m/s per rad/s or m/s, and rad/s per rad/s. A mimic joint adds its column,
 *  times its multiplier, to the column of the joint it follows. Returns the array of `work` that holds it. Whitney 1972. */
export function jacobian(chain: Chain, work: Workspace, frame: TaskFrame = 'base'): Float64Array {
  const n = chain.joints.length
  if (work.prepared.plain) fillColumns(work.motionAxes, work.prepared.rotary, work.baseFromTool, n, work.jacobian)
  else addColumns(work, n)
  if (frame === 'base') return work.jacobian
  turnIntoFrame(work.baseFromTool, work.jacobian, n, work.tipJacobian)
  return work.tipJacobian
}

function addColumns({ prepared, motionAxes, baseFromTool, jacobian: out }: Workspace, n: number): void {
  const { rotary, joint, multiplier } = prepared
  out.fill(0)
  for (let i = 0; i < rotary.length; i++) {
    const at = AXIS_SIZE * i
    if (rotary[i] === 1) addTurning(motionAxes, at, baseFromTool, multiplier[i]!, out, n, joint[i]!)
    else addSliding(motionAxes, at, multiplier[i]!, out, n, joint[i]!)
  }
}
