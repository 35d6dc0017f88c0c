import { getDb } from '@/db/client'
import type { UseCase } from '@/lib/access/use-case'
import { presentRevision } from './present-revision'

/** One revision with its structure and history. */
export const getRevision: UseCase<'getRevision'> = async (_caller, { at }) => ({
  body: await presentRevision(await getDb(), at.model.model, at.revision),
})
