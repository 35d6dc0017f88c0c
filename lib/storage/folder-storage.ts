import { mkdir, readFile, stat } from 'node:fs/promises'
import path from 'node:path'
import { writeWhole } from '@/lib/write-whole'
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
      await writeWhole(file, bytes)
    },
  }
}
