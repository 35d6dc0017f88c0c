import { quoted } from '@/lib/urdf/wording'

/** The text of a file, or why it cannot be had: `read` is the part before the fault, `message` says what is wrong there. */
export type Decoded = { readonly text: string } | { readonly read: string; readonly message: string }

interface Encoding {
  readonly name: 'UTF-8' | 'UTF-16LE' | 'UTF-16BE'
  /** Bytes of the byte order mark. */
  readonly mark: number
}

/** Beginnings by which a file gives itself away (XML 1.0, appendix F). null: recognised, but not read. */
const BEGINNINGS: readonly (readonly [bytes: readonly number[], encoding: Encoding | null, name: string])[] = [
  [[0xff, 0xfe, 0, 0], null, 'UTF-32'],
  [[0, 0, 0xfe, 0xff], null, 'UTF-32'],
  [[0x3c, 0, 0, 0], null, 'UTF-32'],
  [[0, 0, 0, 0x3c], null, 'UTF-32'],
  [[0x4c, 0x6f, 0xa7, 0x94], null, 'EBCDIC'],
  [[0xef, 0xbb, 0xbf], { name: 'UTF-8', mark: 3 }, 'UTF-8'],
  [[0xff, 0xfe], { name: 'UTF-16LE', mark: 2 }, 'UTF-16'],
  [[0xfe, 0xff], { name: 'UTF-16BE', mark: 2 }, 'UTF-16'],
  [[0x3c, 0, 0x3f, 0], { name: 'UTF-16LE', mark: 0 }, 'UTF-16'],
  [[0, 0x3c, 0, 0x3f], { name: 'UTF-16BE', mark: 0 }, 'UTF-16'],
  [[0x3c, 0], null, 'UTF-16 without a byte order mark and without an XML declaration'],
  [[0, 0x3c], null, 'UTF-16 without a byte order mark and without an XML declaration'],
]
/** Names by which a declaration may call each encoding. */
const DECLARED: Readonly<Record<Encoding['name'], readonly string[]>> = {
  'UTF-8': ['utf-8', 'utf8'],
  'UTF-16LE': ['utf-16', 'utf-16le'],
  'UTF-16BE': ['utf-16', 'utf-16be'],
}
const ASCII = ['us-ascii', 'ascii']

/** Decodes UTF-8 and UTF-16 strictly, by the byte order mark and the XML declaration; the mark is not part of the text. */
export function decodeText(bytes: Uint8Array): Decoded {
  const met = BEGINNINGS.find(([start]) => start.every((byte, index) => bytes[index] === byte))
  if (met && !met[1]) return { read: '', message: `The file is encoded in ${met[2]}, which is not read here.` }
  const encoding = met?.[1] ?? { name: 'UTF-8', mark: 0 }
  const body = bytes.subarray(encoding.mark)
  const valid = validLength(body, encoding.name)
  const text = new TextDecoder(encoding.name, { ignoreBOM: true }).decode(body.subarray(0, valid), { stream: true })
  const family = encoding.name === 'UTF-8' ? 'UTF-8' : 'UTF-16'
  const [before, declared] = /^(<\?xml[^>]*?\sencoding\s*=\s*["'])([^"']*)["']/.exec(text.slice(0, 512))?.slice(1) ?? []
  const name = declared?.toLowerCase()
  const isAscii = name !== undefined && ASCII.includes(name) && family === 'UTF-8'
  if (name !== undefined && !isAscii && !DECLARED[encoding.name].includes(name)) {
    const known = Object.values(DECLARED).flat().includes(name)
    return { read: before!, message: `The file says that its encoding is ${quoted(declared!)}, ${known ? `but its bytes are ${family}` : 'which is not read here'}.` }
  }
  if (valid < body.length) {
    const at = family === 'UTF-8' ? new TextEncoder().encode(text).length : 2 * text.length
    const byte = body[at]!.toString(16).toUpperCase().padStart(2, '0')
    const guess = family === 'UTF-8' ? ' It was probably saved in an older encoding such as ISO 8859-1 or Windows-1252.' : ''
    return { read: text, message: `The byte ${byte} (hexadecimal) that stands here does not belong in ${family} text.${guess}` }
  }
  const foreign = isAscii ? text.search(/[^\0-\x7f]/) : -1
  if (foreign === -1) return { text }
  return { read: text.slice(0, foreign), message: `The file says that its encoding is ${quoted(declared!)}, which does not have the character that stands here.` }
}

/** How many bytes from the start decode without a fault. A prefix with a fault stays faulty when it grows, so bisection finds it. */
function validLength(bytes: Uint8Array, encoding: Encoding['name']): number {
  const decodes = (length: number): boolean => {
    try {
      new TextDecoder(encoding, { fatal: true }).decode(bytes.subarray(0, length), { stream: length < bytes.length })
      return true
    } catch {
      return false
    }
  }
  if (decodes(bytes.length)) return bytes.length
  let good = 0
  let bad = bytes.length
  while (bad - good > 1) {
    const middle = (good + bad) >> 1
    if (decodes(middle)) good = middle
    else bad = middle
  }
  return good
}
