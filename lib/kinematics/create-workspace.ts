import { identityTransform, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import { createSingularValues, type SingularValues } from '@/lib/math/singular-values'
import type { Chain } from './chain'
import { prepareChain, type PreparedChain } from './prepared-chain'
import { TWIST_SIZE } from './task'

/** Scratch for one chain, allocated once and overwritten by each computation; one workspace serves one computation at a time.
 *  forwardKinematics fills the pose, everything else builds on the pose that it finds here. n joints, m motions. */
export interface Workspace {
  readonly chain: Chain
  readonly prepared: PreparedChain
  /** The configuration of the pose: n (rad or m). */
  readonly q: Float64Array
  /** What each motion turns by (rad), the sine and cosine of that, and what it slides by (m). */
  readonly angles: Float64Array
  readonly turns: Float64Array
  readonly slides: Float64Array
  /** A frame (12 numbers) for each motion, after it: the origin lies on its axis, z is along it. */
  readonly baseFromMotions: Float64Array
  readonly baseFromTip: Float64Array
  readonly tipFromTool: Float64Array
  /** Equal to baseFromTip where no tool was given. */
  readonly baseFromTool: Float64Array
  /** 6 x n, at the tool point, base axes. */
  readonly jacobian: Float64Array
  /** 6 x n, at the tool point, tool axes. */
  readonly tipJacobian: Float64Array
  /** The rows of the task, components x n. */
  readonly taskJacobian: Float64Array
  readonly taskValues: SingularValues
  /** What the inverse multiplies each singular direction by: σ / (σ² + λ²), 0 where it is truncated. */
  readonly gains: Float64Array
  /** The asked twist's task components. */
  readonly asked: Float64Array
  readonly primary: Float64Array
  readonly secondary: Float64Array
  /** A second workspace, for a pose a small step ahead; made when first needed. */
  ahead: Workspace | null
}

/** Allocates everything that computing with `chain` needs, and prepares its numeric form. */
export function createWorkspace(chain: Chain): Workspace {
  const n = chain.joints.length
  const lost = chain.motions.find((motion) => !(motion.joint in chain.joints))
  if (lost !== undefined) throw new RangeError(`motion '${lost.name}' follows a joint that the chain does not have`)
  return {
    chain,
    prepared: prepareChain(chain),
    q: new Float64Array(n),
    angles: new Float64Array(chain.motions.length),
    turns: new Float64Array(2 * chain.motions.length),
    slides: new Float64Array(chain.motions.length),
    baseFromMotions: new Float64Array(TRANSFORM_SIZE * chain.motions.length),
    baseFromTip: identityTransform(),
    tipFromTool: identityTransform(),
    baseFromTool: identityTransform(),
    jacobian: new Float64Array(TWIST_SIZE * n),
    tipJacobian: new Float64Array(TWIST_SIZE * n),
    taskJacobian: new Float64Array(TWIST_SIZE * n),
    taskValues: createSingularValues(TWIST_SIZE, n),
    gains: new Float64Array(TWIST_SIZE),
    asked: new Float64Array(TWIST_SIZE),
    primary: new Float64Array(n),
    secondary: new Float64Array(n),
    ahead: null,
  }
}
