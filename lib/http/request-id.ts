import { randomUUID } from 'node:crypto'

const FORM = /^[A-Za-z0-9._-]{1,64}$/

/** The caller's X-Request-Id where it is well formed, else a new one. */
export function requestId(headers: Headers): string {
  const given = headers.get('x-request-id')
  return given !== null && FORM.test(given) ? given : randomUUID()
}
