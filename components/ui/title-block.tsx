import clsx from 'clsx'
import type { ReactNode } from 'react'

/** The title block of a sheet: ruled cells in three columns. */
export function TitleBlock({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <div role="group" aria-label={label}>
      <dl className="grid grid-cols-6 gap-px border-t-2 border-ink bg-ink">{children}</dl>
    </div>
  )
}

interface TitleCellProps {
  readonly label: string
  /** Sixths of the width: 2 is a third. On a phone a third becomes a half. */
  readonly span?: 2 | 3 | 4 | 6
  readonly className?: string
  readonly children: ReactNode
}

const SPANS = { 2: 'col-span-3 tablet:col-span-2', 3: 'col-span-3', 4: 'col-span-6 tablet:col-span-4', 6: 'col-span-6' } as const

/** One ruled cell with its small label. */
export function TitleCell({ label, span = 2, className, children }: TitleCellProps) {
  return (
    <div className={clsx('min-h-12 bg-sheet px-2.5 pt-1 pb-2', SPANS[span], className)}>
      <dt className="label">{label}</dt>
      <dd className="font-semibold">{children}</dd>
    </div>
  )
}
