import type { NextRequest } from 'next/server'
import { log } from '@/lib/log'
import type { RequestMark } from './problem-response'
import { requestId } from './request-id'

export type RouteHandler = (request: NextRequest, context: { params: Promise<Record<string, string | string[]>> }) => Promise<Response>

/** A handler that is no operation of the contract: its answer carries X-Request-Id and is logged all the same. */
export const marked =
  (answer: (mark: RequestMark) => Response) =>
  async (request: NextRequest): Promise<Response> => {
    const mark = { id: requestId(request.headers), path: request.nextUrl.pathname }
    const response = answer(mark)
    response.headers.set('x-request-id', mark.id)
    log.info({ requestId: mark.id, path: mark.path, status: response.status }, 'request')
    return response
  }
