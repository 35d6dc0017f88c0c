import { useId, type ReactNode } from 'react'

interface DeskSectionProps {
  readonly title: string
  readonly count: number
  /** Shows the count; not for lists that simply end somewhere. */
  readonly showsCount?: boolean
  /** Said when nothing waits here: what would. */
  readonly empty: ReactNode
  readonly children: ReactNode
}

/** One kind of thing that waits. */
export function DeskSection({ title, count, showsCount = true, empty, children }: DeskSectionProps) {
  const id = useId()
  return (
    <section aria-labelledby={id} className="min-w-0">
      <div className="flex items-baseline justify-between gap-4 border-b border-ink px-2 pb-1.5">
        <h2 id={id}>{title}</h2>
        {showsCount ? <span className="num text-soft">{count}</span> : null}
      </div>
      {count === 0 ? <p className="px-2 py-3 text-soft">{empty}</p> : <ul>{children}</ul>}
    </section>
  )
}
