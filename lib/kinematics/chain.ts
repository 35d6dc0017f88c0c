/** The kinds of joint that move: what ISO 8373 calls rotary and prismatic, with URDF's names. */
export type JointKind = 'revolute' | 'continuous' | 'prismatic'

/** An independent joint of a chain: one coordinate of a configuration.
 *  lower, upper in rad or m; rate in rad/s or m/s; null = unbounded or unknown. */
export interface ChainJoint {
  readonly name: string
  readonly type: JointKind
  readonly lower: number | null
  readonly upper: number | null
  readonly rate: number | null
}

/** One moving joint met on the way from base to tip. It turns about or slides along `axis` (unit, in the frame reached
 *  so far) by `multiplier * q[joint] + offset`. A mimic joint is a motion of the joint it follows; a joint passed from
 *  child to parent has its axis negated, so that every motion reads base to tip. */
export interface Motion {
  /** Name of the URDF joint, which for a mimic joint is not the independent one. */
  readonly name: string
  /** Link reached by this motion, in the direction base to tip. */
  readonly link: string
  readonly rotary: boolean
  readonly axis: readonly [number, number, number]
  /** Index into `joints`. */
  readonly joint: number
  readonly multiplier: number
  readonly offset: number
}

/** A kinematic chain from a base link to a tip link, ready to compute with: plain data, frozen, fit for JSON.
 *  baseFromTip(q) = constants[0] · motion[0](q) · constants[1] · … · motion[m-1](q) · constants[m].
 *  constants: m + 1 rigid transforms as row-major 3 x 4 (12 numbers each: r11 r12 r13 px, r21 …), in m;
 *  fixed joints are folded into them. */
export interface Chain {
  readonly base: string
  readonly tip: string
  /** Independent joints, in the order of the configuration. */
  readonly joints: readonly ChainJoint[]
  readonly motions: readonly Motion[]
  readonly constants: readonly (readonly number[])[]
}
