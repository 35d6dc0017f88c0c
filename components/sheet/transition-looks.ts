import type { z } from 'zod'
import type { TransitionQuestion } from '@/lib/contract/model'

export type TransitionTo = z.infer<typeof TransitionQuestion>['to']

interface TransitionLook {
  readonly label: string
  readonly busy: string
  readonly title: string
  /** What follows from it. */
  readonly effect: string
  readonly done: string
}

/** The words of each change of status that a person can make. */
export const TRANSITION_LOOKS = {
  'in-review': {
    label: 'Submit for review',
    busy: 'Submitting…',
    title: 'Submit for review',
    effect: 'Approvers find it on their desk. It can be sent back until it is released.',
    done: 'Submitted for review.',
  },
  draft: {
    label: 'Send back',
    busy: 'Sending back…',
    title: 'Send back to draft',
    effect: 'It leaves the review and becomes a draft again. Say what has to change.',
    done: 'Sent back to draft.',
  },
  released: {
    label: 'Release',
    busy: 'Releasing…',
    title: 'Release this revision',
    effect: 'It comes into force: “released” in an address means this revision from now on, and the one in force until now is superseded.',
    done: 'Released.',
  },
  withdrawn: {
    label: 'Withdraw',
    busy: 'Withdrawing…',
    title: 'Withdraw this revision',
    effect: 'It must not be used any more, and that cannot be undone. It stays readable and computes with the status “withdrawn”. No other revision comes into force in its place.',
    done: 'Withdrawn.',
  },
} as const satisfies Record<TransitionTo, TransitionLook>
