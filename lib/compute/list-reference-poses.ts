import { getDb } from '@/db/client'
import { listReferencePosesRows } from '@/db/queries/reference-poses'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'
import type { UseCase } from '@/lib/access/use-case'
import { presentPoses } from './evidence/present-poses'

/** A page of the reference poses of a revision, newest first. */
export const listReferencePoses: UseCase<'listReferencePoses'> = async (_caller, { at, query }) => {
  const before = parseCursor(query.cursor, ['int'])
  const rows = await pageOf(query.limit, async (limit) => listReferencePosesRows(await getDb(), at.revision.id, limit, before?.[0]))
  return { body: { items: rows.items.map(presentPoses), ...cursorOf(rows, ({ number }) => [number]) } }
}
