import { inject } from 'vitest'
import { PEOPLE } from './people'
import { signIn, type SessionFields } from './sign-in'

export type Person = keyof typeof PEOPLE

const sessions = new Map<Person, Promise<SessionFields>>()

/** Session and origin of a demo person on the served scenario; signed in once per test file. */
export function asPerson(person: Person): Promise<SessionFields> {
  const { url, password } = inject('served')
  const known = sessions.get(person) ?? signIn(url, PEOPLE[person], password)
  sessions.set(person, known)
  return known
}

/** The Authorization field of a key; tarnholm's compute key when left out. */
export const asKey = (key: string = inject('served').tarnholmKey) => ({ authorization: `Bearer ${key}` })
