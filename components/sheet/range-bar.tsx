import type { ChainJoint } from '@/lib/kinematics/chain'
import { rangeSpan } from './range-span'

interface RangeBarProps {
  readonly joint: Pick<ChainJoint, 'type' | 'lower' | 'upper'>
  /** The value drawn, as a tick. */
  readonly value?: number | undefined
}

const WIDTH = 64

/** Where a joint's range lies: in one turn for angles, in its own way for slides. The numbers stand beside it. */
export function RangeBar({ joint, value }: RangeBarProps) {
  const span = rangeSpan(joint)
  if (span === null) return <span className="label">{joint.lower === null && joint.upper === null ? 'endless' : 'one-sided'}</span>
  const { from, to, place } = span
  return (
    <svg aria-hidden width={WIDTH + 2} height={12} viewBox={`-1 0 ${WIDTH + 2} 12`} className="inline-block shrink-0 align-middle">
      <rect x={0} y={2.5} width={WIDTH} height={7} fill="none" stroke="var(--soft)" />
      <rect x={0.5 + from * (WIDTH - 1)} y={3} width={Math.max(1, (to - from) * (WIDTH - 1))} height={6} fill="var(--hair)" />
      {value === undefined ? null : <path d={`M${(place(value) * WIDTH).toFixed(1)} 0V12`} stroke="var(--blue)" strokeWidth={2} />}
    </svg>
  )
}
