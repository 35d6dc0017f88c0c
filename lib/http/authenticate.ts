import { type CookieJar, identifySession } from '@/lib/access/sessions'
import { identifyKey } from '@/lib/access/key-caller'
import type { Identity } from '@/lib/access/caller'
import { siteOrigins } from '@/lib/env'
import { fail } from '@/lib/errors'

const BEARER = /^bearer +(\S+) *$/i

/** Who sends this request: the key where there is an Authorization field, else the session. Fails with a row of 401. */
export async function authenticate(request: { headers: Headers; cookies: CookieJar }): Promise<Identity> {
  const authorization = request.headers.get('authorization')
  if (authorization !== null) {
    const key = BEARER.exec(authorization)?.[1] ?? fail('sign-in-required', 'The Authorization field must read "Bearer <key>".')
    return identifyKey(key)
  }
  return (await identifySession(request.cookies)) ?? fail('sign-in-required')
}

/** Another site can make a browser send the cookie but not our Origin. Fails with origin-refused. */
export function checkOrigin(who: Identity, method: string, headers: Headers): void {
  if (who.kind !== 'person' || method === 'GET' || method === 'HEAD') return
  const origin = headers.get('origin')
  if (origin === null || !siteOrigins().includes(origin)) fail('origin-refused')
}
