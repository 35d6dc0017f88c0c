import { placeAxes } from '@/lib/math/place-axes'
import { identityTransform, multiplyTransforms, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import { sinesAndCosines } from '@/lib/math/sines-and-cosines'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'

/** Fills the pose of `work`: baseFromTip, baseFromTool and the axis of each motion, for the configuration `q`
 *  (n; rad or m) and `tipFromTool` (a transform of 12 numbers; none: the tip itself). Linear in the length of the chain.
 *  Throws a RangeError when `q` has another length than the chain, or `work` belongs to another chain. */
export function forwardKinematics(chain: Chain, q: ArrayLike<number>, work: Workspace, tipFromTool?: ArrayLike<number>): void {
  if (work.chain !== chain) throw new RangeError('this workspace was made for another chain')
  if (q.length !== chain.joints.length) throw new RangeError(`${chain.joints.length} joint values are needed, ${q.length} were given`)
  const { constants, rotary, quarters, turning } = work.prepared
  const { angles, slides, turns } = work
  const count = rotary.length
  const kept = work.q
  for (let i = 0; i < kept.length; i++) kept[i] = q[i]!
  if (!turning) fillMoved(work, count)
  sinesAndCosines(turning ? kept : angles, quarters, count, turns)
  placeAxes(constants, turns, slides, count, work.placed)
  placeTool(work, tipFromTool)
}

/** What each motion turns by, or slides by. */
function fillMoved({ prepared, q, angles, slides }: Workspace, count: number): void {
  const { rotary, joint, multiplier, offset } = prepared
  for (let i = 0; i < count; i++) {
    const moved = multiplier[i]! * q[joint[i]!]! + offset[i]!
    if (rotary[i] === 1) angles[i] = moved
    else slides[i] = moved
  }
}

const NO_TOOL = identityTransform()

function placeTool(work: Workspace, given: ArrayLike<number> | undefined): void {
  const { baseFromTip, tipFromTool, toolRoom } = work
  if (given === undefined) {
    if (work.baseFromTool === toolRoom) tipFromTool.set(NO_TOOL)
    work.baseFromTool = baseFromTip
    return
  }
  // A loop, because TypedArray.set costs more than all of it.
  for (let i = 0; i < TRANSFORM_SIZE; i++) tipFromTool[i] = given[i]!
  multiplyTransforms(baseFromTip, 0, tipFromTool, 0, toolRoom, 0)
  work.baseFromTool = toolRoom
}
