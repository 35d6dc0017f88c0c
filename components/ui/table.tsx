import clsx from 'clsx'
import type { ComponentProps } from 'react'

interface TableProps extends ComponentProps<'table'> {
  /** What the table holds: read out, and shown unless hideCaption. */
  readonly caption: string
  readonly hideCaption?: boolean
}

/** A table ruled with hairlines under a strong head line. A wide one scrolls sideways inside itself. */
export function Table({ caption, hideCaption = true, className, children, ...rest }: TableProps) {
  return (
    <div className="relative scroll-x" tabIndex={0} role="group" aria-label={caption}>
      <table {...rest} className={clsx('w-full border-collapse', className)}>
        <caption className={hideCaption ? 'sr-only' : 'py-1 text-left font-semibold'}>{caption}</caption>
        {children}
      </table>
    </div>
  )
}

interface CellProps {
  /** right: numbers, which then align on their decimal point when all have the same digits. */
  readonly align?: 'left' | 'right'
}

/** Head of a column. */
export function Th({ align = 'left', className, scope = 'col', ...rest }: ComponentProps<'th'> & CellProps) {
  return (
    <th
      {...rest}
      scope={scope}
      className={clsx('label border-b border-ink px-2 py-1.5 font-semibold whitespace-nowrap', align === 'right' ? 'text-right' : 'text-left', className)}
    />
  )
}

/** Head of a row: the cell that names it. */
export function RowHead({ className, ...rest }: ComponentProps<'th'>) {
  return <th {...rest} scope="row" className={clsx('border-b border-hair px-2 py-1.5 text-left align-baseline font-normal', className)} />
}

/** A cell. */
export function Td({ align = 'left', className, ...rest }: ComponentProps<'td'> & CellProps) {
  return (
    <td
      {...rest}
      className={clsx('border-b border-hair px-2 py-1.5 align-baseline', align === 'right' ? 'num text-right whitespace-nowrap' : 'text-left', className)}
    />
  )
}
