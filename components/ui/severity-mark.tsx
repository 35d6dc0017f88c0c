import clsx from 'clsx'
import { Mark } from './marks'

const COLOURS = { error: 'text-verm', warning: 'text-amber', note: 'text-soft' } as const

/** Severity of a finding: shape, word and colour. */
export function SeverityMark({ severity, className }: { readonly severity: keyof typeof COLOURS; readonly className?: string }) {
  return (
    <span className={clsx('inline-flex items-baseline gap-1.5 font-semibold whitespace-nowrap', COLOURS[severity], className)}>
      <Mark name={severity} />
      {severity}
    </span>
  )
}
