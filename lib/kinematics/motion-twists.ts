import { AXIS_SIZE } from '@/lib/math/place-axes'
import { addSliding, addTurning } from '@/lib/math/twist-columns'
import type { Workspace } from './create-workspace'
import { TWIST_SIZE } from './task'

/** The twist that each motion gives the tool point for one unit of its coordinate, 6 numbers a motion, base axes: the columns of the
 *  Jacobian before those of one coordinate are added up. */
export function motionTwists(work: Workspace): Float64Array {
  const { rotary, multiplier } = work.prepared
  const { motionAxes, baseFromTool, motionTwists: out } = work
  out.fill(0)
  for (let i = 0; i < rotary.length; i++) {
    const at = AXIS_SIZE * i
    // One column of six numbers after the other, so that a row is one number long.
    if (rotary[i] === 1) addTurning(motionAxes, at, baseFromTool, multiplier[i]!, out, 1, TWIST_SIZE * i)
    else addSliding(motionAxes, at, multiplier[i]!, out, 1, TWIST_SIZE * i)
  }
  return out
}
