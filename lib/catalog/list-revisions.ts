import { getDb } from '@/db/client'
import { listRevisionRows, listTransitions } from '@/db/queries/revisions'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'
import type { UseCase } from '@/lib/access/use-case'
import { presentSummary } from './present-revision'

/** A page of the revisions of a model, newest first. */
export const listRevisions: UseCase<'listRevisions'> = async (_caller, { at, query }) => {
  const { model } = at.model
  const before = parseCursor(query.cursor, ['int'])
  const db = await getDb()
  const rows = await pageOf(query.limit, (limit) => listRevisionRows(db, model.id, limit, before?.[0]))
  const history = await listTransitions(db, rows.items.map((row) => row.id))
  return {
    body: {
      items: rows.items.map((row) => presentSummary(model, row, history.get(row.id) ?? [])),
      ...cursorOf(rows, (row) => [row.number]),
    },
  }
}
