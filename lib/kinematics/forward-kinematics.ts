import { slideAlongZ, turnAboutZ } from '@/lib/math/move-along-z'
import { identityTransform, multiplyTransforms, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'

const NO_TOOL = identityTransform()

/** Fills the pose of `work`: baseFromTip, baseFromTool and a frame for each motion, for the configuration `q`
 *  (n; rad or m) and `tipFromTool` (a transform of 12 numbers; none: the tip itself). Linear in the length of the chain.
 *  Throws a RangeError when `q` has another length than the chain, or `work` belongs to another chain. */
export function forwardKinematics(chain: Chain, q: ArrayLike<number>, work: Workspace, tipFromTool: ArrayLike<number> = NO_TOOL): void {
  if (work.chain !== chain) throw new RangeError('this workspace was made for another chain')
  if (q.length !== chain.joints.length) throw new RangeError(`${chain.joints.length} joint values are needed, ${q.length} were given`)
  const { constants, rotary, joint, multiplier, offset } = work.prepared
  const frames = work.baseFromMotions
  const count = rotary.length
  for (let i = 0; i < work.q.length; i++) work.q[i] = q[i]!

  let before = NO_TOOL
  let atBefore = 0
  for (let i = 0; i < count; i++) {
    const at = TRANSFORM_SIZE * i
    multiplyTransforms(before, atBefore, constants, at, frames, at)
    const moved = multiplier[i]! * work.q[joint[i]!]! + offset[i]!
    if (rotary[i] === 1) turnAboutZ(frames, at, moved)
    else slideAlongZ(frames, at, moved)
    before = frames
    atBefore = at
  }
  multiplyTransforms(before, atBefore, constants, TRANSFORM_SIZE * count, work.baseFromTip, 0)
  for (let i = 0; i < TRANSFORM_SIZE; i++) work.tipFromTool[i] = tipFromTool[i]!
  multiplyTransforms(work.baseFromTip, 0, work.tipFromTool, 0, work.baseFromTool, 0)
}
