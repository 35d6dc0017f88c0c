import { getDb } from '@/db/client'
import { lockModel } from '@/db/queries/models'
import { findReferencePoses, insertReferencePoses } from '@/db/queries/reference-poses'
import { callerName } from '@/lib/access/caller'
import type { UseCase } from '@/lib/access/use-case'
import { holdAgainstModel } from './evidence/hold-against-model'
import { presentPoses } from './evidence/present-poses'

/** Stores measured poses with a revision, with what came out, pass or fail. */
export const addReferencePoses: UseCase<'addReferencePoses'> = async (caller, { at, body }) => {
  const { rows, ...outcome } = await holdAgainstModel(at, body)
  const db = await getDb()
  const number = await db.transaction(async (inside) => {
    await lockModel(inside, at.model.model.id)
    return insertReferencePoses(inside, {
      revisionId: at.revision.id,
      byName: callerName(caller),
      byUser: caller.userId,
      at: new Date(),
      note: body.note || null,
      passed: outcome.passed,
      outcome: { ...outcome },
      rows,
      source: body.table,
    })
  })
  const set = (await findReferencePoses(db, at.revision.id, number))!
  return {
    body: { ...presentPoses(set), rows, table: body.table },
    location: `/teams/${caller.team.slug}/models/${at.model.model.slug}/revisions/${at.revision.number}/reference-poses/${number}`,
  }
}
