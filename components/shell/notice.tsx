import clsx from 'clsx'
import type { ReactNode } from 'react'

interface NoticeProps {
  /** What happened, in a few words; its colour says how grave it is. */
  readonly title: string
  readonly tone?: 'error' | 'warning' | 'plain'
  readonly children: ReactNode
  readonly actions?: ReactNode
}

const TONES = {
  error: { rule: 'border-verm', title: 'text-verm' },
  warning: { rule: 'border-amber', title: 'text-amber' },
  plain: { rule: 'border-ink', title: 'text-ink' },
} as const

/** A message that belongs to the whole page: what is the case, and what can be done. */
export function Notice({ title, tone = 'plain', children, actions }: NoticeProps) {
  return (
    <div role={tone === 'error' ? 'alert' : 'status'} className={clsx('flex flex-wrap items-center gap-x-4 gap-y-2 border-t-2 bg-sheet px-5 py-2.5', TONES[tone].rule)}>
      <strong className={clsx('font-semibold', TONES[tone].title)}>{title}</strong>
      <div className="min-w-0 grow basis-64">{children}</div>
      {actions}
    </div>
  )
}
