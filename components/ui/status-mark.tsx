import clsx from 'clsx'
import type { Status as ContractStatus } from '@/lib/contract/scalars'
import { Mark } from './marks'

export type Status = ContractStatus

/** The statuses of a revision, in the order in which they follow each other. */
export const STATUSES = ['draft', 'in-review', 'released', 'superseded', 'withdrawn'] as const satisfies readonly Status[]

const LOOKS: Record<Status, { word: string; colour: string }> = {
  draft: { word: 'draft', colour: 'text-ink' },
  'in-review': { word: 'in review', colour: 'text-ink' },
  released: { word: 'released', colour: 'text-green' },
  superseded: { word: 'superseded', colour: 'text-soft' },
  withdrawn: { word: 'withdrawn', colour: 'text-verm' },
}

/** A status as people write it. */
export const statusWord = (status: Status): string => LOOKS[status].word

/** Status of a revision: shape, word and colour. */
export function StatusMark({ status, className }: { readonly status: Status; readonly className?: string }) {
  const { word, colour } = LOOKS[status]
  return (
    <span className={clsx('inline-flex items-baseline gap-1.5 font-semibold whitespace-nowrap', colour, className)}>
      <Mark name={status} />
      {word}
    </span>
  )
}
