import type { UploadedFile } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'
import type { ReadFile } from './answer-reader'
import { readFile } from './reader-pool'

/** The last part of the name as sent, without control characters; never used as a path. */
function fileNameOf(sent: string): string {
  const last = sent.split(/[/\\]/).at(-1) ?? ''
  const name = [...last.replace(/[\p{Cc}\p{Cf}\p{Cs}]/gu, '')].slice(0, 200).join('').trim()
  return /^\.*$/.test(name) ? 'robot.urdf' : name
}

export interface AcceptedUpload extends ReadFile {
  readonly fileName: string
  readonly bytes: Uint8Array
  readonly read: NonNullable<ReadFile['read']>
}

/** An uploaded file that may be stored. entry: path of the description in an archive that has several. Fails with import-refused
 *  and every finding. */
export async function acceptUpload(file: UploadedFile, entry: string | undefined): Promise<AcceptedUpload> {
  const { findings, read, ...rest } = await readFile(file, entry)
  if (read !== null) return { ...rest, fileName: fileNameOf(file.name), bytes: file.bytes, findings, read }
  const errors = findings.filter((finding) => finding.severity === 'error')
  const [first] = errors
  const where = first === undefined ? '' : ` The first is at line ${first.line}: ${first.message}`
  fail('import-refused', `The file has ${errors.length === 1 ? 'one error' : `${errors.length} errors`}; nothing was stored.${where}`, {
    members: { findings, ...(rest.archive === undefined ? {} : { descriptions: rest.archive.descriptions }) },
  })
}
