import { touchKeyUse } from '@/db/queries/key-uses'
import type { Caller } from './caller'
import type { Located } from './locate'
import { createUseNoter } from './note-use'

/** The use of a revision by a key is written at most this often. */
const TOUCH_MS = 60_000

const noteUse = createUseNoter('revision', TOUCH_MS, (db, pair, at) => {
  const [keyId, revisionId] = pair.split('/') as [string, string]
  return touchKeyUse(db, keyId, revisionId, at)
})

/** Notes that a key calls a revision; of people no such record is kept. Neither awaited nor ever a reason to fail. */
export function noteRevisionUse(caller: Caller, { revision }: Partial<Located>): void {
  if (caller.kind === 'key' && revision !== undefined) noteUse(`${caller.keyId}/${revision.id}`)
}
