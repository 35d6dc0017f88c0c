import type { ArchiveEntry } from './archive-entry'
import { looksPacked } from './archive-kinds'
import { isEncrypted } from './list-entries'
import { ArchiveRefused, shown } from './refuse-archive'

const MEBIBYTE = 1024 * 1024
const MOST_UNPACKED_BYTES = 256 * MEBIBYTE
const MOST_RATIO = 200
const LONGEST_PATH = 1024

const FILE = 0x8000
const FOLDER = 0x4000
const TYPE = 0xf000
/** A reparse point, as Windows calls its links. */
const REPARSE = 0x400

const isUnsafe = ({ path, isFolder }: ArchiveEntry): boolean =>
  /^\/|^[A-Za-z]:|[\p{Cc}\p{Cs}\uFFFD]/u.test(path) || path.split('/').includes('..') || (path === '' && !isFolder) || path.length > LONGEST_PATH

const isLink = ({ mode, attributes }: ArchiveEntry): boolean => ![0, FILE, FOLDER].includes(mode & TYPE) || (attributes & REPARSE) !== 0

/** Each says of an entry what is wrong with it, or nothing. In the order in which they are asked. */
const CHECKS: readonly ((entry: ArchiveEntry) => ArchiveRefused | undefined)[] = [
  (entry) => (isUnsafe(entry) ? new ArchiveRefused('archive-path-unsafe', `The archive has an entry ${shown(entry.path)}, a path that is not taken.`, entry.path) : undefined),
  (entry) => (isEncrypted(entry) ? new ArchiveRefused('archive-encrypted', `The entry ${shown(entry.path)} is encrypted.`, entry.path) : undefined),
  (entry) => (isLink(entry) ? new ArchiveRefused('archive-link', `The entry ${shown(entry.path)} is a link or a device, and not a file.`, entry.path) : undefined),
  (entry) =>
    entry.method === 0 || entry.method === 8
      ? undefined
      : new ArchiveRefused('archive-packing-unknown', `The entry ${shown(entry.path)} is packed by method ${entry.method}; stored (0) and deflate (8) are read.`, entry.path),
  (entry) => (!entry.isFolder && looksPacked(entry.path) ? new ArchiveRefused('archive-nested', `The entry ${shown(entry.path)} is an archive itself.`, entry.path) : undefined),
]

/** The name under which a system that knows neither case nor forms of accents keeps a path. */
const folded = (path: string): string => path.replace(/\/$/, '').normalize('NFC').toLowerCase()

function checkNames(entries: readonly ArchiveEntry[]): void {
  const files = new Map<string, string>()
  for (const { path, isFolder } of entries) {
    if (isFolder) continue
    const twin = files.get(folded(path))
    if (twin !== undefined) throw new ArchiveRefused('archive-name-twice', `The entries ${shown(twin)} and ${shown(path)} have one name.`, path)
    files.set(folded(path), path)
  }
  for (const { path, isFolder } of entries) {
    const parts = folded(path).split('/')
    const folders = parts.slice(0, isFolder ? undefined : -1).map((_, i) => parts.slice(0, i + 1).join('/'))
    const file = folders.map((folder) => files.get(folder)).find((one) => one !== undefined)
    if (file !== undefined) throw new ArchiveRefused('archive-name-twice', `${shown(file)} is a file and a folder.`, path)
  }
}

function checkSizes(entries: readonly ArchiveEntry[], archiveBytes: number): void {
  const total = entries.reduce((sum, { size }) => sum + size, 0)
  if (total > MOST_UNPACKED_BYTES) {
    throw new ArchiveRefused('archive-too-large', `By its directory the archive unpacks to ${total} bytes; at most ${MOST_UNPACKED_BYTES} are taken.`)
  }
  for (const { path, size, packedSize } of entries) {
    if (size <= MOST_RATIO * packedSize) continue
    throw new ArchiveRefused('archive-ratio', `The entry ${shown(path)} unpacks from ${packedSize} to ${size} bytes; at most ${MOST_RATIO} times its packed size is taken.`, path)
  }
  if (total > MOST_RATIO * archiveBytes) throw new ArchiveRefused('archive-ratio', `The archive unpacks from ${archiveBytes} to ${total} bytes.`)
}

/** What can be told from the directory of an archive, before anything is unpacked. Fails with the first rule that is broken.
 *  archiveBytes: how large the archive itself is. */
export function checkEntries(entries: readonly ArchiveEntry[], archiveBytes: number): void {
  for (const entry of entries) {
    for (const check of CHECKS) {
      const refused = check(entry)
      if (refused !== undefined) throw refused
    }
  }
  checkNames(entries)
  checkSizes(entries, archiveBytes)
}
