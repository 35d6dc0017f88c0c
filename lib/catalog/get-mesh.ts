import type { UseCase } from '@/lib/access/use-case'
import { getFile } from '@/lib/storage/kept-file'

/** A mesh, or what belongs to one, that came with a revision. */
export const getMesh: UseCase<'getMesh'> = async (_caller, { at }) => {
  const { path, digest, mediaType } = at.path
  return { body: await getFile(digest), fileName: path.split('/').at(-1)!, etag: digest, mediaType }
}
