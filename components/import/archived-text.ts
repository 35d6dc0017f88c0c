import { unzipSync } from 'fflate'
import { sourceText } from './source-text'

/** The text of one file in an archive that the service has read and found in order; null where its name is not found. Done in this
 *  thread: a description has at most 8 MiB, and nothing else is unpacked. */
export function archivedText(archive: Uint8Array, path: string): string | null {
  // The service drops '.' parts and takes a backslash for a slash.
  const isMeant = (name: string) => name.split(/[/\\]/).filter((part) => part !== '.').join('/') === path
  const [bytes] = Object.values(unzipSync(archive, { filter: ({ name }) => isMeant(name) }))
  return bytes === undefined ? null : sourceText(bytes)
}
