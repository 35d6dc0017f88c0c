import { axisFrame } from '@/lib/math/axis-frame'
import { norm } from '@/lib/math/norm'
import { identityTransform, invertTransform, multiplyTransforms, TRANSFORM_SIZE } from '@/lib/math/rigid-transform'
import type { Chain } from './chain'

/** The numeric form of a chain: flat arrays, one entry a motion. Each constant is turned so that every motion is about or along
 *  the z axis of the frame reached: baseFromTip = constant[0] · Z(0) · constant[1] · Z(1) · … · constant[m]. */
export interface PreparedChain {
  /** m + 1 transforms of 12 numbers. */
  readonly constants: Float64Array
  /** 1 turns, 0 slides. */
  readonly rotary: Uint8Array
  /** The coordinate that a motion follows. */
  readonly joint: Int32Array
  readonly multiplier: Float64Array
  readonly offset: Float64Array
}

/** Prepares a chain for computing. Axes are divided by their norm once more, because the description keeps them rounded to 1e-12. */
export function prepareChain(chain: Chain): PreparedChain {
  const count = chain.motions.length
  if (chain.constants.length !== count + 1) throw new RangeError('a chain needs one constant more than it has motions')
  const constants = new Float64Array(TRANSFORM_SIZE * (count + 1))
  const frame = identityTransform()
  const frameInverse = identityTransform()
  const turned = identityTransform()
  const axis = new Float64Array(3)
  for (let i = 0; i <= count; i++) {
    invertTransform(frame, frameInverse)
    multiplyTransforms(frameInverse, 0, chain.constants[i]!, 0, turned, 0)
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
    multiplyTransforms(turned, 0, frame, 0, constants, TRANSFORM_SIZE * i)
  }
  return {
    constants,
    rotary: Uint8Array.from(chain.motions, (motion) => (motion.rotary ? 1 : 0)),
    joint: Int32Array.from(chain.motions, (motion) => motion.joint),
    multiplier: Float64Array.from(chain.motions, (motion) => motion.multiplier),
    offset: Float64Array.from(chain.motions, (motion) => motion.offset),
  }
}
