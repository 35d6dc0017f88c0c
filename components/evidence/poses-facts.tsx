import type { ReactNode } from 'react'
import { formatSignificant } from '@/components/ui/format-number'
import type { ReferencePosesResult } from '@/lib/contract/reference-poses'
import { ROTATION_CONVENTIONS } from '@/lib/contract/rotation-conventions'
import { StatedQuantity } from './stated-quantity'

type Statement = Pick<ReferencePosesResult, 'chain' | 'units' | 'rotation' | 'tool' | 'tolerance' | 'decimalMark'>

/** How the numbers of a set are to be read: everything that was stated with them. */
export function PosesFacts({ statement: { chain, units, rotation, tool, tolerance, decimalMark } }: { readonly statement: Statement }) {
  const convention = ROTATION_CONVENTIONS[rotation]
  const facts: readonly (readonly [label: string, fact: ReactNode])[] = [
    [
      'Chain',
      <span key="chain" className="num break-all">
        <bdi>{chain.base}</bdi> to <bdi>{chain.tip}</bdi>
      </span>,
    ],
    ['Units of the table', `${units.length}, ${units.angle}; decimal ${decimalMark === '.' ? 'point' : 'comma'}`],
    [
      'Orientation',
      <span key="rotation">
        {convention.label}. <span className="text-soft">{convention.meaning}</span>
      </span>,
    ],
    [
      'Measured at',
      tool === null ? (
        'the tip link'
      ) : (
        <span key="tool" className="num">
          {tool.position.map((value) => formatSignificant(value, 6)).join(', ')} {units.length}; {tool.quaternion.map((value) => formatSignificant(value, 6)).join(', ')} from the tip link
        </span>
      ),
    ],
    [
      'Tolerance',
      <span key="tolerance">
        <StatedQuantity value={tolerance.position} kind="length" units={units} /> and <StatedQuantity value={tolerance.orientation} kind="angle" units={units} />
      </span>,
    ],
  ]
  return (
    <dl className="grid gap-x-6 gap-y-2 tablet:grid-cols-[9rem_minmax(0,1fr)]">
      {facts.map(([label, fact]) => (
        <div key={label} className="contents">
          <dt className="label">{label}</dt>
          <dd className="min-w-0">{fact}</dd>
        </div>
      ))}
    </dl>
  )
}
