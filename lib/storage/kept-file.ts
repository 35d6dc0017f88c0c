import { fail } from '@/lib/errors'
import { log } from '@/lib/log'
import { fileStorage } from './file-storage'
import { sha256Of } from './sha256-of'

/** A store that fails is a fault of the installation: logged, and answered as file-unavailable. */
const reached = <T>(asked: Promise<T>, digest: string): Promise<T> =>
  asked.catch((error: unknown) => {
    log.error({ digest, error: String(error) }, 'the file storage failed')
    return fail('file-unavailable')
  })

/** Keeps bytes under their SHA-256. To be called before the row that names them is written. Fails with file-unavailable. */
export const keepFile = (digest: string, bytes: Uint8Array): Promise<void> => reached(fileStorage().then((storage) => storage.put(digest, bytes)), digest)

/** Fails with file-unavailable unless all of these can be had. */
export async function checkFiles(digests: readonly string[]): Promise<void> {
  for (const digest of new Set(digests)) {
    if (await reached(fileStorage().then((storage) => storage.has(digest)), digest)) continue
    log.error({ digest }, 'a file is missing in the file storage')
    fail('file-unavailable')
  }
}

/** The bytes of this SHA-256, compared with it. Fails with file-unavailable. */
export async function getFile(digest: string): Promise<Uint8Array> {
  const bytes = await reached(fileStorage().then((storage) => storage.get(digest)), digest)
  if (bytes !== null && (await sha256Of(bytes)) === digest) return bytes
  log.error({ digest }, bytes === null ? 'a file is missing in the file storage' : 'a file in the file storage is damaged')
  return fail('file-unavailable')
}
