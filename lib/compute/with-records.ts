import type { Ask, UseCase } from '@/lib/access/use-case'
import type { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import { RECORD_FORMS } from '@/lib/contract/record-questions'
import { fail } from '@/lib/errors'
import { chainOf, type ChainChoice, loadRevision } from './load-chain'
import { readRecords } from './read-records'

type Kinematic = keyof typeof KINEMATIC_OPERATIONS

/** What stands beside records, as far as reading them goes. */
interface Beside {
  readonly chain?: ChainChoice
  readonly record?: string
  readonly gains?: { readonly position?: number; readonly orientation?: number }
}

/** The use-case, that also takes its lists as binary records. How long a record is depends on the chain, so it is here and not at the
 *  edge that they are read; a question that insists on another model has been refused before. */
export function withRecords<N extends Kinematic>(name: N, useCase: UseCase<N>): UseCase<N> {
  return async (caller, ask) => {
    if (ask.records === undefined) return useCase(caller, ask)
    const { record, gains, ...question } = ask.body as Beside
    const chain = chainOf(await loadRevision((ask as Ask<Kinematic>).at.revision.id), question.chain ?? {})
    const form = RECORD_FORMS[name]
    if (chain.joints.length === 0) fail('invalid-request', 'The chain has no independent joint, so that a configuration has no bytes: send such a question as JSON.')
    const lists = await readRecords(form, { ...(record !== undefined && { record }), ...(gains && { gains }) }, ask.records, chain.joints.length)
    return useCase(caller, { ...ask, records: undefined, body: { ...question, ...lists } } as Ask<N>)
  }
}
