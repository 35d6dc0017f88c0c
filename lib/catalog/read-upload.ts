import type { UploadedFile } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'
import type { ReadFile } from './answer-reader'
import { readFile } from './reader-pool'

/** The last part of the name as sent, without control characters; never used as a path. */
function fileNameOf(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? ''
  return [...last.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, '')].slice(0, 200).join('') || 'robot.urdf'
}

export interface AcceptedUpload extends ReadFile {
  readonly fileName: string
  readonly bytes: Uint8Array
  readonly read: NonNullable<ReadFile['read']>
}

/** An uploaded file that may be stored. Fails with import-refused and every finding. */
export async function acceptUpload(file: UploadedFile): Promise<AcceptedUpload> {
  const { findings, read, sourceDigest } = await readFile(file.bytes)
  if (read !== null) return { fileName: fileNameOf(file.name), bytes: file.bytes, sourceDigest, findings, read }
  const errors = findings.filter((finding) => finding.severity === 'error')
  const [first] = errors
  const where = first === undefined ? '' : ` The first is at line ${first.line}: ${first.message}`
  fail('import-refused', `The file has ${errors.length === 1 ? 'one error' : `${errors.length} errors`}; nothing was stored.${where}`, { members: { findings } })
}
