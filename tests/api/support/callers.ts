import { inject } from 'vitest'
import { signIn, type SessionFields } from './sign-in'

/** The people of the demo scenario by first name. */
export const PEOPLE = {
  mira: 'mira@tarnholm.example',
  tomas: 'tomas@tarnholm.example',
  ines: 'ines@tarnholm.example',
  kofi: 'kofi@tarnholm.example',
  runa: 'runa@kestrel.example',
  edda: 'edda@kestrel.example',
} as const
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
