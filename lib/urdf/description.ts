import type { Severity } from '@/lib/urdf/rule'
import type { RuleId } from '@/lib/urdf/rules'

/** A robot description as the importer understood it: SI units, defaults applied, plain data, fit for JSON.
 *  Order is the file's; nothing may depend on it (see fingerprint.ts and default-chain.ts). */
export interface Description {
  readonly version: '1.0' | '1.1' | '1.2'
  /** The `name` of the robot element; empty when the file gives none. */
  readonly robotName: string
  readonly root: string
  readonly links: readonly DescribedLink[]
  readonly joints: readonly DescribedJoint[]
}

export interface DescribedLink {
  readonly name: string
  /** `filename` of each mesh of this link, visual and collision, as written. */
  readonly meshes: readonly string[]
}

export type JointType = 'revolute' | 'continuous' | 'prismatic' | 'fixed' | 'floating' | 'planar'

export type Triple = readonly [number, number, number]
export type Quadruple = readonly [number, number, number, number]

/** Where the joint frame stands in the parent link's frame. The rotation stays as the file gives it, because the
 *  fingerprint must not depend on a machine's trigonometry. rpy: fixed axes x, y, z in rad (R = Rz·Ry·Rx). */
export type Origin =
  | { readonly xyz: Triple; readonly rpy: Triple }
  | { readonly xyz: Triple; readonly quaternion: Quadruple }

export interface DescribedJoint {
  readonly name: string
  readonly type: JointType
  readonly parent: string
  readonly child: string
  readonly origin: Origin
  /** Unit, rounded to 1e-12, in the joint frame; [0, 0, 0] on a fixed or floating joint, the normal of the plane on a planar one. */
  readonly axis: Triple
  /** rad or m; null = unbounded. */
  readonly lower: number | null
  readonly upper: number | null
  /** rad/s or m/s; null = unknown (missing, zero or negative in the file). */
  readonly rate: number | null
  /** Nm or N; null = unknown. */
  readonly effort: number | null
  readonly acceleration: number | null
  readonly deceleration: number | null
  readonly jerk: number | null
  readonly mimic: { readonly joint: string; readonly multiplier: number; readonly offset: number } | null
}

export type { Severity }

/** One thing the importer has to say about a file. line and column count from 1, in characters (code points). */
export interface Finding {
  readonly rule: RuleId
  readonly severity: Severity
  /** What is there and what follows from it, with the values met. */
  readonly message: string
  readonly remedy: string
  readonly line: number
  readonly column: number
  /** Such as "joint 'wrist'"; left out when the finding is about the file. */
  readonly element?: string
}
