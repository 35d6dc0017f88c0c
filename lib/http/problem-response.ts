import { Problem, PROBLEMS } from '@/lib/errors'
import { log } from '@/lib/log'

const CHALLENGE = 'Bearer realm="elbowroom"'

export interface RequestMark {
  readonly id: string
  readonly path: string
}

/** Any failure as application/problem+json (RFC 9457). What has no row in the table is logged and answered as internal-error. */
export function problemResponse(error: unknown, request: RequestMark): Response {
  if (!(error instanceof Problem)) {
    log.error({ requestId: request.id, path: request.path, error: error instanceof Error ? (error.stack ?? error.message) : String(error) }, 'internal error')
    return problemResponse(new Problem('internal-error', PROBLEMS['internal-error'].meaning), request)
  }
  const { status, title } = PROBLEMS[error.code]
  const body = {
    type: `/docs/problems/${error.code}`,
    title,
    status,
    detail: error.detail,
    instance: request.path,
    requestId: request.id,
    ...(error.more.errors === undefined ? {} : { errors: error.more.errors }),
    ...error.more.members,
  }
  const headers = new Headers({
    'content-type': 'application/problem+json',
    'cache-control': 'no-store',
    'x-request-id': request.id,
    'x-content-type-options': 'nosniff',
    ...error.more.headers,
  })
  if (status === 401) headers.set('www-authenticate', error.code.startsWith('key-') ? `${CHALLENGE}, error="invalid_token"` : CHALLENGE)
  return new Response(JSON.stringify(body), { status, headers })
}
