import { placeFrames } from '@/lib/math/place-frames'
import { identityTransform, multiplyTransforms, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import { sinesAndCosines } from '@/lib/math/sines-and-cosines'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'

/** Fills the pose of `work`: baseFromTip, baseFromTool and a frame for each motion, for the configuration `q`
 *  (n; rad or m) and `tipFromTool` (a transform of 12 numbers; none: the tip itself). Linear in the length of the chain.
 *  Throws a RangeError when `q` has another length than the chain, or `work` belongs to another chain. */
export function forwardKinematics(chain: Chain, q: ArrayLike<number>, work: Workspace, tipFromTool?: ArrayLike<number>): void {
  if (work.chain !== chain) throw new RangeError('this workspace was made for another chain')
  if (q.length !== chain.joints.length) throw new RangeError(`${chain.joints.length} joint values are needed, ${q.length} were given`)
  const { baseFromFirst, lastFromTip, steps, rotary, joint, multiplier, offset, quarters, rest } = work.prepared
  const { angles, slides, turns, baseFromMotions } = work
  const count = rotary.length
  for (let i = 0; i < work.q.length; i++) work.q[i] = q[i]!
  for (let i = 0; i < count; i++) {
    const moved = multiplier[i]! * work.q[joint[i]!]! + offset[i]!
    const turning = rotary[i] === 1
    angles[i] = turning ? moved + rest[i]! : rest[i]!
    slides[i] = turning ? 0 : moved
  }
  sinesAndCosines(angles, quarters, count, turns)
  placeFrames(baseFromFirst, steps, turns, slides, count, baseFromMotions)
  if (count === 0) work.baseFromTip.set(baseFromFirst)
  else multiplyTransforms(baseFromMotions, TRANSFORM_SIZE * (count - 1), lastFromTip, 0, work.baseFromTip, 0)
  placeTool(work, tipFromTool)
}

const NO_TOOL = identityTransform()

function placeTool({ baseFromTip, tipFromTool, baseFromTool }: Workspace, given: ArrayLike<number> = NO_TOOL): void {
  for (let i = 0; i < TRANSFORM_SIZE; i++) tipFromTool[i] = given[i]!
  if (given === NO_TOOL) baseFromTool.set(baseFromTip)
  else multiplyTransforms(baseFromTip, 0, tipFromTool, 0, baseFromTool, 0)
}
