import clsx from 'clsx'
import { formatNumber } from './format-number'

interface NumProps {
  readonly value: number | null | undefined
  readonly digits: number
  /** Stands behind the number in secondary ink. */
  readonly unit?: string
  readonly className?: string
}

/** A number. In a right-aligned column with equal digits the decimal points stand under each other. */
export function Num({ value, digits, unit, className }: NumProps) {
  return (
    <span className={clsx('num whitespace-nowrap', className)}>
      {formatNumber(value, digits)}
      {unit === undefined ? null : <span className="text-soft [word-spacing:-0.25em]"> {unit}</span>}
    </span>
  )
}
