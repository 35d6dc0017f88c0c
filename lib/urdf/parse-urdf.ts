import { decodeText } from '@/lib/urdf/decode-text'
import type { Description, Finding } from '@/lib/urdf/description'
import { findForeignKind, findForeignText } from '@/lib/urdf/file-kind'
import { readRobot } from '@/lib/urdf/read-robot'
import { readTree } from '@/lib/urdf/read-tree'
import { createReport } from '@/lib/urdf/report'
import { scanXml } from '@/lib/urdf/scan-xml'

/** What the importer makes of a file: a description unless a finding is an error, and all findings in the order of their places. */
export interface ParsedUrdf {
  readonly description: Description | null
  readonly findings: Finding[]
}

/** A larger file is refused. */
const MOST_BYTES = 8 * 1024 * 1024

/** What came with a file. */
export interface Surroundings {
  /** The paths in the archive that the file came in, with '/' between their parts: its meshes are looked for there. */
  readonly files?: readonly string[]
}

/** Reads a URDF file from its bytes. Trusts nothing and throws nothing, whatever the bytes are; time is linear in their number.
 *  A fault of the text ends the reading; faults of the model are all found in one pass. */
export function parseUrdf(bytes: Uint8Array, { files }: Surroundings = {}): ParsedUrdf {
  const kind = findForeignKind(bytes)
  if (kind) return refusal('', 'not-xml', `The file is ${kind}.`)
  if (bytes.length > MOST_BYTES) return refusal('', 'too-large', `The file has ${bytes.length} bytes; at most ${MOST_BYTES} are read.`)
  const decoded = decodeText(bytes)
  if ('message' in decoded) return refusal(decoded.read, 'encoding-unsupported', decoded.message)
  const { text } = decoded
  if (text.trim() === '') return refusal('', 'not-xml', 'The file is empty.')
  const foreign = findForeignText(text)
  if (foreign) return refusal('', 'not-xml', `The file is ${foreign}.`)

  const report = createReport(text)
  const scanned = scanXml(text, report)
  const description = scanned && readRobot(text, readTree(scanned), report, files ?? null)
  return { description, findings: report.findings() }
}

/** read: the text up to the place of the fault. */
function refusal(read: string, rule: 'not-xml' | 'encoding-unsupported' | 'too-large', message: string): ParsedUrdf {
  const report = createReport(read)
  report.add(rule, read.length, message)
  return { description: null, findings: report.findings() }
}
