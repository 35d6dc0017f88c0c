/** Fields that a page of this installation sends with a request: its session and its origin. */
export type SessionFields = {
  readonly cookie: string
  readonly origin: string
}

const pairOf = (setCookie: string): string => setCookie.split(';', 1)[0] ?? ''

function merge(cookies: Map<string, string>, answer: Response): void {
  for (const field of answer.headers.getSetCookie()) {
    const pair = pairOf(field)
    cookies.set(pair.slice(0, pair.indexOf('=')), pair)
  }
}

const fieldOf = (cookies: Map<string, string>): string => [...cookies.values()].join('; ')

/** Signs in over HTTP as the sign-in page does. Fails when the address or password is refused. */
export async function signIn(url: string, email: string, password: string): Promise<SessionFields> {
  const cookies = new Map<string, string>()
  const form = await fetch(`${url}/api/auth/csrf`)
  merge(cookies, form)
  const { csrfToken } = (await form.json()) as { csrfToken: string }
  const answer = await fetch(`${url}/api/auth/callback/credentials`, {
    method: 'POST',
    redirect: 'manual',
    headers: { cookie: fieldOf(cookies), origin: url, 'content-type': 'application/x-www-form-urlencoded' },
    body: new URLSearchParams({ csrfToken, email, password, json: 'true', callbackUrl: url }),
  })
  merge(cookies, answer)
  const names = [...cookies.keys()]
  if (!names.some((name) => name.endsWith('session-token'))) {
    throw new Error(`${email} was not signed in: ${answer.status} ${await answer.text()}`)
  }
  return { cookie: fieldOf(cookies), origin: url }
}
