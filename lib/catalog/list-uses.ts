import { getDb } from '@/db/client'
import { listKeyUses } from '@/db/queries/key-uses'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'
import type { UseCase } from '@/lib/access/use-case'
import { keyPrefix } from '@/lib/access/key-text'
import { stateOf } from '@/lib/access/key-state'

/** A page of the keys that call a model, the latest first. */
export const listUses: UseCase<'listUses'> = async (_caller, { at, query }) => {
  const after = parseCursor(query.cursor, ['instant', 'text', 'int'])
  const position = after && { lastUsedAt: new Date(after[0]), keyId: after[1], number: after[2] }
  const rows = await pageOf(query.limit, async (limit) => listKeyUses(await getDb(), at.model.model.id, limit, position))
  return {
    body: {
      items: rows.items.map(({ key, number, lastUsedAt }) => ({
        key: { label: key.label, prefix: keyPrefix(key.id), state: stateOf(key) },
        revision: number,
        lastUsedAt: lastUsedAt.toISOString(),
      })),
      ...cursorOf(rows, ({ lastUsedAt, key, number }) => [lastUsedAt.getTime(), key.id, number]),
    },
  }
}
