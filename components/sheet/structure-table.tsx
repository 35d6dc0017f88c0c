'use client'

import clsx from 'clsx'
import { useMemo } from 'react'
import { UnitOf } from '@/components/ui/quantity'
import { Th } from '@/components/ui/table'
import type { Joint } from '@/lib/contract/description'
import { RowGap, useRowWindow } from './row-window'
import { StructureCells } from './structure-cells'
import { structureRows } from './structure-rows'

interface StructureTableProps {
  readonly rootLink: string
  readonly joints: readonly Joint[]
}

const COLUMNS = 11

/** Every link of the tree under its parent, with the joint that carries it. Thousands scroll inside a box. */
export function StructureTable({ rootLink, joints }: StructureTableProps) {
  const rows = useMemo(() => structureRows(rootLink, joints), [rootLink, joints])
  const { scroller, isLong, indices, before, after } = useRowWindow(rows.length)
  return (
    <div
      ref={scroller}
      tabIndex={0}
      role="group"
      aria-label="Links and joints"
      className={clsx('relative print:[zoom:0.72]', isLong ? 'max-h-[70vh] overflow-auto overscroll-x-contain border border-soft' : 'scroll-x')}
    >
      <table className="w-full border-collapse" aria-rowcount={rows.length + 1}>
        <caption className="sr-only">Links from the root, each with the joint that carries it</caption>
        <thead className={isLong ? 'sticky top-0 z-10 bg-page' : undefined}>
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
          <RowGap height={before} columns={COLUMNS} />
          {indices.map((index) => (
            <tr key={rows[index]!.link} aria-rowindex={index + 2} className="hover:bg-wash">
              <StructureCells row={rows[index]!} />
            </tr>
          ))}
          <RowGap height={after} columns={COLUMNS} />
        </tbody>
      </table>
    </div>
  )
}
