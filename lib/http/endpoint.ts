import type { NextRequest } from 'next/server'
import { getDb } from '@/db/client'
import { locate, type Parameter } from '@/lib/access/locate'
import { noteRevisionUse } from '@/lib/access/note-revision-use'
import { permit } from '@/lib/access/permissions'
import type { Answer, Ask, UseCase } from '@/lib/access/use-case'
import type { Operation } from '@/lib/contract/operation'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'
import { fail } from '@/lib/errors'
import { finishInSlices, passTurn } from '@/lib/in-slices'
import { log } from '@/lib/log'
import { chooseMediaType } from './accept'
import { answerResponse, CAUTIONS } from './answer-response'
import { authenticate, checkOrigin } from './authenticate'
import { parsePart, pointerOf } from './faults'
import { checkIfMatch } from './if-match'
import { CSV_TYPE, JSON_TYPE, RECORD_MEDIA_TYPES, RECORD_TYPE } from './media-types'
import { parseBodyInSteps } from './parse-body'
import { problemResponse } from './problem-response'
import { discardBody, readContentType, readForm, readJson, readRecordBytes } from './read-body'
import { NO_QUERY, parseQuestion } from './read-question'
import { requestId } from './request-id'
import type { RouteHandler } from './route-handler'

/** The query as an object; a name given twice is refused rather than guessed at. */
function readQuery(search: URLSearchParams): Record<string, string> {
  const query: Record<string, string> = Object.create(null)
  for (const [name, value] of search) {
    if (name in query) fail('invalid-request', undefined, { errors: [{ pointer: pointerOf('/query', [name]), detail: 'is given more than once' }] })
    query[name] = value
  }
  return query
}

/** Reads and parses the parts of a request that the operation declares: 415, 413, 400, 422. */
async function readParts(operation: Operation, request: NextRequest) {
  const query = () => readQuery(request.nextUrl.searchParams)
  const parseQuery = () => parsePart(operation.query ?? NO_QUERY, query(), '/query')
  if (operation.form !== undefined) {
    readContentType(request.headers, ['multipart/form-data'])
    const { fields, file } = await readForm(request)
    return { query: parseQuery(), form: parsePart(operation.form, fields, '/form'), file }
  }
  if (operation.body === undefined) return { query: parseQuery() }
  const { records } = operation
  if (records !== undefined && readContentType(request.headers, [JSON_TYPE, RECORD_TYPE]) === RECORD_TYPE) {
    const bytes = await readRecordBytes(request)
    return { body: parseQuestion(records.question, query()), records: bytes }
  }
  readContentType(request.headers, [JSON_TYPE])
  const body = await readJson(request)
  return { query: parseQuery(), body: await finishInSlices(parseBodyInSteps(operation.body, body)) }
}

/** The formats that the operation answers in, the usual one first. */
const offeredBy = ({ answer, records, table }: Operation): readonly [string, ...string[]] =>
  records !== undefined ? RECORD_MEDIA_TYPES : [answer.mediaType ?? JSON_TYPE, ...(answer.alsoMediaTypes ?? []), ...(table === undefined ? [] : [CSV_TYPE])]

/** Of a table the query may say what a browser's link cannot: `?format=`. */
const FORMATS: Readonly<Record<string, string>> = { json: JSON_TYPE, csv: CSV_TYPE }

/** The names in a path; one of several parts comes with '/' between them. */
const namesIn = (params: Record<string, string | string[]>) =>
  Object.fromEntries(Object.entries(params).map(([name, value]) => [name, Array.isArray(value) ? value.join('/') : value])) as Partial<Record<Parameter, string>>

/** A use-case as a route handler. The order of checks is the contract's:
 *  401, 404, 403, 406, 415, 413, 400, 422, 428, 412, and what the use-case itself refuses; that binary records have the length
 *  that the model's chain gives them is among the latter. */
export function endpoint<N extends OperationName>(name: N, useCase: UseCase<N>): RouteHandler {
  const operation: Operation = OPERATIONS[name]
  return async (request, { params }) => {
    const started = performance.now()
    const mark = { id: requestId(request.headers), path: request.nextUrl.pathname }
    let response: Response
    let by: string | undefined
    try {
      const parameters = namesIn(await params)
      const who = await authenticate(request)
      // The embedded database computes in this thread: what one stage asks of it and what the next does are two turns.
      await passTurn()
      by = who.kind === 'key' ? `key ${who.keyId}` : `user ${who.userId}`
      const { caller, at } = await locate(await getDb(), who, parameters)
      await passTurn()
      checkOrigin(who, operation.method, request.headers)
      permit(caller, name)
      noteRevisionUse(caller, at)
      const accepted = chooseMediaType(request.headers, offeredBy(operation))
      const parts = await readParts(operation, request)
      checkIfMatch(operation, at, request.headers)
      await passTurn()
      const { format } = (parts.query ?? {}) as { format?: string }
      const mediaType = operation.table !== undefined && format !== undefined ? FORMATS[format]! : accepted
      const answer: Answer<unknown> = await useCase(caller, { at, ...parts } as Ask<N>)
      // Of which type stored bytes are is known only now.
      if (answer.mediaType !== undefined) chooseMediaType(request.headers, [answer.mediaType])
      response = await answerResponse(operation, answer, {
        request: mark,
        mediaType,
        search: request.nextUrl.search,
        ifNoneMatch: request.headers.get('if-none-match'),
        at,
        isFixed: parameters.revision !== 'released',
      })
    } catch (error) {
      await discardBody(request)
      response = problemResponse(error, mark)
      if (operation.pinned) response.headers.set('link', CAUTIONS)
    }
    log.info({ requestId: mark.id, operation: name, path: mark.path, status: response.status, by, ms: Math.round(performance.now() - started) }, 'request')
    return response
  }
}
