import { getDb } from '@/db/client'
import { updateModel } from '@/db/queries/models'
import type { UseCase } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'

/** Takes a model out of the register. Nothing is destroyed: its revisions stay readable and computable under their address. */
export const archiveModel: UseCase<'archiveModel'> = async (_caller, { at }) => {
  const { id, version, archivedAt } = at.model.model
  const now = new Date()
  if (archivedAt === null && !(await updateModel(await getDb(), id, version, { archivedAt: now }, now))) fail('stale')
  return { body: undefined }
}
