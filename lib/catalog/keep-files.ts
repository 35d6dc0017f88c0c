import { keepFile } from '@/lib/storage/kept-file'
import type { AcceptedUpload } from './read-upload'

/** Puts an archive and the meshes in it into the file storage, before any row names them. What is kept of an import that fails after
 *  this is named by nobody, and does no harm. Fails with file-unavailable. */
export async function keepFiles({ archive, sourceDigest, bytes }: AcceptedUpload): Promise<void> {
  if (archive === undefined) return
  await keepFile(sourceDigest, bytes)
  for (const file of archive.files) await keepFile(file.digest, file.bytes)
}
