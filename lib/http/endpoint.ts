import type { NextRequest } from 'next/server'
import { z } from 'zod'
import { getDb } from '@/db/client'
import { locate, type Parameter } from '@/lib/access/locate'
import { permit } from '@/lib/access/permissions'
import type { Answer, Ask, UseCase } from '@/lib/access/use-case'
import type { Operation } from '@/lib/contract/operation'
import { type OperationName, OPERATIONS } from '@/lib/contract/operations'
import { fail } from '@/lib/errors'
import { log } from '@/lib/log'
import { checkAccept } from './accept'
import { answerResponse, CAUTIONS } from './answer-response'
import { authenticate, checkOrigin } from './authenticate'
import { parsePart, pointerOf } from './faults'
import { checkIfMatch } from './if-match'
import { problemResponse } from './problem-response'
import { checkContentType, discardBody, readForm, readJson } from './read-body'
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

/** What an operation without a query takes, so that a misplaced `?units=mm` is named and not passed over. */
const NO_QUERY = z.strictObject({})

/** Reads and parses the parts of a request that the operation declares: 415, 413, 400, 422. */
async function readParts(operation: Operation, request: NextRequest) {
  const parseQuery = () => parsePart(operation.query ?? NO_QUERY, readQuery(request.nextUrl.searchParams), '/query')
  if (operation.form !== undefined) {
    checkContentType(request.headers, 'multipart/form-data')
    const { fields, file } = await readForm(request)
    return { query: parseQuery(), body: undefined, form: parsePart(operation.form, fields, '/form'), file }
  }
  if (operation.body !== undefined) {
    checkContentType(request.headers, 'application/json')
    const body = await readJson(request)
    return { query: parseQuery(), body: parsePart(operation.body, body, ''), form: undefined, file: undefined }
  }
  return { query: parseQuery(), body: undefined, form: undefined, file: undefined }
}

/** A use-case as a route handler. The order of checks is the contract's:
 *  401, 404, 403, 406, 415, 413, 400, 422, 428, 412, and what the use-case itself refuses. */
export function endpoint<N extends OperationName>(name: N, useCase: UseCase<N>): RouteHandler {
  const operation: Operation = OPERATIONS[name]
  return async (request, { params }) => {
    const started = performance.now()
    const mark = { id: requestId(request.headers), path: request.nextUrl.pathname }
    let response: Response
    let by: string | undefined
    try {
      const parameters = (await params) as Partial<Record<Parameter, string>>
      const who = await authenticate(request)
      by = who.kind === 'key' ? `key ${who.keyId}` : `user ${who.userId}`
      const { caller, at } = await locate(await getDb(), who, parameters)
      checkOrigin(who, operation.method, request.headers)
      permit(caller, name)
      checkAccept(request.headers, operation.answer.mediaType ?? 'application/json')
      const parts = await readParts(operation, request)
      checkIfMatch(operation, at, request.headers)
      const answer: Answer<unknown> = await useCase(caller, { at, ...parts } as Ask<N>)
      response = await answerResponse(operation, answer, {
        request: mark,
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
