'use client'

import clsx from 'clsx'
import { UnitOf } from '@/components/ui/quantity'
import { Th } from '@/components/ui/table'
import { useUnits } from '@/components/ui/units-context'
import { JointRowCells, WIDE_ONLY } from './joint-row-cells'
import type { JointRow } from './joint-rows'
import { RowGap, useRowWindow } from './row-window'

interface JointsTableProps {
  readonly rows: readonly JointRow[]
  /** The configuration drawn beside the table, SI. */
  readonly drawn?: readonly number[]
}

const COLUMNS = 6

/** Joints of a chain from base to tip, with their limits in the units chosen. Where turns and slides stand in one table,
 *  each number carries its unit; else the head does. */
export function JointsTable({ rows, drawn }: JointsTableProps) {
  const { units } = useUnits()
  const { scroller, isLong, indices, before, after } = useRowWindow(rows.length)
  if (rows.length === 0) return <p className="text-soft">Nothing moves between base and tip.</p>
  const slides = rows.filter((row) => row.type === 'prismatic').length
  const isMixed = slides > 0 && slides < rows.length
  const kind = slides > 0 ? 'length' : 'angle'
  const unit = isMixed ? null : (
    <>
      , <UnitOf kind={kind} />
    </>
  )
  const rateUnit = isMixed ? null : (
    <>
      , <UnitOf kind={`${kind}-rate`} />
    </>
  )
  return (
    <div
      ref={scroller}
      tabIndex={0}
      role="group"
      aria-label="Joints, base to tip"
      className={clsx('relative', isLong ? 'max-h-[28rem] overflow-auto border border-soft' : 'scroll-x')}
    >
      <table className="w-full border-collapse [&_td]:px-1.5 [&_th]:px-1.5" aria-rowcount={rows.length + 1}>
        <caption className="sr-only">Joints, base to tip</caption>
        <thead className={isLong ? 'sticky top-0 z-10 bg-sheet' : undefined}>
          <tr aria-rowindex={1}>
            <Th>Joint</Th>
            <Th className={WIDE_ONLY}>Type</Th>
            <Th align="right">Lower{unit}</Th>
            <Th align="right">Upper{unit}</Th>
            <Th align="right">Rate{rateUnit}</Th>
            <Th className={WIDE_ONLY}>Range</Th>
          </tr>
        </thead>
        <tbody>
          <RowGap height={before} columns={COLUMNS} />
          {indices.map((index) => (
            <tr key={rows[index]!.name} aria-rowindex={index + 2}>
              <JointRowCells row={rows[index]!} length={units.length} withUnits={isMixed} drawn={drawn?.[index]} />
            </tr>
          ))}
          <RowGap height={after} columns={COLUMNS} />
        </tbody>
      </table>
    </div>
  )
}
