/** Characters and names of XML 1.0 (fifth edition, W3C 2008), productions 2, 3, 4, 4a, 5 and 66. */

const START =
  ':A-Z_a-z\\u{C0}-\\u{D6}\\u{D8}-\\u{F6}\\u{F8}-\\u{2FF}\\u{370}-\\u{37D}\\u{37F}-\\u{1FFF}\\u{200C}\\u{200D}\\u{2070}-\\u{218F}' +
  '\\u{2C00}-\\u{2FEF}\\u{3001}-\\u{D7FF}\\u{F900}-\\u{FDCF}\\u{FDF0}-\\u{FFFD}\\u{10000}-\\u{EFFFF}'
const NAME = new RegExp(`[${START}][${START}\\-.0-9\\u{B7}\\u{300}-\\u{36F}\\u{203F}\\u{2040}]*`, 'uy')
const ILLEGAL = /[^\t\n\r\u{20}-\u{D7FF}\u{E000}-\u{FFFD}\u{10000}-\u{10FFFF}]/u
const REFERENCE = /&(?:#x([0-9a-fA-F]+)|#([0-9]+)|(lt|gt|amp|apos|quot));/y
const PREDEFINED: Readonly<Record<string, string>> = { lt: '<', gt: '>', amp: '&', apos: "'", quot: '"' }

/** The XML name that starts at `offset`; empty when none does. */
export function readName(text: string, offset: number): string {
  NAME.lastIndex = offset
  return NAME.exec(text)?.[0] ?? ''
}

/** Offset of the first character that XML does not allow (most control characters, lone surrogates); -1 when all are legal. */
export const findIllegalCharacter = (text: string): number => text.search(ILLEGAL)

export const isBlank = (text: string): boolean => !/[^ \t\r\n]/.test(text)

/** Offset of the first character at or after `offset` that is not white space. */
export function skipBlanks(text: string, offset: number): number {
  let at = offset
  for (; at < text.length; at++) {
    const code = text.charCodeAt(at)
    if (code !== 32 && code !== 9 && code !== 10 && code !== 13) break
  }
  return at
}

const fromCodePoint = (code: number): string => (code <= 0x10ffff ? String.fromCodePoint(code) : '\uFFFF')

/** What the character or predefined entity reference at `offset` stands for and its length in the text; null when there is
 *  none, or when it stands for a character that XML does not allow. */
export function readReference(text: string, offset: number): { value: string; length: number } | null {
  REFERENCE.lastIndex = offset
  const match = REFERENCE.exec(text)
  if (!match) return null
  const [whole, hex, decimal, name] = match
  const value = name ? PREDEFINED[name]! : fromCodePoint(hex ? parseInt(hex, 16) : parseInt(decimal!, 10))
  return ILLEGAL.test(value) ? null : { value, length: whole.length }
}

const NOT_PREDEFINED = /&(?!(?:lt|gt|amp|apos|quot);)/g

/** Offset, counted in `text`, of the first `&` that is not a legal reference; -1 when there is none. */
export function findBadReference(text: string): number {
  NOT_PREDEFINED.lastIndex = 0
  for (let match = NOT_PREDEFINED.exec(text); match; match = NOT_PREDEFINED.exec(text)) {
    if (!readReference(text, match.index)) return match.index
  }
  return -1
}

/** The value of an attribute as XML 1.0 section 3.3.3 normalises it: white space becomes blanks, references are resolved
 *  (a referenced tab or newline stays what it is). `raw` has passed `findBadReference`. */
export function decodeAttribute(raw: string): string {
  if (!/[&\t\r\n]/.test(raw)) return raw
  if (!/[\t\r\n]|&#/.test(raw)) {
    // Those that stand for no '&' first, so that none is read that another has made.
    return raw.replaceAll('&lt;', '<').replaceAll('&gt;', '>').replaceAll('&apos;', "'").replaceAll('&quot;', '"').replaceAll('&amp;', '&')
  }
  return raw.replace(/&#?(\w+);|\r\n|[\t\r\n]/g, (met: string, name?: string) => (name === undefined ? ' ' : (PREDEFINED[name] ?? readReference(met, 0)!.value)))
}
