import { createHash } from 'node:crypto'
import type { Finding } from '@/lib/urdf/description'
import { checkEntries } from './check-entries'
import { chooseDescription, isDescription } from './choose-description'
import { listEntries } from './list-entries'
import { mediaTypeOf } from './media-type'
import { ArchiveRefused, archiveFinding, shown } from './refuse-archive'
import { unpackEntry } from './unpack-entry'

/** A mesh, or what belongs to one, out of an archive. */
export interface ArchiveFile {
  readonly path: string
  readonly mediaType: string
  /** SHA-256, hexadecimal. */
  readonly digest: string
  readonly bytes: Uint8Array<ArrayBuffer>
}

/** What is made of an archive: a description with what came beside it, or the finding that refuses it. */
export interface OpenedArchive {
  /** The description that is read, and its bytes; null when it is refused or a choice is to be made. */
  readonly description: { readonly path: string; readonly bytes: Uint8Array } | null
  /** Paths of all descriptions in it; empty when the archive is refused before they are known. */
  readonly descriptions: readonly string[]
  readonly files: readonly ArchiveFile[]
  readonly findings: readonly Finding[]
}

/** What some systems leave in every archive that they make. */
const isLitter = (path: string): boolean => /(^|\/)(__MACOSX\/|\.DS_Store$|Thumbs\.db$)/i.test(path)

interface Unpacked {
  readonly path: string
  readonly bytes: Uint8Array<ArrayBuffer>
}

async function unpack(archive: Buffer): Promise<Unpacked[]> {
  const { entries, locate } = await listEntries(archive)
  checkEntries(entries, archive.length)
  // All headers are compared before the first entry is unpacked.
  const places: number[] = []
  for (const entry of entries) places.push(await locate(entry))
  const unpacked: Unpacked[] = []
  entries.forEach((entry, i) => {
    const bytes = unpackEntry(archive, entry, places[i]!)
    if (!entry.isFolder) unpacked.push({ path: entry.path, bytes })
  })
  return unpacked
}

function unusedFinding(unpacked: readonly Unpacked[], chosen: string): Finding[] {
  const unused = unpacked.filter(({ path }) => path !== chosen && mediaTypeOf(path) === null && !isLitter(path))
  if (unused.length === 0) return []
  const first = shown(unused[0]!.path)
  const which = unused.length === 1 ? `The file ${first} in the archive is` : `${unused.length} files in the archive, first ${first}, are`
  return [archiveFinding('archive-file-unused', `${which} not used.`, unused[0]!.path)]
}

/** Reads a zip archive by its rules and finds the description in it. Never fails on what the archive holds. entry: path of the
 *  description that is meant, where there are several. */
export async function openArchive(bytes: Uint8Array, entry: string | undefined): Promise<OpenedArchive> {
  const archive = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  let descriptions: readonly string[] = []
  try {
    const unpacked = await unpack(archive)
    descriptions = unpacked.filter((file) => !isLitter(file.path) && isDescription(file, unpacked)).map(({ path }) => path).sort()
    const path = chooseDescription(descriptions, entry)
    const files = unpacked.flatMap((file) => {
      const mediaType = isLitter(file.path) ? null : mediaTypeOf(file.path)
      return mediaType === null ? [] : [{ path: file.path, mediaType, digest: createHash('sha256').update(file.bytes).digest('hex'), bytes: file.bytes }]
    })
    const description = { path, bytes: unpacked.find((file) => file.path === path)!.bytes }
    return { description, descriptions, files: files.sort((a, b) => (a.path < b.path ? -1 : 1)), findings: unusedFinding(unpacked, path) }
  } catch (error) {
    if (!(error instanceof ArchiveRefused)) throw error
    return { description: null, descriptions, files: [], findings: [archiveFinding(error.rule, error.message, error.path)] }
  }
}
