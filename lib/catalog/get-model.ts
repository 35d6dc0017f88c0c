import type { UseCase } from '@/lib/access/use-case'
import { versionTag } from '@/lib/access/version-tag'
import { presentModel } from './present-model'

/** One model. */
export const getModel: UseCase<'getModel'> = async (_caller, { at }) => ({ body: presentModel(at.model), etag: versionTag(at.model.model) })
