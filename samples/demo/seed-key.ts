import type { Db } from '@/db/client'
import { findKeyOfAnyTeam } from '@/db/queries/keys'
import { digestKey, parseKey } from '@/lib/access/key-text'
import { createKey } from '@/lib/keys/create-key'
import { ask } from './ask'
import { findSecret, keepSecret } from './kept-secret.mjs'
import type { DemoTeam } from './people'

/** Whether the database still honours the key. */
async function isGood(db: Db, key: string, teamSlug: string): Promise<boolean> {
  const id = parseKey(key)
  const found = id === null ? null : await findKeyOfAnyTeam(db, id)
  return found !== null && found.key.keyDigest === digestKey(key) && found.team.slug === teamSlug && found.key.revokedAt === null
}

/** Keeps a key of the team with scope `compute` in the data folder, as its administrator would make it. */
export async function seedKey(db: Db, { slug, people, keyFile }: DemoTeam, dataFolder: string): Promise<void> {
  const kept = findSecret(dataFolder, keyFile)
  if (kept !== undefined && (await isGood(db, kept, slug))) return
  const administrator = people.find(({ role }) => role === 'administrator')!
  const made = await ask(db, administrator.email, { name: 'createKey', useCase: createKey }, { team: slug }, { body: { label: 'Demo', scopes: ['compute'] } })
  keepSecret(dataFolder, keyFile, made.key)
}
