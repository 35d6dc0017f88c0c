/** Byte order marks and the beginnings of XML without one (XML 1.0, appendix F). */
const BEGINNINGS: readonly (readonly [bytes: readonly number[], encoding: 'utf-16le' | 'utf-16be' | 'utf-8', mark: number])[] = [
  [[0xef, 0xbb, 0xbf], 'utf-8', 3],
  [[0xff, 0xfe], 'utf-16le', 2],
  [[0xfe, 0xff], 'utf-16be', 2],
  [[0x3c, 0], 'utf-16le', 0],
  [[0, 0x3c], 'utf-16be', 0],
]

/** The text of a file as the source view shows it, without its byte order mark, so that columns agree with the importer's.
 *  What is not text in its encoding becomes U+FFFD and stays visible; the stored bytes are never touched. */
export function sourceText(bytes: Uint8Array): string {
  const [, encoding, mark] = BEGINNINGS.find(([start]) => start.every((byte, i) => bytes[i] === byte)) ?? [[], 'utf-8', 0]
  return new TextDecoder(encoding, { ignoreBOM: true }).decode(bytes.subarray(mark))
}
