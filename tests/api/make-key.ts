import { setTimeout as pause } from 'node:timers/promises'
import type { Scope } from '@/lib/contract/key-operations'
import { asKey, asPerson, type Person } from './support/callers'
import { get, send, type Fields } from './send'

export interface MadeKey {
  readonly id: string
  readonly key: string
}

const TEAM_OF: Partial<Record<Person, string>> = { mira: 'tarnholm', runa: 'kestrel' }

/** A new key of the team of this administrator. */
export async function makeKey(scopes: readonly Scope[], more: object = {}, by: 'mira' | 'runa' = 'mira'): Promise<MadeKey> {
  const made = await send({ method: 'POST', path: `/teams/${TEAM_OF[by]}/keys`, headers: await asPerson(by), json: { label: `For a test: ${scopes}`, scopes, ...more } })
  if (made.status !== 201) throw new Error(`no key was made: ${made.status} ${made.text}`)
  return made.body as MadeKey
}

/** The Authorization field of a new key. */
export const asNewKey = async (...scopes: Scope[]): Promise<Fields> => asKey((await makeKey(scopes)).key)

/** A key that was revoked after it was made. */
export async function makeRevokedKey(scopes: readonly Scope[]): Promise<MadeKey> {
  const made = await makeKey(scopes)
  const { status, text } = await send({ method: 'DELETE', path: `/teams/tarnholm/keys/${made.id}`, headers: await asPerson('mira') })
  if (status !== 204) throw new Error(`the key was not revoked: ${status} ${text}`)
  return made
}

/** A key whose time has passed: made for a moment and waited for. */
export async function makeExpiredKey(scopes: readonly Scope[]): Promise<MadeKey> {
  const made = await makeKey(scopes, { expiresAt: new Date(Date.now() + 4000).toISOString() })
  while ((await get('/teams/tarnholm/models', asKey(made.key))).status !== 401) await pause(100)
  return made
}

/** The key with its last character changed: the checksum no longer matches. */
export const mistype = (key: string): string => key.slice(0, -1) + (key.endsWith('0') ? '1' : '0')
