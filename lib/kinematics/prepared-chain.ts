import { axisFrame } from '@/lib/math/axis-frame'
import { norm } from '@/lib/math/norm'
import { FIRST_STEP, STEP_SIZE } from '@/lib/math/place-axes'
import { identityTransform, invertTransform, multiplyTransforms, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import { stepBetweenAxes } from '@/lib/math/step-between-axes'
import type { Chain } from './chain'

/** The numeric form of a chain: flat arrays, one entry a motion. Its frames are laid so that each motion is about or along its own z,
 *  and that from one to the next there is only a shift and a turn about x (see placeAxes). Turns about z that the description has
 *  in between belong to the motions: whole quarter turns, which are exact, and what is left of them. */
export interface PreparedChain {
  /** What placeAxes needs to know: the transforms to the first motion and from the last one to the tip, and a step for each motion. */
  readonly constants: Float64Array
  /** 1 turns, 0 slides. */
  readonly rotary: Uint8Array
  /** The coordinate that a motion follows. */
  readonly joint: Int32Array
  readonly multiplier: Float64Array
  /** rad or m; of a turn with the rest of the turn about z that belongs to its placement. */
  readonly offset: Float64Array
  readonly quarters: Int32Array
  /** rad, what each motion turns by at 0: a slide too turns by the rest of its placement, and no more. */
  readonly rest: Float64Array
  /** Of each coordinate: 1 where it may go round and round. */
  readonly continuous: Uint8Array
  /** Of each coordinate, rad/s or m/s; Infinity where it is not known. */
  readonly rate: Float64Array
  /** Whether there is one motion for each coordinate, in order, with multiplier 1: then no column of a Jacobian is a sum. */
  readonly plain: boolean
  /** Plain, and each motion a turn by its coordinate and whole quarters: then the configuration is what they turn by. */
  readonly turning: boolean
}

/** A turn that is this near to whole quarters (rad) is meant to be whole. */
const WHOLE = 4 * Number.EPSILON
const QUARTER = Math.PI / 2

/** Prepares a chain for computing. Axes are divided by their norm once more, because the description keeps them rounded to 1e-12. */
export function prepareChain(chain: Chain): PreparedChain {
  const { motions } = chain
  const count = motions.length
  if (chain.constants.length !== count + 1) throw new RangeError('a chain needs one constant more than it has motions')
  const upright = uprightConstants(chain)
  const constants = new Float64Array(FIRST_STEP + STEP_SIZE * count)
  constants.set(upright[0]!)
  constants.set(count === 0 ? identityTransform() : upright[count]!, TRANSFORM_SIZE)
  const quarters = new Int32Array(count)
  const rest = new Float64Array(count)
  const addTurn = (motion: number, angle: number): void => {
    const whole = Math.round(angle / QUARTER)
    const left = angle - whole * QUARTER
    quarters[motion]! += whole
    if (Math.abs(left) > WHOLE) rest[motion]! += left
  }
  for (let i = 0; i < count; i++) {
    // The first motion stands where its own placement puts it.
    if (i === 0) constants[FIRST_STEP] = 1
    else {
      const { first, last } = stepBetweenAxes(upright[i]!, constants, FIRST_STEP + STEP_SIZE * i)
      addTurn(i - 1, first)
      addTurn(i, last)
    }
  }
  const plain = count === chain.joints.length && motions.every(({ joint, multiplier }, i) => joint === i && multiplier === 1)
  return {
    constants,
    rotary: Uint8Array.from(motions, (motion) => (motion.rotary ? 1 : 0)),
    joint: Int32Array.from(motions, (motion) => motion.joint),
    multiplier: Float64Array.from(motions, (motion) => motion.multiplier),
    offset: Float64Array.from(motions, (motion, i) => (motion.rotary ? motion.offset + rest[i]! : motion.offset)),
    quarters,
    rest,
    continuous: Uint8Array.from(chain.joints, ({ type }) => (type === 'continuous' ? 1 : 0)),
    rate: Float64Array.from(chain.joints, ({ rate }) => (rate !== null && rate > 0 ? rate : Number.POSITIVE_INFINITY)),
    plain,
    turning: plain && motions.every(({ rotary, offset }, i) => rotary && offset === 0 && rest[i] === 0),
  }
}

/** The constants of a chain between frames whose z is each motion's axis. */
function uprightConstants(chain: Chain): Float64Array[] {
  const frame = identityTransform()
  const frameInverse = identityTransform()
  const axis = new Float64Array(3)
  return chain.constants.map((constant, i) => {
    const upright = new Float64Array(TRANSFORM_SIZE)
    invertTransform(frame, frameInverse)
    multiplyTransforms(frameInverse, 0, constant, 0, upright, 0)
    frame.set(identityTransform())
    const motion = chain.motions[i]
    if (motion !== undefined) {
      const length = norm(motion.axis)
      if (!(length > 0)) throw new RangeError(`motion '${motion.name}' has no axis`)
      motion.axis.forEach((part, k) => {
        axis[k] = part / length
      })
      axisFrame(axis, frame)
    }
    multiplyTransforms(upright, 0, frame, 0, upright, 0)
    return upright
  })
}
