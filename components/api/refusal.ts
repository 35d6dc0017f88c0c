import type { Finding } from '@/lib/contract/description'
import type { Fault, ProblemCode } from '@/lib/errors'

/** What the browser itself met before the service could answer. */
type BrowserCode = 'unreachable' | 'cancelled' | 'unreadable'

/** A call that did not succeed: a problem of the service, or a fault on the way to it. The message is a sentence for a person. */
export class Refusal extends Error {
  constructor(
    readonly code: ProblemCode | BrowserCode,
    message: string,
    readonly status = 0,
    readonly faults: readonly Fault[] = [],
    /** Extension members of the problem, such as `findings` or `twin`. */
    readonly members: Readonly<Record<string, unknown>> = {},
  ) {
    super(message)
    this.name = 'Refusal'
  }

  get findings(): readonly Finding[] {
    return Array.isArray(this.members.findings) ? (this.members.findings as Finding[]) : []
  }
}

/** Turns the text of an application/problem+json answer into a Refusal. */
export function refusalFrom(status: number, text: string): Refusal {
  try {
    const { type, title, detail, errors, requestId, ...members } = (JSON.parse(text) ?? {}) as Record<string, unknown>
    if (typeof type !== 'string') throw new SyntaxError('no problem type')
    const sentence = typeof detail === 'string' ? detail : typeof title === 'string' ? title : `The service answered ${status}.`
    const reference = status >= 500 && typeof requestId === 'string' ? ` Request id: ${requestId}.` : ''
    const code = type.slice(type.lastIndexOf('/') + 1) as ProblemCode
    return new Refusal(code, sentence + reference, status, Array.isArray(errors) ? (errors as Fault[]) : [], members)
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error
    return new Refusal('unreadable', `The service answered ${status} in a form that this page cannot read. Try again shortly.`, status)
  }
}

export const unreachable = (): Refusal =>
  new Refusal('unreachable', 'The service cannot be reached. Nothing was changed; check the connection and try again.')

export const cancelled = (): Refusal => new Refusal('cancelled', 'Cancelled. Nothing was stored.')

/** The last step of a fault's pointer: the name of the field in a form, whatever part of the request it is in. */
export const fieldOf = (fault: Fault): string => decodeURIComponent(fault.pointer.split('/').filter(Boolean).findLast((step) => !/^\d+$/.test(step)) ?? '')

/** A sentence for whatever was thrown. */
export const sentenceOf = (error: unknown): string =>
  error instanceof Refusal ? error.message : 'Something failed in this page. Nothing was changed; try again, or reload the page.'
