import { addCross } from '@/lib/math/cross'
import { turnIntoFrame } from '@/lib/math/twist-columns'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { motionTwists } from './motion-twists'
import { LINEAR_COMPONENTS, TWIST_SIZE, type TaskFrame } from './task'

/** The time derivative of the Jacobian (6 x n, as jacobian gives it) at the pose in `work` while the joints move at `rates` (n; rad/s or
 *  m/s). From ∂Jⱼ/∂qᵢ = [ωᵢ × vⱼ; ωᵢ × ωⱼ] for motions i up to j and [ωⱼ × vᵢ; 0] beyond, which holds for prismatic ones with ω = 0;
 *  summed up from both ends, so that the cost is linear in the joints. In tool axes the turning of the tool comes on top. */
export function jacobianDerivative(chain: Chain, work: Workspace, rates: ArrayLike<number>, frame: TaskFrame = 'base'): Float64Array {
  const n = chain.joints.length
  const { joint } = work.prepared
  const twists = motionTwists(work)
  const out = new Float64Array(TWIST_SIZE * n)
  const column = new Float64Array(TWIST_SIZE)
  /** Turning of the frame reached so far, and sliding that is still to come, both by rates. */
  const turning = new Float64Array(LINEAR_COMPONENTS)
  const coming = new Float64Array(LINEAR_COMPONENTS)
  const whole = new Float64Array(LINEAR_COMPONENTS)
  const add = (sum: Float64Array, from: number, rate: number) => {
    for (let r = 0; r < LINEAR_COMPONENTS; r++) sum[r]! += rate * twists[from + r]!
  }
  for (let i = 0; i < joint.length; i++) {
    add(coming, TWIST_SIZE * i, rates[joint[i]!]!)
    add(whole, TWIST_SIZE * i + LINEAR_COMPONENTS, rates[joint[i]!]!)
  }
  for (let i = 0; i < joint.length; i++) {
    const v = TWIST_SIZE * i
    const w = v + LINEAR_COMPONENTS
    const rate = rates[joint[i]!]!
    add(turning, w, rate)
    add(coming, v, -rate)
    column.fill(0)
    addCross(turning, 0, twists, v, 1, column, 0)
    addCross(twists, w, coming, 0, 1, column, 0)
    addCross(turning, 0, twists, w, 1, column, LINEAR_COMPONENTS)
    if (frame === 'tip') {
      addCross(whole, 0, twists, v, -1, column, 0)
      addCross(whole, 0, twists, w, -1, column, LINEAR_COMPONENTS)
    }
    for (let r = 0; r < TWIST_SIZE; r++) out[r * n + joint[i]!]! += column[r]!
  }
  if (frame === 'tip') turnIntoFrame(work.baseFromTool, out, n, out)
  return out
}
