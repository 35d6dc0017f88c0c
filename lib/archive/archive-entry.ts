/** One file of an archive by its directory, before it is unpacked. */
export interface ArchiveEntry {
  /** With '/' between its parts, whatever the archive writes, and without '.' parts. */
  readonly path: string
  readonly isFolder: boolean
  /** Bytes, unpacked and packed, as the directory says. */
  readonly size: number
  readonly packedSize: number
  /** 0: stored, 8: deflate; APPNOTE.TXT of the zip format, section 4.4.5. */
  readonly method: number
  /** General purpose bits, section 4.4.4. */
  readonly flags: number
  /** CRC-32 of the unpacked bytes. */
  readonly checksum: number
  /** Type and permissions as Unix writes them; 0 where the archive says none. */
  readonly mode: number
  /** Attributes as DOS and Windows write them. */
  readonly attributes: number
  /** Where its local header begins. */
  readonly headerAt: number
}
