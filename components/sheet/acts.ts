import type { Revision } from '@/lib/contract/model'

type Entry = Revision['history'][number]

/** Who did what to a revision, for its title block. */
export interface Acts {
  readonly submitted: Entry | undefined
  readonly released: Entry | undefined
}

/** The last submission and the release of a history, oldest entry first. A submission that was sent back no longer counts. */
export function actsOf(history: readonly Entry[]): Acts {
  const sentBack = history.findLastIndex((entry, i) => i > 0 && entry.status === 'draft')
  return {
    submitted: history.findLast((entry, i) => i > sentBack && entry.status === 'in-review'),
    released: history.findLast((entry) => entry.status === 'released'),
  }
}
