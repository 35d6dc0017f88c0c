import { type Entry, fromBufferPromise, getFileNameLowLevel, type ZipFile } from 'yauzl'
import type { ArchiveEntry } from './archive-entry'
import { ArchiveRefused } from './refuse-archive'

/** Files and folders together. */
const MOST_ENTRIES = 2000

const END_RECORD_BYTES = 22
/** Of a local header without its name. */
const HEADER_BYTES = 30
/** Signature of the end record of zip64, which may stand between the directory and its end. */
const ZIP64_END = 0x06064b50
/** Something is encrypted: the entry, strongly, or the directory. */
const ENCRYPTED = 0x2041

const malformed = (message: string) => new ArchiveRefused('archive-malformed', message)

/** What the library says of a broken archive, as one sentence of ours. */
function translate(error: unknown): ArchiveRefused {
  if (error instanceof ArchiveRefused) return error
  const said = error instanceof Error ? error.message : String(error)
  if (/comment length/i.test(said)) return malformed('Bytes follow the end of the archive, or its end was cut off.')
  if (/multi-disk/i.test(said)) return malformed('The archive is one of several volumes.')
  if (/encryption/i.test(said)) return new ArchiveRefused('archive-encrypted', 'The archive is encrypted.')
  return malformed('The directory of the archive cannot be read: the archive is cut off or damaged.')
}

function pathOf(entry: Entry): string {
  const name = getFileNameLowLevel(entry.generalPurposeBitFlag, entry.fileNameRaw, entry.extraFields, false)
  const parts = name.split('/')
  return parts.filter((part, i) => part !== '.' && (part !== '' || i === 0)).join('/')
}

/** With the names left as bytes the folder's mark is looked for after decoding, where backslashes have become slashes. */
const isFolderName = (entry: Entry): boolean => /[/\\]$/.test(entry.fileNameRaw.toString('latin1'))

const presented = (entry: Entry): ArchiveEntry => ({
  path: pathOf(entry),
  isFolder: isFolderName(entry),
  size: entry.uncompressedSize,
  packedSize: entry.compressedSize,
  method: entry.compressionMethod,
  flags: entry.generalPurposeBitFlag,
  checksum: entry.crc32,
  mode: entry.externalFileAttributes >>> 16,
  attributes: entry.externalFileAttributes & 0xffff,
  headerAt: entry.relativeOffsetOfLocalHeader,
})

export interface Listing {
  readonly entries: readonly ArchiveEntry[]
  /** Where the data of an entry begin and that its local header agrees with the directory. Fails with archive-malformed,
   *  archive-headers-differ or archive-encrypted. */
  locate(entry: ArchiveEntry): Promise<number>
}

/** The directory must end where the end record begins: no entry may be left out of the count. */
function checkEnd(zip: ZipFile, bytes: Buffer): void {
  const commentBytes = (zip.comment as unknown as Buffer).length
  const endAt = bytes.length - END_RECORD_BYTES - commentBytes
  const cursor = zip.readEntryCursor as unknown as number
  if (cursor === endAt) return
  if (cursor + 4 <= endAt && bytes.readUInt32LE(cursor) === ZIP64_END) return
  throw malformed('The directory of the archive has another length than its end says.')
}

/** Lies on top of another, or in the directory. */
function checkOverlaps(spans: readonly { readonly from: number; readonly to: number; readonly path: string }[], directoryAt: number): void {
  let end = 0
  for (const { from, to, path } of spans.toSorted((a, b) => a.from - b.from)) {
    if (from < end || to > directoryAt) throw new ArchiveRefused('archive-malformed', 'Entries of the archive lie on top of each other.', path)
    end = to
  }
}

/** Reads the directory of an archive. Fails with archive-malformed, archive-encrypted or archive-too-many-entries. */
export async function listEntries(bytes: Buffer): Promise<Listing> {
  try {
    const zip = await fromBufferPromise(bytes, { decodeStrings: false, validateEntrySizes: false })
    if (zip.entryCount > MOST_ENTRIES) {
      throw new ArchiveRefused('archive-too-many-entries', `The archive has ${zip.entryCount} entries; at most ${MOST_ENTRIES} are taken.`)
    }
    const directoryAt = zip.readEntryCursor as unknown as number
    const raw = new Map<ArchiveEntry, Entry>()
    for await (const entry of zip.eachEntry()) raw.set(presented(entry), entry)
    checkEnd(zip, bytes)
    const entries = [...raw.keys()]
    checkOverlaps(entries.map(({ headerAt, packedSize, path }) => ({ from: headerAt, to: headerAt + HEADER_BYTES + packedSize, path })), directoryAt)
    return {
      entries,
      locate: async (entry) => {
        const dataAt = await headerAgrees(zip, entry, raw.get(entry)!)
        if (dataAt + entry.packedSize > directoryAt) throw new ArchiveRefused('archive-malformed', 'An entry reaches into the directory of the archive.', entry.path)
        return dataAt
      },
    }
  } catch (error) {
    throw translate(error)
  }
}

/** Sizes and checksum follow behind the data and are 0 in the header. */
const DESCRIPTOR = 8
const UTF8 = 0x800
/** The true number stands in an extra field of zip64. */
const ELSEWHERE = 0xffffffff

async function headerAgrees(zip: ZipFile, entry: ArchiveEntry, raw: Entry): Promise<number> {
  const header = await zip.readLocalFileHeaderPromise(raw, { minimal: false }).catch((error: unknown) => {
    throw translate(error)
  })
  const hasDescriptor = (header.generalPurposeBitFlag & DESCRIPTOR) !== 0
  const agrees = (inHeader: number, inDirectory: number) => inHeader === inDirectory || inHeader === ELSEWHERE || (hasDescriptor && inHeader === 0)
  const differing = [
    [header.fileName.equals(raw.fileNameRaw), 'name'],
    [header.compressionMethod === entry.method, 'packing'],
    [((header.generalPurposeBitFlag ^ entry.flags) & (ENCRYPTED | UTF8)) === 0, 'flags'],
    [agrees(header.crc32, entry.checksum), 'checksum'],
    [agrees(header.uncompressedSize, entry.size), 'size'],
    [agrees(header.compressedSize, entry.packedSize), 'packed size'],
  ].flatMap(([same, what]) => (same ? [] : [what as string]))
  if (differing.length > 0) {
    throw new ArchiveRefused('archive-headers-differ', `The directory of the archive and the header of the entry disagree on: ${differing.join(', ')}.`, entry.path)
  }
  return header.fileDataStart
}

/** Whether an entry is encrypted. */
export const isEncrypted = ({ flags, method }: ArchiveEntry): boolean => (flags & ENCRYPTED) !== 0 || method === 99
