import { JointType } from '@/components/ui/joint-type'
import { Mark } from '@/components/ui/marks'
import { Quantity } from '@/components/ui/quantity'
import { RowHead, Td } from '@/components/ui/table'
import type { LengthUnit } from '@/lib/units'
import type { JointRow } from './joint-rows'
import { RangeBar } from './range-bar'

/** On a phone the limits have the width; the type stands as a mark beside the name. */
export const WIDE_ONLY = 'max-tablet:hidden print:table-cell'

/** Limits are written to a tenth of a millimetre; files give no more. */
const LENGTH_DIGITS = { mm: 1, m: 4 } as const

interface JointRowCellsProps {
  readonly row: JointRow
  readonly length: LengthUnit
  /** Each number carries its unit, because turns and slides stand in one table. */
  readonly withUnits: boolean
  /** The value drawn, SI. */
  readonly drawn: number | undefined
}

/** The cells of one joint in the limits table. */
export function JointRowCells({ row, length, withUnits, drawn }: JointRowCellsProps) {
  const { name, type, lower, upper, rate, warnings } = row
  const kind = type === 'prismatic' ? 'length' : 'angle'
  const digits = kind === 'length' ? LENGTH_DIGITS[length] : undefined
  return (
    <>
      <RowHead className="num max-w-44 min-w-32 break-words tablet:min-w-24">
        <span className="mr-1.5 tablet:hidden print:hidden">
          <Mark name={type} className="inline size-3.5 text-soft" />
          <span className="sr-only">{type}</span>
        </span>
        <bdi>{name}</bdi>
        {warnings.length === 0 ? null : (
          <span className="ml-1.5 inline-block text-amber" title={warnings.join(', ')}>
            <Mark name="warning" className="inline size-3" />
            <span className="sr-only">has a warning: {warnings.join(', ')}</span>
          </span>
        )}
      </RowHead>
      <Td className={WIDE_ONLY}>
        <JointType type={type} />
      </Td>
      <Td align="right">
        <Quantity value={lower} kind={kind} digits={digits} withUnit={withUnits && lower !== null} />
      </Td>
      <Td align="right">
        <Quantity value={upper} kind={kind} digits={digits} withUnit={withUnits && upper !== null} />
      </Td>
      <Td align="right">
        {rate === null ? <span className="label">unknown</span> : <Quantity value={rate} kind={`${kind}-rate`} withUnit={withUnits} />}
      </Td>
      <Td className={WIDE_ONLY}>
        <RangeBar joint={row} value={drawn} />
      </Td>
    </>
  )
}
