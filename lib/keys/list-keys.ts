import { getDb } from '@/db/client'
import { listKeyRows } from '@/db/queries/keys'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'
import type { UseCase } from '@/lib/access/use-case'
import { presentKey } from './present-key'

/** A page of the team's keys, newest first. */
export const listKeys: UseCase<'listKeys'> = async (caller, { query }) => {
  const after = parseCursor(query.cursor, ['instant', 'text'])
  const position = after && { createdAt: new Date(after[0]), id: after[1] }
  const rows = await pageOf(query.limit, async (limit) => listKeyRows(await getDb(), caller.team.id, limit, position))
  return { body: { items: rows.items.map(presentKey), ...cursorOf(rows, ({ key }) => [key.createdAt.getTime(), key.id]) } }
}
