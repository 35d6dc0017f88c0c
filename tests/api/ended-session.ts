import { inject } from 'vitest'
import { PEOPLE } from './support/people'
import { signIn, type SessionFields } from './support/sign-in'

/** The session of a person who signed in and out again. */
export async function endedSession(person: keyof typeof PEOPLE): Promise<SessionFields> {
  const { url, password } = inject('served')
  const session = await signIn(url, PEOPLE[person], password)
  const form = await fetch(`${url}/api/auth/csrf`, { headers: { ...session } })
  const { csrfToken } = (await form.json()) as { csrfToken: string }
  // The CSRF cookie may be renewed; the session's own stays.
  const renewed = form.headers.getSetCookie().map((field) => field.split(';', 1)[0])
  const answer = await fetch(`${url}/api/auth/signout`, {
    method: 'POST',
    redirect: 'manual',
    headers: { ...session, cookie: [session.cookie, ...renewed].join('; '), 'content-type': 'application/x-www-form-urlencoded' },
    body: new URLSearchParams({ csrfToken, json: 'true' }),
  })
  if (answer.status >= 400) throw new Error(`${person} was not signed out: ${answer.status} ${await answer.text()}`)
  return session
}
