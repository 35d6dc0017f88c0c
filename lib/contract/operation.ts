import type { z } from 'zod'
import type { ProblemCode } from '@/lib/errors'
import type { RecordForm } from './record-form'

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'

/** One operation of the contract, declared once. The route, the reference page, the OpenAPI document, the browser's
 *  calls and the tests all read this. Permissions stand in lib/access/permissions.ts. */
export interface Operation {
  readonly method: Method
  /** Under /api/v1, with {parameters}. */
  readonly path: string
  readonly tag: 'Catalog' | 'Kinematics' | 'Evidence' | 'Keys'
  readonly summary: string
  readonly description?: string
  readonly query?: z.ZodObject
  /** A JSON body. */
  readonly body?: z.ZodObject
  /** The text fields of a multipart body that also carries `file`. */
  readonly form?: z.ZodObject
  readonly answer: {
    readonly status: 200 | 201 | 204
    readonly schema?: z.ZodType
    /** Set when the answer is bytes and not JSON. */
    readonly mediaType?: string
    /** Other types that such an answer may have. */
    readonly alsoMediaTypes?: readonly string[]
  }
  /** The `results` of the answer are many: each is worked out, parsed with `item` and written by itself, in slices. */
  readonly item?: z.ZodObject
  /** Takes binary records, and answers CSV and binary records besides JSON: one for each of the `results`. */
  readonly records?: RecordForm
  /** The list in the answer that is also given as text/csv, by Accept or `?format=csv`, and the schema of its entries. */
  readonly table?: { readonly field: string; readonly entry: z.ZodObject }
  /** Problems beyond those that follow from the rest of the declaration (see common-problems.ts). */
  readonly errors: readonly ProblemCode[]
  /** Honours If-Match: "<fingerprint>" and answers Model-Fingerprint. */
  readonly pinned?: true
  /** Changes a stored thing: needs If-Match with its ETag. */
  readonly edits?: true
  /** Answers an ETag and honours If-None-Match. */
  readonly conditional?: true
  /** The answer never changes. */
  readonly immutable?: true
  /** A request body that works on the demo's models; executed by the tests and shown in the reference. */
  readonly example?: unknown
}

/** Keeps the literal types of a declaration. */
export const operation = <const T extends Operation>(declaration: T): T => declaration
