import type { NextAuthOptions } from 'next-auth'
import Credentials from 'next-auth/providers/credentials'
import { getDb } from '@/db/client'
import { findUserByEmail } from '@/db/queries/people'
import { sessionSecret } from '@/lib/env'
import { log } from '@/lib/log'
import { MOST_PASSWORD_LENGTH } from '@/lib/contract/set-up'
import { isPassword } from './passwords'
import { endSession, SESSION_SECONDS, startSession } from './sessions'

/** next-auth's settings: e-mail and password; the token in the cookie carries nothing but the session's random id. */
export function signInOptions(): NextAuthOptions {
  return {
    secret: sessionSecret(),
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in' },
    logger: {
      error: (code) => log.error({ code }, 'sign-in'),
      warn: (code) => log.debug({ code }, 'sign-in'),
      debug: () => undefined,
    },
    providers: [
      Credentials({
        name: 'Password',
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        async authorize(credentials, request) {
          const { email, password } = credentials ?? {}
          if (typeof email !== 'string' || typeof password !== 'string' || password.length > MOST_PASSWORD_LENGTH) return null
          const user = await findUserByEmail(await getDb(), email.trim())
          if (!(await isPassword(password, user?.passwordHash ?? null)) || user === null) return null
          const agent = request.headers?.['user-agent'] as string | undefined
          return { id: user.id, sid: await startSession(user.id, agent ?? null) }
        },
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => (user === undefined ? { sid: token.sid } : { sid: (user as { sid?: string }).sid }),
      // Published at /api/auth/session: nothing but when it ends.
      session: ({ session }) => ({ expires: session.expires }),
    },
    events: {
      async signOut({ token }) {
        if (typeof token?.sid === 'string') await endSession(token.sid)
      },
    },
  }
}
