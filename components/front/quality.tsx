import { formatSignificant } from '@/components/ui/format-number'
import { NEAR_SINGULAR } from '@/lib/kinematics/measures'
import { degFromRad } from '@/lib/units'
import type { BenchReading } from './bench-reading'

/** The measures of a pose in words and numbers. */
export function Quality({ reading }: { readonly reading: BenchReading }) {
  const { manipulability, conditionNumber, rank, nearestLimit, singularValues } = reading
  const isNear = (singularValues.at(-1) ?? 0) < NEAR_SINGULAR
  const facts = [
    ['Manipulability', formatSignificant(manipulability, 3)],
    ['Condition number', formatSignificant(conditionNumber, 3)],
    ['Rank', `${rank} of 6`],
    ['Nearest limit', nearestLimit === null ? 'none' : `${nearestLimit.joint}, ${degFromRad(nearestLimit.left).toFixed(1)}°`],
  ] as const
  return (
    <div>
      <h2>Quality</h2>
      <dl>
        {facts.map(([name, value]) => (
          <div key={name} className="flex justify-between border-b border-hair py-0.5">
            <dt>{name}</dt>
            <dd className="num">{value}</dd>
          </div>
        ))}
      </dl>
      <p role="status" className="label pt-1 text-amber">
        {isNear ? 'Near-singular: one direction of the tool is nearly lost.' : ''}
      </p>
    </div>
  )
}
