import { decodeText } from '@/lib/urdf/decode-text'

/** The text of an XML file for a person to look at; of a file with a broken encoding, the part before the fault. */
export function decodeXml(bytes: Uint8Array): string {
  const decoded = decodeText(bytes)
  return 'text' in decoded ? decoded.text : decoded.read
}
