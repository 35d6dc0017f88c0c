import { inflateRawSync } from 'node:zlib'
import type { ArchiveEntry } from './archive-entry'
import { isPacked } from './archive-kinds'
import { checksumOf } from './checksum'
import { ArchiveRefused, shown } from './refuse-archive'

type Inflated = { readonly buffer: Buffer; readonly engine: { readonly bytesWritten: number } }

/** Unpacks no more than is said, whatever the data would unpack to. */
function inflate(packed: Buffer, entry: ArchiveEntry): Buffer {
  try {
    const { buffer, engine } = inflateRawSync(packed, { maxOutputLength: Math.max(1, entry.size), info: true }) as unknown as Inflated
    if (engine.bytesWritten === packed.length) return buffer
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ERR_BUFFER_TOO_LARGE') {
      throw new ArchiveRefused('archive-headers-differ', `The entry ${shown(entry.path)} unpacks to more than the ${entry.size} bytes that the archive says.`, entry.path)
    }
  }
  throw new ArchiveRefused('archive-malformed', `The entry ${shown(entry.path)} is damaged and cannot be unpacked.`, entry.path)
}

/** The bytes of an entry, in memory of their own. dataAt: where its data begin. Fails with archive-headers-differ, archive-malformed or
 *  archive-nested. */
export function unpackEntry(archive: Buffer, entry: ArchiveEntry, dataAt: number): Uint8Array<ArrayBuffer> {
  const packed = archive.subarray(dataAt, dataAt + entry.packedSize)
  const bytes = new Uint8Array(entry.method === 0 ? packed : inflate(packed, entry))
  if (bytes.length !== entry.size) {
    throw new ArchiveRefused('archive-headers-differ', `The entry ${shown(entry.path)} unpacks to ${bytes.length} bytes, and the archive says ${entry.size}.`, entry.path)
  }
  if (checksumOf(bytes) !== entry.checksum) throw new ArchiveRefused('archive-malformed', `The entry ${shown(entry.path)} does not match its checksum.`, entry.path)
  if (isPacked(bytes)) throw new ArchiveRefused('archive-nested', `The entry ${shown(entry.path)} is an archive itself.`, entry.path)
  return bytes
}
