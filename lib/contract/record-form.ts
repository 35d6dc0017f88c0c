import type { z } from 'zod'

/** What a binary record of a request is made of, in this order. configuration, seed: n numbers; position 3; quaternion 4; twist 6. */
export type RecordPart = 'configuration' | 'position' | 'quaternion' | 'twist' | 'seed'

/** How many configurations or targets one request may carry as binary records. */
export const MOST_RECORDS = 100_000

/** Bytes of the JSON text in the query field `question`. */
export const MOST_QUESTION_BYTES = 8 * 1024

/** How an operation takes binary records. It then answers CSV and binary records as well. */
export interface RecordForm {
  /** What may stand beside the records, as JSON in the query field `question`. */
  readonly question: z.ZodObject
  /** What a record holds, by the value of the question's field `record`; the first where that is left out. */
  readonly records: Readonly<Record<string, readonly RecordPart[]>>
  /** The list whose entries the records are, for what is said about their number. */
  readonly list: 'configurations' | 'targets'
}

/** What a record holds under this question. */
export function partsOf(form: RecordForm, question: { readonly record?: string | undefined }): readonly RecordPart[] {
  return form.records[question.record ?? Object.keys(form.records)[0]!]!
}

/** How many numbers a part of a record has on a chain of n independent joints. */
export function widthOf(part: RecordPart, n: number): number {
  return { configuration: n, seed: n, position: 3, quaternion: 4, twist: 6 }[part]
}
