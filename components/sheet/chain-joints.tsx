'use client'

import { UnitSwitch } from '@/components/ui/unit-switch'
import type { JointRow } from './joint-rows'
import { JointsTable } from './joints-table'
import { useDrawnConfiguration } from './use-drawn-configuration'

interface ChainJointsProps {
  readonly rows: readonly JointRow[]
  readonly resting: readonly number[]
}

/** The limits table of the chain on a sheet, with the value drawn as a tick in each range. */
export function ChainJoints({ rows, resting }: ChainJointsProps) {
  const { q } = useDrawnConfiguration(rows, resting)
  return (
    <section aria-labelledby="sheet-joints">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-joints">Joints, base to tip</h2>
        <span data-screen-only>
          <UnitSwitch />
        </span>
      </div>
      <JointsTable rows={rows} drawn={q} />
    </section>
  )
}
