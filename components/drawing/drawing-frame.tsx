import clsx from 'clsx'
import type { ReactNode } from 'react'

const LETTERS = ['A', 'B', 'C', 'D'] as const

interface DrawingFrameProps {
  /** How many zones a side has. */
  readonly rows?: number
  readonly columns?: number
  /** Stands in the lower left corner, such as the chain and the caution. */
  readonly foot?: ReactNode
  readonly className?: string
  readonly children: ReactNode
}

/** The drawing field of a sheet with its zones, letters down the side and numbers along the top. */
export function DrawingFrame({ rows = 3, columns = 3, foot, className, children }: DrawingFrameProps) {
  const middle = (place: number, count: number) => `${(100 * (place + 0.5)) / count}%`
  return (
    <div className={clsx('relative flex flex-col justify-end overflow-hidden', className)}>
      {LETTERS.slice(0, rows).map((letter, row) => (
        <span key={letter} aria-hidden className="num absolute left-2 -translate-y-1/2 text-12 font-bold text-soft" style={{ top: middle(row, rows) }}>
          {letter}
        </span>
      ))}
      {Array.from({ length: columns }, (_, column) => (
        <span key={column} aria-hidden className="num absolute top-2 -translate-x-1/2 text-12 font-bold text-soft" style={{ left: middle(column, columns) }}>
          {column + 1}
        </span>
      ))}
      <div className="px-5 pt-5">{children}</div>
      {foot === undefined ? null : <div className="relative px-7 pb-5">{foot}</div>}
    </div>
  )
}
