/** What there is to say about an answer. */
export type DiagnosisCode =
  | 'direction-lost'
  | 'near-singular'
  | 'rate-limited'
  | 'secondary-starved'
  | 'at-limit'
  | 'outside-limits'
  | 'gain-too-high'

/** One thing that a person should know about an answer. */
export interface Diagnosis {
  readonly code: DiagnosisCode
  /** A sentence for whoever stands at the arm. */
  readonly detail: string
  /** direction-lost: unit, 6 numbers in the task's frame, signed by the canonical rule. */
  readonly direction?: number[]
  /** direction-lost: whether no pose of the chain has it. */
  readonly structural?: boolean
  /** direction-lost: whether the secondary motion of this answer is bringing it within reach. */
  readonly freed?: boolean
  /** direction-lost, not freed: n joint values (rad or m) that a posture objective could lead to, and that bring the direction back. */
  readonly suggestion?: number[]
  readonly joint?: string
}

/** The finished numbers that a diagnosis looks at. */
export interface Finished {
  readonly rates: readonly number[]
  readonly secondaryRates: readonly number[]
  readonly scale: number
  readonly secondaryScale: number
  readonly saturated: readonly string[]
  readonly residual: readonly number[]
  readonly singularValues: readonly number[]
  readonly rank: number
  readonly nullity: number
  readonly damping: number
  /** See RateRecord. */
  readonly easy: boolean
}
