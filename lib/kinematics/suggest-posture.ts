import { dot } from '@/lib/math/dot'
import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { freesDirection, growthOfHold } from './frees-direction'
import type { Task } from './task'
import { sideOutside } from './within-limits'

/** How far away a suggested posture lies, rad or m of the joint that moves most. */
const AWAY = 0.3
/** Joints that are tried, and joint values that are computed for it: on long chains fewer are tried. */
const MOST_TRIED = 24
const MOST_COMPUTED = 20_000
/** A joint of which less than this part is spare cannot be bent by itself. */
const SPARE = 0.1

/** A posture within the limits that a posture objective could lead to from the pose in `work`, and on the way to which a lost `direction`
 *  (6 numbers, in the task's frame) comes back: of the spare motions that bend one joint each way, the one that brings most of it.
 *  Tested, not guessed (see freesDirection); null where none of them does. work.taskValues, of the given rank, is that of the pose. */
export function suggestPosture(chain: Chain, work: Workspace, task: Task, rank: number, direction: readonly number[]): number[] | null {
  const n = chain.joints.length
  const tried = Math.min(n, MOST_TRIED, Math.ceil(MOST_COMPUTED / n))
  let most = 0
  let best: number[] | null = null
  for (let joint = 0; joint < tried; joint++) {
    const bend = spareMotion(work, rank, joint)
    if (bend === null) continue
    for (const sign of [1, -1]) {
      const motion = bend.map((part) => sign * part)
      const posture = motion.map((part, i) => work.q[i]! + AWAY * part)
      if (chain.joints.some(({ lower, upper }, i) => sideOutside(posture[i]!, lower, upper) !== 0)) continue
      const growth = growthOfHold(chain, work, task, direction, motion)
      // The first of equals, so that rounding does not choose.
      if (growth <= most * (1 + 1e-6) || !freesDirection(chain, work, task, direction, motion)) continue
      most = growth
      best = posture
    }
  }
  return best
}

/** The spare part of bending one joint, its largest component 1 in size; null where the joint is hardly spare. */
function spareMotion({ taskValues, q }: Workspace, rank: number, joint: number): number[] | null {
  const n = q.length
  const motion = new Array<number>(n).fill(0)
  motion[joint] = 1
  for (let k = 0; k < rank; k++) {
    const along = dot(taskValues.right, k * n, motion, 0, n)
    for (let j = 0; j < n; j++) motion[j]! -= along * taskValues.right[k * n + j]!
  }
  if (motion[joint]! < SPARE * SPARE) return null
  const largest = motion.reduce((size, part) => Math.max(size, Math.abs(part)), 0)
  // Rounding that the posture need not show.
  return motion.map((part) => (Math.abs(part) < 1e-12 * largest ? 0 : part / largest))
}
