import { createHash } from 'node:crypto'
import { canonicalContent } from '@/lib/urdf/canonical'
import type { Description } from '@/lib/urdf/description'

/** The fingerprint of a description: SHA-256 over its canonical kinematic content (UTF-8), 64 lower-case hexadecimal digits.
 *  For the server: it uses node:crypto. */
export const fingerprint = (description: Description): string => createHash('sha256').update(canonicalContent(description), 'utf8').digest('hex')
