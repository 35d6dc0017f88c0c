'use client'

import { JointType } from '@/components/ui/joint-type'
import { Mark } from '@/components/ui/marks'
import { Quantity, UnitOf } from '@/components/ui/quantity'
import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { useUnits } from '@/components/ui/units-context'
import type { JointRow } from './joint-rows'
import { RangeBar } from './range-bar'

/** Limits are written to a tenth of a millimetre; files give no more. */
const LENGTH_DIGITS = { mm: 1, m: 4 } as const
/** On a phone the limits have the width; the type stands as a mark beside the name. */
const WIDE_ONLY = 'max-tablet:hidden print:table-cell'

interface JointsTableProps {
  readonly rows: readonly JointRow[]
  /** The configuration drawn beside the table, SI. */
  readonly drawn?: readonly number[]
}

/** Joints of a chain from base to tip, with their limits in the units chosen. */
export function JointsTable({ rows, drawn }: JointsTableProps) {
  const { units } = useUnits()
  const slides = rows.filter((row) => row.type === 'prismatic').length
  // Where turns and slides stand in one table, each number carries its unit; else the head does.
  const isMixed = slides > 0 && slides < rows.length
  const kind = slides > 0 ? 'length' : 'angle'
  const unit = isMixed ? null : <UnitOf kind={kind} />
  const rateUnit = isMixed ? null : <UnitOf kind={`${kind}-rate`} />
  if (rows.length === 0) return <p className="text-soft">Nothing moves between base and tip.</p>
  return (
    <Table caption="Joints, base to tip" className="[&_td]:px-1.5 [&_th]:px-1.5">
      <thead>
        <tr>
          <Th>Joint</Th>
          <Th className={WIDE_ONLY}>Type</Th>
          <Th align="right">Lower{unit === null ? null : <>, {unit}</>}</Th>
          <Th align="right">Upper{unit === null ? null : <>, {unit}</>}</Th>
          <Th align="right">Rate{rateUnit === null ? null : <>, {rateUnit}</>}</Th>
          <Th className={WIDE_ONLY}>Range</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row, i) => {
          const own = row.type === 'prismatic' ? 'length' : 'angle'
          const digits = own === 'length' ? LENGTH_DIGITS[units.length] : undefined
          return (
            <tr key={row.name}>
              <RowHead className="num max-w-44 min-w-24 break-words">
                <span className="mr-1.5 tablet:hidden print:hidden">
                  <Mark name={row.type} className="inline size-3.5 text-soft" />
                  <span className="sr-only">{row.type}</span>
                </span>
                <bdi>{row.name}</bdi>
                {row.warnings.length === 0 ? null : (
                  <span className="ml-1.5 inline-block text-amber" title={row.warnings.join(', ')}>
                    <Mark name="warning" className="inline size-3" />
                    <span className="sr-only">has a warning: {row.warnings.join(', ')}</span>
                  </span>
                )}
              </RowHead>
              <Td className={WIDE_ONLY}>
                <JointType type={row.type} />
              </Td>
              <Td align="right">
                <Quantity value={row.lower} kind={own} digits={digits} withUnit={isMixed && row.lower !== null} />
              </Td>
              <Td align="right">
                <Quantity value={row.upper} kind={own} digits={digits} withUnit={isMixed && row.upper !== null} />
              </Td>
              <Td align="right">
                {row.rate === null ? <span className="label">unknown</span> : <Quantity value={row.rate} kind={`${own}-rate`} withUnit={isMixed} />}
              </Td>
              <Td className={WIDE_ONLY}>
                <RangeBar joint={row} value={drawn?.[i]} />
              </Td>
            </tr>
          )
        })}
      </tbody>
    </Table>
  )
}
