const KINDS: readonly (readonly [kind: string, starts: readonly string[]])[] = [
  ['a PNG picture', ['\x89PNG']],
  ['a JPEG picture', ['\xff\xd8\xff']],
  ['a GIF picture', ['GIF8']],
  ['a PDF document', ['%PDF']],
  ['a zip archive, and its name does not end in .zip', ['PK\x03\x04', 'PK\x05\x06']],
  ['a gzip archive', ['\x1f\x8b']],
  ['a 7z archive', ['7z\xbc\xaf\x27\x1c']],
  ['a RAR archive', ['Rar!']],
  ['a binary glTF model', ['glTF']],
  ['a STEP file', ['ISO-10303-21']],
  ['an STL mesh', ['solid ', 'solid\n', 'solid\r']],
  ['an executable', ['\x7fELF', 'MZ']],
]

/** What kind of file begins with these bytes, where it is surely not XML; null when it may be. Only the first bytes are looked at. */
export function findForeignKind(bytes: Uint8Array): string | null {
  const start = String.fromCharCode(...bytes.subarray(0, 512))
  for (const [kind, starts] of KINDS) if (starts.some((magic) => start.startsWith(magic))) return kind
  return null
}

/** The same for a text: a web page, JSON, or something that does not begin with '<'. `text` is not blank. */
export function findForeignText(text: string): string | null {
  const start = text.slice(0, 512).trimStart()
  if (/^(<\?xml[^>]*>\s*)?(<!--[^>]*-->\s*)*<(!doctype\s+html|html[\s>])/i.test(start)) return 'a web page (HTML)'
  if (/^(\{\s*("|\})|\[\s*["{[\]\d])/.test(start)) return 'JSON'
  if (start !== '' && !start.startsWith('<')) return 'plain text'
  return null
}
