import { randomBytes } from 'node:crypto'
import { getToken } from 'next-auth/jwt'
import { getDb } from '@/db/client'
import { endSession as endSessionRow, findSession, insertSession, touchSession } from '@/db/queries/people'
import { sessionSecret } from '@/lib/env'
import { fail } from '@/lib/errors'
import { sharedBriefCache } from './brief-cache'
import type { Person } from './caller'
import { createUseNoter } from './note-use'

/** A session ends this long after sign-in, used or not. */
export const SESSION_SECONDS = 7 * 24 * 3600
/** Last use is written at most this often for a session. */
const TOUCH_MS = 60_000

const cache = sharedBriefCache('sessions', async (id) => findSession(await getDb(), id))
const noteUse = createUseNoter('session', TOUCH_MS, touchSession)

/** Starts a session and answers the random id that goes into the cookie. */
export async function startSession(userId: string, agent: string | null): Promise<string> {
  const id = randomBytes(32).toString('base64url')
  await insertSession(await getDb(), { id, userId, agent: agent?.slice(0, 300) ?? null })
  return id
}

/** Ends a session at once. */
export async function endSession(id: string): Promise<void> {
  await endSessionRow(await getDb(), id, new Date())
  cache.forget(id)
}

/** What next/headers and a NextRequest both offer. */
export interface CookieJar {
  getAll(): { name: string; value: string }[]
}

/** The person behind the cookies; null without a session cookie. Fails with session-ended when there is one that no longer holds. */
export async function identifySession(cookies: CookieJar): Promise<Person | null> {
  const token = await getToken({ req: { cookies, headers: {} } as never, secret: sessionSecret() })
  if (token === null) return null
  const session = typeof token.sid === 'string' ? await cache.get(token.sid) : null
  if (session === null || session.createdAt.getTime() + SESSION_SECONDS * 1000 <= Date.now()) fail('session-ended')
  noteUse(session.id)
  return { kind: 'person', sessionId: session.id, userId: session.userId, name: session.name, email: session.email }
}
