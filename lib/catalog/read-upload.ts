import { createHash } from 'node:crypto'
import type { UploadedFile } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'
import type { Description, Finding } from '@/lib/urdf/description'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

export interface ReadUpload {
  readonly fileName: string
  readonly bytes: Uint8Array
  /** SHA-256 over the bytes, hexadecimal. */
  readonly sourceDigest: string
  readonly findings: readonly Finding[]
  /** null when a finding is an error. */
  readonly read: { readonly description: Description; readonly fingerprint: string } | null
}

/** What the importer makes of an uploaded file. Never fails on what the file holds. */
export function readUpload(file: UploadedFile): ReadUpload {
  const { description, findings } = parseUrdf(file.bytes)
  return {
    fileName: fileNameOf(file.name),
    bytes: file.bytes,
    sourceDigest: createHash('sha256').update(file.bytes).digest('hex'),
    findings,
    read: description === null ? null : { description, fingerprint: fingerprint(description) },
  }
}

/** The last part of the name as sent, without control characters; never used as a path. */
function fileNameOf(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? ''
  return [...last.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, '')].slice(0, 200).join('') || 'robot.urdf'
}

export type AcceptedUpload = ReadUpload & { readonly read: NonNullable<ReadUpload['read']> }

/** An uploaded file that may be stored. Fails with import-refused and every finding. */
export function acceptUpload(file: UploadedFile): AcceptedUpload {
  const upload = readUpload(file)
  if (upload.read === null) {
    const errors = upload.findings.filter((finding) => finding.severity === 'error')
    const [first] = errors
    const where = first === undefined ? '' : ` The first is at line ${first.line}: ${first.message}`
    fail('import-refused', `The file has ${errors.length === 1 ? 'one error' : `${errors.length} errors`}; nothing was stored.${where}`, {
      members: { findings: upload.findings },
    })
  }
  return upload as AcceptedUpload
}
