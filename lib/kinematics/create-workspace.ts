import { createBidiagonal, type Bidiagonal } from '@/lib/math/bidiagonal'
import { createValuesRoom, type ValuesRoom } from '@/lib/math/bidiagonal-values'
import { AXIS_SIZE, FIRST_AXIS } from '@/lib/math/place-axes'
import { identityTransform } from '@/lib/math/rigid-transform'
import { createSingularValues, type SingularValues } from '@/lib/math/singular-values'
import { createSixFactors, type SixFactors } from '@/lib/math/six'
import type { Chain } from './chain'
import { prepareChain, type PreparedChain } from './prepared-chain'
import { createRateBounds, type RateBounds } from './rate-bounds'
import type { RateScaling } from './rate-scaling'
import type { Saturation } from './saturate-rates'
import type { Solved } from './solved'
import { LINEAR_COMPONENTS, TWIST_SIZE } from './task'

/** Scratch for one chain, allocated once and overwritten by each computation; one workspace serves one computation at a time.
 *  forwardKinematics fills the pose, everything else builds on the pose that it finds here. n joints, m motions. */
export interface Workspace {
  readonly chain: Chain
  readonly prepared: PreparedChain
  /** The configuration of the pose: n (rad or m). */
  readonly q: Float64Array
  /** What each motion turns by (rad), the sine and cosine of that, and what it slides by (m; none where nothing slides). */
  readonly angles: Float64Array
  readonly turns: Float64Array
  readonly slides: Float64Array
  /** The axis of each motion in the base frame (see placeAxes), after the motion. */
  readonly motionAxes: Float64Array
  readonly baseFromTip: Float64Array
  /** Both of them in one, as placeAxes fills them. */
  readonly placed: Float64Array
  readonly tipFromTool: Float64Array
  /** baseFromTip itself where no tool was given, toolRoom else. */
  baseFromTool: Float64Array
  readonly toolRoom: Float64Array
  /** 6 x n, at the tool point, base axes. */
  readonly jacobian: Float64Array
  /** 6 x n, at the tool point, tool axes. */
  readonly tipJacobian: Float64Array
  /** The rows of the task, components x n. */
  readonly taskJacobian: Float64Array
  readonly taskValues: SingularValues
  /** Row-major m x n with orthonormal rows that span what the task feels, and the lower triangle L of taskJacobian = L · rows: filled
   *  in place of taskValues where the pose is an easy one (see resolveRates). */
  readonly rows: Float64Array
  readonly lower: Float64Array
  /** What the inverse multiplies each singular direction by, σ / (σ² + λ²), or 0 where it is truncated; its λ; and σ²/(σ² + λ²). */
  readonly gains: Float64Array
  readonly lambdas: Float64Array
  readonly delivered: Float64Array
  /** The asked twist's task components, and the same by orthonormal row or singular direction. */
  readonly asked: Float64Array
  readonly byRow: Float64Array
  readonly primary: Float64Array
  readonly secondary: Float64Array
  /** The secondary motion before it was projected. */
  readonly wish: Float64Array
  /** Joint weights (see prepareWeights): their square roots, and the factors of rows · W^(−½). */
  readonly rootWeights: Float64Array
  readonly scaledRows: Float64Array
  readonly weightedRows: Float64Array
  readonly weightedLower: Float64Array
  /** Small squares and vectors of the task's size. */
  readonly square: Float64Array
  readonly coordinates: Float64Array
  readonly bidiagonal: Bidiagonal
  readonly valuesRoom: ValuesRoom
  /** See solveWhole. */
  readonly nullRows: Float64Array
  readonly six: SixFactors
  /** How the task Jacobian was solved (see solvePrimary). */
  readonly solved: Solved
  readonly bounds: RateBounds
  readonly scaling: RateScaling
  /** Made when first needed. */
  saturation: Saturation | null
  /** 6 a motion (see motionTwists). */
  readonly motionTwists: Float64Array
  readonly slopes: { readonly pulls: Float64Array; readonly pull: Float64Array; readonly turnedAlong: Float64Array; readonly carriedBefore: Float64Array }
  /** A second workspace, for a pose a small step ahead; made when first needed. */
  ahead: Workspace | null
}

const NO_ROWS = new Float64Array(0)

/** Allocates everything that computing with `chain` needs, and prepares its numeric form. */
export function createWorkspace(chain: Chain): Workspace {
  const n = chain.joints.length
  const lost = chain.motions.find((motion) => !(motion.joint in chain.joints))
  if (lost !== undefined) throw new RangeError(`motion '${lost.name}' follows a joint that the chain does not have`)
  const prepared = prepareChain(chain)
  const placed = new Float64Array(FIRST_AXIS + AXIS_SIZE * chain.motions.length)
  const baseFromTip = placed.subarray(0, FIRST_AXIS)
  baseFromTip.set(identityTransform())
  return {
    chain,
    prepared,
    q: new Float64Array(n),
    angles: prepared.rest.slice(),
    turns: new Float64Array(2 * chain.motions.length),
    slides: new Float64Array(chain.motions.every(({ rotary }) => rotary) ? 0 : chain.motions.length),
    motionAxes: placed.subarray(FIRST_AXIS),
    baseFromTip,
    placed,
    tipFromTool: identityTransform(),
    baseFromTool: baseFromTip,
    toolRoom: identityTransform(),
    jacobian: new Float64Array(TWIST_SIZE * n),
    tipJacobian: new Float64Array(TWIST_SIZE * n),
    taskJacobian: new Float64Array(TWIST_SIZE * n),
    taskValues: createSingularValues(TWIST_SIZE, n),
    rows: new Float64Array(TWIST_SIZE * n),
    lower: new Float64Array(TWIST_SIZE * TWIST_SIZE),
    gains: new Float64Array(TWIST_SIZE),
    lambdas: new Float64Array(TWIST_SIZE),
    delivered: new Float64Array(TWIST_SIZE),
    asked: new Float64Array(TWIST_SIZE),
    byRow: new Float64Array(TWIST_SIZE),
    primary: new Float64Array(n),
    secondary: new Float64Array(n),
    wish: new Float64Array(n),
    rootWeights: new Float64Array(n),
    scaledRows: new Float64Array(TWIST_SIZE * n),
    weightedRows: new Float64Array(TWIST_SIZE * n),
    weightedLower: new Float64Array(TWIST_SIZE * TWIST_SIZE),
    square: new Float64Array(TWIST_SIZE * TWIST_SIZE),
    coordinates: new Float64Array(TWIST_SIZE),
    solved: { jacobian: NO_ROWS, rows: NO_ROWS, nullRows: null, rank: 0, damping: 0, easy: false, wished: 0 },
    bidiagonal: createBidiagonal(Math.max(TWIST_SIZE, n)),
    valuesRoom: createValuesRoom(TWIST_SIZE),
    nullRows: new Float64Array(TWIST_SIZE * n),
    six: createSixFactors(),
    bounds: createRateBounds(n),
    scaling: { scale: 1, secondaryScale: 1 },
    saturation: null,
    motionTwists: new Float64Array(TWIST_SIZE * chain.motions.length),
    slopes: {
      pulls: new Float64Array(TWIST_SIZE * n),
      pull: new Float64Array(TWIST_SIZE),
      turnedAlong: new Float64Array(LINEAR_COMPONENTS),
      carriedBefore: new Float64Array(LINEAR_COMPONENTS),
    },
    ahead: null,
  }
}
