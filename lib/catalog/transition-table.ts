import type { Role } from '@/lib/access/roles'
import type { Status } from '@/lib/contract/scalars'

interface Transition {
  readonly from: readonly Status[]
  readonly to: Status
  /** The least role that may do it. */
  readonly role: Role
}

/** Every change of status that a person can ask for. `superseded` is not among them: it follows from a release. */
export const TRANSITIONS: readonly Transition[] = [
  { from: ['draft'], to: 'in-review', role: 'engineer' },
  { from: ['in-review'], to: 'draft', role: 'engineer' },
  { from: ['in-review', 'draft'], to: 'released', role: 'approver' },
  { from: ['draft', 'in-review'], to: 'withdrawn', role: 'engineer' },
  { from: ['released', 'superseded'], to: 'withdrawn', role: 'approver' },
]

/** The row for a change of status; undefined where there is none. */
export const findTransition = (from: Status, to: Status): Transition | undefined =>
  TRANSITIONS.find((row) => row.to === to && row.from.includes(from))

/** Whether a draft must pass a review before its release, by the team's setting. */
export const skipsReview = (from: Status, to: Status): boolean => from === 'draft' && to === 'released'
