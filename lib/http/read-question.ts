import { z } from 'zod'
import { MOST_QUESTION_BYTES } from '@/lib/contract/record-form'
import { fail } from '@/lib/errors'
import { parsePart } from './faults'

/** What an operation without a query takes, so that a misplaced `?units=mm` is named and not passed over. */
export const NO_QUERY = z.strictObject({})

const POINTER = '/query/question'
const QUERY = z.strictObject({ question: z.string().optional() })

/** What stands beside binary records, from the query field `question`; nothing where that is left out. Faults within it are pointed at as
 *  in the JSON question that it is a part of. Fails with malformed-body or invalid-request. */
export function parseQuestion(schema: z.ZodObject, query: Record<string, string>): unknown {
  const { question = '{}' } = parsePart(QUERY, query, '/query')
  const bytes = Buffer.byteLength(question)
  if (bytes > MOST_QUESTION_BYTES) {
    const detail = `has ${bytes} bytes; at most ${MOST_QUESTION_BYTES}`
    fail('invalid-request', `The query field "question" ${detail}.`, { errors: [{ pointer: POINTER, detail }] })
  }
  let value: unknown
  try {
    value = JSON.parse(question)
  } catch {
    fail('malformed-body', 'The query field "question", which belongs to the body of records, is not JSON.')
  }
  return parsePart(schema, value, '')
}
