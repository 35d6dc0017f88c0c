import { addressOf } from './address'
import type { Answer, Ask } from './ask'
import { refusalFrom, unreachable } from './refusal'
import { ROUTES } from './routes'
import type { CalledName } from './routes'

export interface Called<N extends CalledName> {
  readonly body: Answer<N>
  readonly etag?: string
}

/** Calls an operation of the service with the session cookie. Fails with a Refusal, or with an AbortError when `signal` says so. */
export async function call<N extends CalledName>(name: N, ask: Ask<N>): Promise<Called<N>> {
  const response = await fetch(addressOf(name, ask.path, ask.query), {
    method: ROUTES[name][0],
    headers: {
      Accept: 'application/json',
      ...(ask.body === undefined ? {} : { 'Content-Type': 'application/json' }),
      ...(ask.ifMatch === undefined ? {} : { 'If-Match': ask.ifMatch }),
    },
    body: ask.body === undefined ? undefined : JSON.stringify(ask.body),
    signal: ask.signal,
    cache: 'no-store',
  }).catch((error: unknown) => {
    throw ask.signal?.aborted === true ? error : unreachable()
  })
  const text = await response.text()
  if (!response.ok) throw refusalFrom(response.status, text)
  const etag = response.headers.get('ETag') ?? undefined
  return { body: (text === '' ? undefined : JSON.parse(text)) as Answer<N>, etag }
}
