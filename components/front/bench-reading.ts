import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace, type Workspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { measures, type Measures } from '@/lib/kinematics/measures'
import { createTask } from '@/lib/kinematics/task'
import { quaternionOf } from '@/lib/math/quaternion'
import { positionOf } from '@/lib/math/rigid-transform'

/** What the bench shows of one configuration. SI. */
export interface BenchReading extends Measures {
  readonly position: readonly number[]
  readonly quaternion: readonly number[]
  readonly nullity: number
  /** The joint with the least way left to a limit, and that way; null when no joint has limits. */
  readonly nearestLimit: { readonly joint: string; readonly left: number } | null
}

const TASK = createTask()
const workspaces = new WeakMap<Chain, Workspace>()

/** Way left to the nearer limit, rad or m; null without limits. */
export function wayLeft(joint: Chain['joints'][number], value: number): number | null {
  const ways = [joint.lower === null ? null : value - joint.lower, joint.upper === null ? null : joint.upper - value]
  const known = ways.filter((way) => way !== null)
  return known.length === 0 ? null : Math.min(...known)
}

/** Pose and measures of `chain` at `q`, for all six components, characteristic length 1 m. */
export function readBench(chain: Chain, q: readonly number[]): BenchReading {
  const work = workspaces.get(chain) ?? createWorkspace(chain)
  workspaces.set(chain, work)
  forwardKinematics(chain, q, work)
  const position = positionOf(work.baseFromTip)
  const quaternion = quaternionOf(work.baseFromTip)
  const found = measures(chain, work, TASK)
  const ways = chain.joints.flatMap((joint, i) => {
    const left = wayLeft(joint, q[i]!)
    return left === null ? [] : [{ joint: joint.name, left }]
  })
  const nearestLimit = ways.length === 0 ? null : ways.reduce((least, next) => (next.left < least.left ? next : least))
  return { ...found, position, quaternion, nullity: chain.joints.length - found.rank, nearestLimit }
}
