import type { z } from 'zod'
import type { Operations, PathParameters } from '@/lib/contract/operations'
import type { CalledName } from './routes'

type InputOf<Declaration, Part extends string> = Declaration extends { readonly [P in Part]: infer S extends z.ZodType } ? z.input<S> : never

/** What an operation is called with: only the parts that its declaration has. */
export interface Ask<N extends CalledName> {
  readonly path: Readonly<Record<PathParameters<Operations[N]['path']>, string | number>>
  readonly query?: InputOf<Operations[N], 'query'>
  readonly body?: InputOf<Operations[N], 'body'>
  readonly form?: InputOf<Operations[N], 'form'>
  /** The file that goes with a form. */
  readonly file?: File
  /** The ETag that a change was based on. */
  readonly ifMatch?: string
  readonly signal?: AbortSignal
}

/** The body that an operation answers; undefined where it has none. */
export type Answer<N extends CalledName> = Operations[N]['answer'] extends { readonly schema: infer S extends z.ZodType } ? z.output<S> : undefined
