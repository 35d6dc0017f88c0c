import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace, type Workspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { motionAxis } from '@/lib/kinematics/motion-axis'
import { plus, type Vector } from './vector'

/** A moving joint in the pose that is drawn, m in the base frame. */
export interface Node {
  readonly rotary: boolean
  readonly axis: Vector
  /** A point of its axis, after the motion. */
  readonly at: Vector
  /** A sliding joint: where it stands at 0, and where its way ends; the same as `at` for a turning one. */
  readonly zero: Vector
  readonly ends: readonly [Vector, Vector]
}

/** What of an arm is drawn: its joints from base to tip, and the frame at the tip. */
export interface Skeleton {
  readonly nodes: readonly Node[]
  readonly tip: Vector
  /** Directions of the tip frame's x, y and z. */
  readonly tipAxes: readonly [Vector, Vector, Vector]
}

const workspaces = new WeakMap<Chain, Workspace>()

function workspaceOf(chain: Chain): Workspace {
  const known = workspaces.get(chain)
  if (known !== undefined) return known
  const made = createWorkspace(chain)
  workspaces.set(chain, made)
  return made
}

/** A sliding joint without bounds is drawn with a way of this length to both sides, m. */
const OPEN_WAY_M = 0.5

const column = (frame: ArrayLike<number>, k: number): Vector => [frame[k]!, frame[4 + k]!, frame[8 + k]!]

/** The skeleton of `chain` at the configuration `q` (n, SI). */
export function skeletonOf(chain: Chain, q: ArrayLike<number>): Skeleton {
  const work = workspaceOf(chain)
  forwardKinematics(chain, q, work)
  const nodes = chain.motions.map((motion, i): Node => {
    const { along: axis, point: at } = motionAxis(work, i)
    if (motion.rotary) return { rotary: true, axis, at, zero: at, ends: [at, at] }
    const joint = chain.joints[motion.joint]
    const zero = plus(at, axis, -(motion.multiplier * (q[motion.joint] ?? 0) + motion.offset))
    const end = (bound: number) => plus(zero, axis, motion.multiplier * bound + motion.offset)
    return { rotary: false, axis, at, zero, ends: [end(joint?.lower ?? -OPEN_WAY_M), end(joint?.upper ?? OPEN_WAY_M)] }
  })
  const tip = work.baseFromTip
  return { nodes, tip: column(tip, 3), tipAxes: [column(tip, 0), column(tip, 1), column(tip, 2)] }
}
