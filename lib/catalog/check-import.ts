import type { UseCase } from '@/lib/access/use-case'
import { presentStructure } from './present-structure'
import { readUpload } from './read-upload'

/** What the importer has to say about a file, and what it would store. Stores nothing. */
export const checkImport: UseCase<'checkImport'> = async (_caller, { file }) => {
  const { findings, read, sourceDigest } = readUpload(file)
  const structure = read === null ? {} : { structure: presentStructure(read.description, { fingerprint: read.fingerprint, sourceDigest }) }
  return { body: { findings: [...findings], ...structure } }
}
