import { randomBytes } from 'node:crypto'
import { mkdir, open, readFile, rename, rm, stat } from 'node:fs/promises'
import path from 'node:path'
import { placeOf, type Storage } from './storage'

const isMissing = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === 'ENOENT'

/** Undefined in place of a file that is not there. */
const orMissing = <T>(asked: Promise<T>): Promise<T | undefined> =>
  asked.catch((error: unknown) => {
    if (isMissing(error)) return undefined
    throw error
  })

/** Files in a folder of this machine, readable by their owner only. */
export function folderStorage(folder: string): Storage {
  const fileOf = (digest: string) => path.join(/* turbopackIgnore: true */ folder, placeOf(digest))
  const has = async (digest: string) => (await orMissing(stat(fileOf(digest)))) !== undefined
  return {
    has,
    async get(digest) {
      const bytes = await orMissing(readFile(fileOf(digest)))
      return bytes === undefined ? null : new Uint8Array(bytes)
    },
    async put(digest, bytes) {
      if (await has(digest)) return
      const file = fileOf(digest)
      await mkdir(path.dirname(file), { recursive: true, mode: 0o700 })
      // Written beside and renamed when it is on the disk, so that a file of that name is always whole.
      const beside = `${file}.${randomBytes(6).toString('hex')}.part`
      try {
        const handle = await open(beside, 'wx', 0o600)
        try {
          await handle.writeFile(bytes)
          await handle.sync()
        } finally {
          await handle.close()
        }
        await rename(beside, file)
      } catch (error) {
        await rm(beside, { force: true })
        throw error
      }
    },
  }
}
