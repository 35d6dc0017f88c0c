import type { z } from 'zod'
import type { OperationName, Operations, PathParameters } from '@/lib/contract/operations'
import type { RecordSizes } from '@/lib/contract/record-columns'
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
  /** Binary records as they came. The body is then what stands beside them: see lib/compute/with-records.ts. */
  readonly records?: Uint8Array | undefined
}

/** Many results, each worked out when the edge takes it, so that none is kept longer than it takes to write it. */
export interface Series<T> {
  readonly count: number
  /** What there is one result for. */
  readonly of: 'configurations' | 'targets'
  /** The result fields that were asked for, in the order of the declaration. */
  readonly fields: readonly string[]
  readonly sizes: RecordSizes
  /** How many numbers one result has at the most, for the size of an answer in text. */
  readonly numbersEach: number
  /** The results in order; undefined is a pause in which others may have their turn. */
  readonly steps: () => Generator<T | undefined, void>
}

/** The JSON that an operation answers; many results as a series. */
export type AnswerBody<N extends OperationName> = Operations[N]['answer'] extends { schema: infer S extends z.ZodType }
  ? Operations[N] extends { item: infer I extends z.ZodType }
    ? Omit<z.input<S>, 'results'> & { readonly results: Series<z.input<I>> }
    : z.input<S>
  : Operations[N]['answer'] extends { mediaType: string }
    ? Uint8Array | ReadableStream<Uint8Array>
    : undefined

/** What a use-case gives back: the body and what HTTP says beside it. */
export interface Answer<T> {
  readonly body: T
  /** Opaque, without quotes; of the stored state, where the body is something that is edited or read again. */
  readonly etag?: string
  /** Path under /api/v1 of what was made. */
  readonly location?: string
  /** The JSON of the body, parsed by the operation's schema and written elsewhere; the body itself is left out then. */
  readonly written?: string
  /** Of bytes that are of another type than the operation's usual one: one of its alsoMediaTypes. */
  readonly mediaType?: string
  /** The name under which bytes are saved. */
  readonly fileName?: string
}

/** One operation's work. */
export type UseCase<N extends OperationName> = (caller: Caller, ask: Ask<N>) => Promise<Answer<AnswerBody<N>>>

/** One operation's work, which hands back its JSON ready to be sent. */
export type WritingUseCase<N extends OperationName> = (caller: Caller, ask: Ask<N>) => Promise<Answer<undefined> & { readonly written: string }>
