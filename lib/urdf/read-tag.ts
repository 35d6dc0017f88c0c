import { decodeAttribute, findBadReference, readName, skipBlanks } from '@/lib/urdf/xml-characters'

/** An attribute with the offset of its name and of the first character inside its quotes. */
export interface Attribute {
  readonly name: string
  readonly value: string
  readonly nameAt: number
  readonly valueAt: number
}

export interface Tag {
  readonly name: string
  readonly attributes: readonly Attribute[]
  /** Offset behind the closing `>`. */
  readonly end: number
  readonly selfClosing: boolean
}

/** Why a text is not well formed, and at which offset. */
export interface Fault {
  readonly at: number
  readonly message: string
}

export const isFault = (result: object): result is Fault => 'message' in result

const shown = (text: string, at: number): string => {
  const code = text.codePointAt(at)
  if (code === undefined) return 'the file ends'
  return code === 10 || code === 13 ? 'the line ends' : `'${String.fromCodePoint(code)}' stands`
}

const MANY = 12

/** Reads the start tag whose `<` is at `offset` by the grammar of XML 1.0 (productions 10, 40, 41, 44), strictly. */
export function readTag(text: string, offset: number): Tag | Fault {
  const name = readName(text, offset + 1)
  if (!name) return { at: offset + 1, message: `After '<' ${shown(text, offset + 1)} where the name of an element is expected.` }
  const attributes: Attribute[] = []
  let seen: Set<string> | null = null
  let at = offset + 1 + name.length
  for (;;) {
    const next = skipBlanks(text, at)
    if (text[next] === '>') return { name, attributes, end: next + 1, selfClosing: false }
    if (text.startsWith('/>', next)) return { name, attributes, end: next + 2, selfClosing: true }
    if (next >= text.length) return { at: offset, message: `The tag <${name}> is not closed before the file ends.` }
    const attribute = readAttribute(text, next, name)
    if (isFault(attribute)) return attribute
    if (next === at) return { at: next, message: `A blank is missing before the attribute '${attribute.name}' of <${name}>.` }
    // Few names are quicker looked through than collected, and most tags have few.
    if (attributes.length === MANY) seen = new Set(attributes.map((known) => known.name))
    if (seen?.has(attribute.name) ?? attributes.some((known) => known.name === attribute.name)) return { at: next, message: `The attribute '${attribute.name}' of <${name}> is given twice.` }
    seen?.add(attribute.name)
    attributes.push(attribute)
    at = attribute.end
  }
}

function readAttribute(text: string, nameAt: number, tag: string): (Attribute & { end: number }) | Fault {
  const name = readName(text, nameAt)
  if (!name) return { at: nameAt, message: `In the tag <${tag}> ${shown(text, nameAt)} where an attribute or '>' is expected.` }
  const equals = skipBlanks(text, nameAt + name.length)
  if (text[equals] !== '=') return { at: equals, message: `The attribute '${name}' of <${tag}> has no value: ${shown(text, equals)} where '=' is expected.` }
  const open = skipBlanks(text, equals + 1)
  const quote = text[open]
  if (quote !== '"' && quote !== "'") return { at: open, message: `The value of '${name}' in <${tag}> is not in quotes: ${shown(text, open)}.` }
  const close = text.indexOf(quote, open + 1)
  if (close === -1) return { at: open, message: `The quote that opens the value of '${name}' in <${tag}> is not closed.` }
  const raw = text.slice(open + 1, close)
  const angle = raw.indexOf('<')
  if (angle !== -1) return { at: open + 1 + angle, message: `The value of '${name}' in <${tag}> holds '<': a quote is missing, or it must be written &lt;.` }
  const bad = raw.includes('&') ? findBadReference(raw) : -1
  if (bad !== -1) return { at: open + 1 + bad, message: badReference(raw, bad) }
  return { name, value: decodeAttribute(raw), nameAt, valueAt: open + 1, end: close + 1 }
}

/** What to say of the `&` at `at` in `text` that is no legal reference. */
export function badReference(text: string, at: number): string {
  const met = /^&[^\s;&<>'"]{0,32};/u.exec(text.slice(at, at + 64))?.[0]
  return met
    ? `${met} is not a character that XML allows, nor one of the entities it defines (&lt; &gt; &amp; &apos; &quot;).`
    : "'&' must be written &amp;."
}
