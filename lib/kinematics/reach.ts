import { lengthOf, plus, type Triple } from '@/lib/math/lines'
import { positionOf } from '@/lib/math/rigid-transform'
import type { Chain } from './chain'

/** How far (m) a goal is beyond anything that the tool can touch, joint limits of sliding joints counted: its distance from where the
 *  chain starts to move, less all lengths laid end to end. At most 0 where it may be within reach; this proves nothing of the rest. */
export function beyondReach(chain: Chain, baseFromGoal: ArrayLike<number>, tipFromTool?: ArrayLike<number>): number {
  const start: Triple = positionOf(chain.constants[0]!)
  let reach = tipFromTool === undefined ? 0 : lengthOf(positionOf(tipFromTool))
  chain.constants.forEach((constant, i) => {
    if (i > 0) reach += lengthOf(positionOf(constant))
  })
  for (const { rotary, joint, multiplier, offset } of chain.motions) {
    if (rotary) continue
    const { lower, upper } = chain.joints[joint]!
    if (lower === null || upper === null) return Number.NEGATIVE_INFINITY
    reach += Math.max(Math.abs(multiplier * lower + offset), Math.abs(multiplier * upper + offset))
  }
  return lengthOf(plus(positionOf(baseFromGoal), start, -1)) - reach
}
