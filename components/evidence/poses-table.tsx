import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { TextLink } from '@/components/ui/text-link'
import type { ReferencePosesResult } from '@/lib/contract/reference-poses'
import { StatedQuantity, statedUnit } from './stated-quantity'
import { Verdict } from './verdict'

interface PosesTableProps {
  readonly result: Pick<ReferencePosesResult, 'rows' | 'units'>
  /** For each row the address of the sheet drawn there; none before the set is stored. */
  readonly hrefs?: readonly string[]
}

/** Every measured pose with how far the model is from it. */
export function PosesTable({ result: { rows, units }, hrefs }: PosesTableProps) {
  return (
    <Table caption="Residuals by row">
      <thead>
        <tr>
          <Th>Row</Th>
          <Th align="right">Measured x, y, z, {statedUnit('length', units)}</Th>
          <Th align="right">Position error, {statedUnit('length', units)}</Th>
          <Th align="right">Orientation error, {statedUnit('angle', units)}</Th>
          <Th>Joints</Th>
          <Th>Verdict</Th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ row, measured, positionError, orientationError, withinLimits, passed }, i) => (
          <tr key={row}>
            <RowHead className="num">
              {hrefs === undefined ? (
                row
              ) : (
                <TextLink href={hrefs[i]!} className="-my-2 inline-block px-1 py-2" aria-label={`Row ${row}, on the sheet`}>
                  {row}
                </TextLink>
              )}
            </RowHead>
            <Td align="right">
              <span className="inline-flex gap-3">
                {measured.position.map((value, place) => (
                  <StatedQuantity key={place} value={value} kind="length" units={units} withUnit={false} />
                ))}
              </span>
            </Td>
            <Td align="right">
              <StatedQuantity value={positionError} kind="length" units={units} withUnit={false} />
            </Td>
            <Td align="right">
              <StatedQuantity value={orientationError} kind="angle" units={units} withUnit={false} />
            </Td>
            <Td className={withinLimits ? 'text-soft' : 'font-semibold text-amber'}>{withinLimits ? 'within limits' : 'outside limits'}</Td>
            <Td>
              <Verdict passed={passed} />
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  )
}
