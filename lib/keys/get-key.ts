import type { UseCase } from '@/lib/access/use-case'
import { versionTag } from '@/lib/access/version-tag'
import { presentKey } from './present-key'

/** One key, without its secret. */
export const getKey: UseCase<'getKey'> = async (_caller, { at }) => ({ body: presentKey(at.key), etag: versionTag(at.key.key) })
