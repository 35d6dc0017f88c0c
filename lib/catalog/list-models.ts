import { getDb } from '@/db/client'
import { listModelRows } from '@/db/queries/models'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'
import type { UseCase } from '@/lib/access/use-case'
import { presentModel } from './present-model'

/** A page of the register, in slug order. */
export const listModels: UseCase<'listModels'> = async (caller, { query }) => {
  const after = parseCursor(query.cursor, ['text'])
  const rows = await pageOf(query.limit, async (limit) => listModelRows(await getDb(), caller.team.id, filterOf(query), limit, after?.[0]))
  return { body: { items: rows.items.map(presentModel), ...cursorOf(rows, ({ model }) => [model.slug]) } }
}

const filterOf = ({ query, status, joints }: Parameters<UseCase<'listModels'>>[1]['query']) => ({
  ...(query === undefined || query.trim() === '' ? {} : { query: query.trim() }),
  ...(status === undefined ? {} : { status }),
  ...(joints === undefined ? {} : { joints }),
})
