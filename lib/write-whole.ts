import { randomBytes } from 'node:crypto'
import { open, rename, rm } from 'node:fs/promises'

/** Writes a file, readable by its owner only, beside its place and renames it when it is on the disk: a file of that name is always
 *  whole. Its folder must exist. */
export async function writeWhole(file: string, bytes: Uint8Array): Promise<void> {
  const beside = `${file}.${randomBytes(6).toString('hex')}.part`
  try {
    const handle = await open(/* turbopackIgnore: true */ beside, 'wx', 0o600)
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
}
