import type { z } from 'zod'
import type { OperationName, Operations, PathParameters } from '@/lib/contract/operations'
import type { Caller } from './caller'
import type { Located, Parameter } from './locate'

export interface UploadedFile {
  readonly name: string
  readonly bytes: Uint8Array
}

type Parsed<N extends OperationName, Part extends string> = Operations[N] extends { [K in Part]: infer S extends z.ZodType } ? z.infer<S> : undefined

/** What an operation is asked: the things its path names, and its parsed parts. */
export interface Ask<N extends OperationName> {
  readonly at: Pick<Located, PathParameters<Operations[N]['path']> & Parameter>
  readonly query: Parsed<N, 'query'>
  readonly body: Parsed<N, 'body'>
  readonly form: Parsed<N, 'form'>
  readonly file: Operations[N] extends { form: z.ZodType } ? UploadedFile : undefined
}

/** The JSON that an operation answers. */
export type AnswerBody<N extends OperationName> = Operations[N]['answer'] extends { schema: infer S extends z.ZodType }
  ? z.input<S>
  : Operations[N]['answer'] extends { mediaType: string }
    ? Uint8Array
    : undefined

/** What a use-case gives back: the body and what HTTP says beside it. */
export interface Answer<T> {
  readonly body: T
  /** Opaque, without quotes; of the stored state, where the body is something that is edited or read again. */
  readonly etag?: string
  /** Path under /api/v1 of what was made. */
  readonly location?: string
  /** The name under which bytes are saved. */
  readonly fileName?: string
}

/** One operation's work. */
export type UseCase<N extends OperationName> = (caller: Caller, ask: Ask<N>) => Promise<Answer<AnswerBody<N>>>
