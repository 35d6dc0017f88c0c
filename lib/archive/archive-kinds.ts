/** Names that archives and compressed files go by. */
const NAMES = /\.(zip|zipx|7z|rar|tar|tgz|gz|tbz2?|bz2|txz|xz|zst|lz4?|lzma|cab|jar|iso|deb|rpm)$/i

const STARTS = ['PK\x03\x04', 'PK\x05\x06', '\x1f\x8b', '7z\xbc\xaf\x27\x1c', 'Rar!\x1a', 'BZh', '\xfd7zXZ\x00', '\x28\xb5\x2f\xfd', 'MSCF\0']
const TAR_MARK = { at: 257, text: 'ustar' }

/** Whether a file is an archive by its name. */
export const looksPacked = (path: string): boolean => NAMES.test(path)

/** Whether a file is an archive by its first bytes. */
export function isPacked(bytes: Uint8Array): boolean {
  const start = Buffer.from(bytes.subarray(0, 264)).toString('latin1')
  return STARTS.some((mark) => start.startsWith(mark)) || start.startsWith(TAR_MARK.text, TAR_MARK.at)
}

/** Whether an upload is read as an archive: it is called .zip and begins as one. */
export const isZip = (name: string, bytes: Uint8Array): boolean => /\.zip$/i.test(name) && ['PK\x03\x04', 'PK\x05\x06'].includes(Buffer.from(bytes.subarray(0, 4)).toString('latin1'))
