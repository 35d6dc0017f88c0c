import type { ChainJoint } from '@/lib/kinematics/chain'

/** The width that a range bar stands for: one turn, from −π to π, for angles; for a slide its own way with zero in it. */
export interface RangeSpan {
  /** Where the range begins and ends within the bar, 0 to 1. */
  readonly from: number
  readonly to: number
  /** Where a value stands within the bar, held at its ends. */
  readonly place: (value: number) => number
}

/** null where there is no range to draw: an endless or one-sided joint. */
export function rangeSpan({ type, lower, upper }: Pick<ChainJoint, 'type' | 'lower' | 'upper'>): RangeSpan | null {
  if (lower === null || upper === null) return null
  const [least, most] = type === 'prismatic' ? [Math.min(0, lower), Math.max(0, upper)] : [-Math.PI, Math.PI]
  const width = most - least
  const place = (value: number) => (width > 0 ? Math.min(1, Math.max(0, (value - least) / width)) : 0.5)
  return { from: place(lower), to: place(upper), place }
}
