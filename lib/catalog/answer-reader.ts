import { createHash } from 'node:crypto'
import { CheckedImport } from '@/lib/contract/description'
import type { Description, Finding } from '@/lib/urdf/description'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { presentStructure } from './present-structure'

/** What is made of a file. read: null when a finding is an error. */
export interface ReadFile {
  /** SHA-256 over the bytes, hexadecimal. */
  readonly sourceDigest: string
  readonly findings: readonly Finding[]
  readonly read: { readonly description: Description; readonly fingerprint: string } | null
}

/** A file to read. as: the parts, or the JSON that the check of an import answers, parsed by its schema and written. */
export interface ReaderQuestion {
  readonly bytes: Uint8Array
  readonly as: 'parts' | 'json'
}

/** Reads a file and, where it is asked for, writes the answer about it: everything that takes time with a large one. */
export function answerReader({ bytes, as }: ReaderQuestion): ReadFile | string {
  const { description, findings } = parseUrdf(bytes)
  const file: ReadFile = {
    sourceDigest: createHash('sha256').update(bytes).digest('hex'),
    findings,
    read: description === null ? null : { description, fingerprint: fingerprint(description) },
  }
  return as === 'parts' ? file : writeCheck(file)
}

/** The answer to the check of an import as JSON. */
export function writeCheck({ sourceDigest, findings, read }: ReadFile): string {
  const structure = read === null ? {} : { structure: presentStructure(read.description, { fingerprint: read.fingerprint, sourceDigest }) }
  return JSON.stringify(CheckedImport.parse({ findings: [...findings], ...structure }))
}
