import { createHash } from 'node:crypto'
import { isZip } from '@/lib/archive/archive-kinds'
import { type ArchiveFile, type OpenedArchive, openArchive } from '@/lib/archive/open-archive'
import { archiveFinding } from '@/lib/archive/refuse-archive'
import { CheckedImport } from '@/lib/contract/description'
import type { Description, Finding } from '@/lib/urdf/description'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { presentMeshes } from './present-meshes'
import { presentStructure } from './present-structure'

/** What is made of an upload. read: null when a finding is an error. */
export interface ReadFile {
  /** SHA-256 over the upload, hexadecimal. */
  readonly sourceDigest: string
  readonly findings: readonly Finding[]
  readonly read: { readonly description: Description; readonly fingerprint: string } | null
  /** Where the upload is an archive: the description in it that was read, those that could be, and the meshes beside it. */
  readonly archive?: {
    readonly entry: { readonly path: string; readonly bytes: Uint8Array } | null
    readonly descriptions: readonly string[]
    readonly files: readonly ArchiveFile[]
  }
}

/** A file to read. as: the parts, or the JSON that the check of an import answers, parsed by its schema and written. */
export interface ReaderQuestion {
  /** As the sender called it: an archive is called .zip. */
  readonly name: string
  readonly bytes: Uint8Array
  /** Path of the description in an archive that has several. */
  readonly entry?: string | undefined
  readonly as: 'parts' | 'json'
}

const readArchive = ({ description, descriptions, files, findings }: OpenedArchive): Omit<ReadFile, 'sourceDigest'> => {
  const archive = { entry: description, descriptions, files }
  if (description === null) return { findings, read: null, archive }
  const parsed = parseUrdf(description.bytes, { files: files.map(({ path }) => path) })
  return { findings: [...parsed.findings, ...findings], read: withFingerprint(parsed.description), archive }
}

const withFingerprint = (description: Description | null): ReadFile['read'] => description && { description, fingerprint: fingerprint(description) }

async function readAny({ name, bytes, entry }: ReaderQuestion): Promise<Omit<ReadFile, 'sourceDigest'>> {
  if (isZip(name, bytes)) return readArchive(await openArchive(bytes, entry))
  if (entry !== undefined) return { findings: [archiveFinding('archive-entry-missing', 'An entry is named, but the upload is a single file.')], read: null }
  const { description, findings } = parseUrdf(bytes)
  return { findings, read: withFingerprint(description) }
}

/** Reads an upload and, where it is asked for, writes the answer about it: everything that takes time with a large one. */
export async function answerReader(question: ReaderQuestion): Promise<ReadFile | string> {
  const file: ReadFile = { sourceDigest: createHash('sha256').update(question.bytes).digest('hex'), ...(await readAny(question)) }
  return question.as === 'parts' ? file : writeCheck(file)
}

/** The memory of an answer that changes hands instead of being copied. */
export const transferredWith = (answer: ReadFile | string): ArrayBuffer[] => (typeof answer === 'string' ? [] : (answer.archive?.files ?? []).map(({ bytes }) => bytes.buffer))

/** The answer to the check of an import as JSON. */
export function writeCheck({ sourceDigest, findings, read, archive }: ReadFile): string {
  const files = archive?.files ?? []
  return JSON.stringify(
    CheckedImport.parse({
      findings: [...findings],
      ...(read === null ? {} : { structure: presentStructure(read.description, { fingerprint: read.fingerprint, sourceDigest }), ...presentMeshes(read.description, files.map(({ path, bytes }) => ({ path, size: bytes.length }))) }),
      ...(archive === undefined ? {} : { archive: { ...(archive.entry === null ? {} : { entry: archive.entry.path }), descriptions: [...archive.descriptions] } }),
    }),
  )
}
