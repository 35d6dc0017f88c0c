import type { UseCase } from '@/lib/access/use-case'
import { holdAgainstModel } from './evidence/hold-against-model'

/** What storing these reference poses would say. Stores nothing. */
export const checkReferencePoses: UseCase<'checkReferencePoses'> = async (_caller, { at, body }) => ({ body: await holdAgainstModel(at, body) })
