import { createHash } from 'node:crypto'
import { inSlices } from '@/lib/in-slices'

/** Of this many bytes the digest takes about a millisecond. */
const AT_ONCE = 1024 * 1024

/** SHA-256 of bytes, 64 hexadecimal digits, computed in slices: an archive is large, and others want their turn. */
export async function sha256Of(bytes: Uint8Array): Promise<string> {
  const hash = createHash('sha256')
  await inSlices(Math.ceil(bytes.length / AT_ONCE), (i) => hash.update(bytes.subarray(i * AT_ONCE, (i + 1) * AT_ONCE)))
  return hash.digest('hex')
}
