import { type Db, getDb } from '@/db/client'
import { log } from '@/lib/log'

/** More ids than this are forgotten at once; their next use is noted again. */
const MOST_IDS = 10_000

/** A function that notes the use of an id, at most once in `everyMs` for each. It is not awaited: a call is never held up by
 *  the note of its own use, and a note that fails is only logged. */
export function createUseNoter(what: 'key' | 'revision' | 'session', everyMs: number, write: (db: Db, id: string, at: Date) => Promise<unknown>) {
  const noted = new Map<string, number>()
  return (id: string): void => {
    const now = Date.now()
    if (now - (noted.get(id) ?? 0) < everyMs) return
    if (noted.size >= MOST_IDS) noted.clear()
    noted.set(id, now)
    getDb()
      .then((db) => write(db, id, new Date(now)))
      .catch((error: unknown) => log.warn({ what, error: String(error) }, 'last use not noted'))
  }
}
