import type { Chain } from '@/lib/kinematics/chain'
import type { Vector } from './vector'

/** Where an orthographic drawing is seen from, rad. azimuth turns the base about its z axis; elevation looks down on it. */
export interface View {
  readonly azimuth: number
  readonly elevation: number
}

const FROM_THE_SIDE: View = { azimuth: -0.5, elevation: 0.3 }
const FROM_ABOVE: View = { azimuth: -0.35, elevation: 0.95 }

/** From the side, and from above for a chain that only turns about upright axes: from the side it would be a line. */
export function defaultView(chain: Chain): View {
  const isPlan = chain.motions.length > 0 && chain.motions.every((motion) => motion.rotary && Math.abs(motion.axis[2]) > 0.99)
  return isPlan ? FROM_ABOVE : FROM_THE_SIDE
}

/** A point in the plane of the drawing, in m: right, down, and how near it is to the eye. */
export interface Seen {
  readonly x: number
  readonly y: number
  readonly near: number
}

/** Projects points of the base frame, z up. */
export function projection({ azimuth, elevation }: View): (point: Vector) => Seen {
  const ca = Math.cos(azimuth)
  const sa = Math.sin(azimuth)
  const ce = Math.cos(elevation)
  const se = Math.sin(elevation)
  return ([x, y, z]) => {
    const away = x * sa + y * ca
    return { x: x * ca - y * sa, y: -(z * ce + away * se), near: z * se - away * ce }
  }
}
