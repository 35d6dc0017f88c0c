import type { Caller } from '@/lib/access/caller'
import { includesRole } from '@/lib/access/roles'
import { skipsReview, TRANSITIONS } from '@/lib/catalog/transition-table'
import type { Revision } from '@/lib/contract/model'
import type { TransitionTo } from '@/components/sheet/transition-looks'

type PersonCaller = Extract<Caller, { kind: 'person' }>

/** The changes of status that this person may ask for now. */
export function possibleTransitions(caller: PersonCaller, status: Revision['status']): TransitionTo[] {
  return TRANSITIONS.filter(
    ({ from, to, role }) => from.includes(status) && includesRole(caller.role, role) && !(skipsReview(status, to) && caller.team.reviewRequired),
  ).map(({ to }) => to as TransitionTo)
}

/** Why a release will be refused for want of evidence; undefined when it will not. newest: the newest reference poses. */
export function evidenceRefusal(caller: PersonCaller, newest: { readonly number: number; readonly passed: boolean } | undefined): string | undefined {
  if (!caller.team.evidenceRequired || newest?.passed === true) return undefined
  return newest === undefined
    ? 'This team releases only what was measured: reference poses have to be stored first.'
    : `The newest reference poses, number ${newest.number}, do not pass, and this team releases only what does.`
}

/** Why a release by this person will be refused; undefined when it will not. The service decides by account; a submission
 *  is recognised here by its name, which is all that a history keeps for reading. */
export function fourEyesRefusal(caller: PersonCaller, importedBy: string | null, history: Revision['history']): string | undefined {
  if (!caller.team.fourEyes) return undefined
  if (importedBy === caller.userId) return 'You imported this revision. Under four eyes somebody else has to release it.'
  const submission = history.findLast(({ status }) => status === 'in-review')
  return submission?.by === caller.name ? 'You submitted this revision. Under four eyes somebody else has to release it.' : undefined
}
