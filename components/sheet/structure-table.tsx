'use client'

import { useVirtualizer } from '@tanstack/react-virtual'
import { useMemo, useRef } from 'react'
import { UnitOf } from '@/components/ui/quantity'
import { Th } from '@/components/ui/table'
import type { Joint } from '@/lib/contract/description'
import { StructureCells } from './structure-cells'
import { structureRows } from './structure-rows'

const ROW_HEIGHT_PX = 33
/** Smaller trees are simply there, and so are printed and found by the browser's search. */
const MOST_PLAIN = 150

interface StructureTableProps {
  readonly rootLink: string
  readonly joints: readonly Joint[]
}

/** Every link of the tree under its parent, with the joint that carries it. Thousands scroll inside a box. */
export function StructureTable({ rootLink, joints }: StructureTableProps) {
  const rows = useMemo(() => structureRows(rootLink, joints), [rootLink, joints])
  const isLong = rows.length > MOST_PLAIN
  const scroller = useRef<HTMLDivElement>(null)
  const virtual = useVirtualizer({
    count: isLong ? rows.length : 0,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT_PX,
    overscan: 20,
    initialRect: { width: 800, height: 600 },
  })
  const items = virtual.getVirtualItems()
  const before = items[0]?.start ?? 0
  const after = virtual.getTotalSize() - (items.at(-1)?.end ?? 0)
  const shown = isLong ? items.map((item) => ({ row: rows[item.index]!, index: item.index })) : rows.map((row, index) => ({ row, index }))

  return (
    <div
      ref={scroller}
      tabIndex={0}
      role="region"
      aria-label="Links and joints"
      className={isLong ? 'max-h-[70vh] overflow-auto overscroll-x-contain border border-soft' : 'scroll-x'}
    >
      <table className="w-full border-collapse" aria-rowcount={rows.length + 1}>
        <caption className="sr-only">Links from the root, each with the joint that carries it</caption>
        <thead className="sticky top-0 bg-page">
          <tr aria-rowindex={1}>
            <Th>Link</Th>
            <Th>Joint</Th>
            <Th>Type</Th>
            <Th align="right">
              Origin x, y, z, <UnitOf kind="length" />
            </Th>
            <Th align="right">
              Roll, pitch, yaw, <UnitOf kind="angle" />
            </Th>
            <Th align="right">Axis</Th>
            <Th align="right">Lower</Th>
            <Th align="right">Upper</Th>
            <Th align="right">Rate</Th>
            <Th align="right">Effort</Th>
            <Th>Follows</Th>
          </tr>
        </thead>
        <tbody>
          <Gap height={before} />
          {shown.map(({ row, index }) => (
            <tr key={row.link} aria-rowindex={index + 2} className="hover:bg-wash">
              <StructureCells row={row} />
            </tr>
          ))}
          <Gap height={after} />
        </tbody>
      </table>
    </div>
  )
}

/** Stands for the rows that are not drawn. */
function Gap({ height }: { readonly height: number }) {
  return height > 0 ? (
    <tr aria-hidden>
      <td colSpan={11} style={{ height, padding: 0 }} />
    </tr>
  ) : null
}
