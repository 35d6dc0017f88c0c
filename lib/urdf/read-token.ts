import { badReference, isFault, readTag, type Fault, type Tag } from '@/lib/urdf/read-tag'
import { findBadReference, isBlank, readName, skipBlanks } from '@/lib/urdf/xml-characters'

/** A piece of an XML text. An aside is a comment, a processing instruction or the XML declaration. */
export type Token =
  | { readonly kind: 'text' | 'cdata' | 'aside' | 'doctype'; readonly end: number }
  | { readonly kind: 'end-tag'; readonly end: number; readonly name: string }
  | { readonly kind: 'start-tag'; readonly end: number; readonly tag: Tag }

const DECLARATION =
  /^<\?xml[ \t\r\n]+version[ \t\r\n]*=[ \t\r\n]*(["'])1\.[0-9]+\1([ \t\r\n]+encoding[ \t\r\n]*=[ \t\r\n]*(["'])[A-Za-z][A-Za-z0-9._-]*\3)?([ \t\r\n]+standalone[ \t\r\n]*=[ \t\r\n]*(["'])(yes|no)\5)?[ \t\r\n]*\?>$/

/** Reads the token at `at` by the grammar of XML 1.0, strictly. Each character is looked at a bounded number of times. */
export function readToken(text: string, at: number): Token | Fault {
  if (text[at] !== '<') return readText(text, at)
  if (text[at + 1] === '/') return readEndTag(text, at)
  if (text[at + 1] === '?') return readInstruction(text, at)
  if (text[at + 1] === '!') return readDeclaration(text, at)
  const tag = readTag(text, at)
  return isFault(tag) ? tag : { kind: 'start-tag', end: tag.end, tag }
}

function readText(text: string, at: number): Token | Fault {
  const next = text.indexOf('<', at)
  const end = next === -1 ? text.length : next
  const words = text.slice(at, end)
  const bad = findBadReference(words)
  if (bad !== -1) return { at: at + bad, message: badReference(words, bad) }
  const bracket = words.indexOf(']]>')
  if (bracket !== -1) return { at: at + bracket, message: "']]>' may stand only at the end of a CDATA section." }
  return { kind: 'text', end }
}

function readEndTag(text: string, at: number): Token | Fault {
  const name = readName(text, at + 2)
  const close = skipBlanks(text, at + 2 + name.length)
  if (!name || text[close] !== '>') return { at, message: 'This end tag is not of the form </name>.' }
  return { kind: 'end-tag', end: close + 1, name }
}

function readInstruction(text: string, at: number): Token | Fault {
  const close = text.indexOf('?>', at + 2)
  if (close === -1) return { at, message: 'The processing instruction that begins here is not closed by ?>.' }
  const target = readName(text, at + 2)
  const behind = at + 2 + target.length
  if (!target || (behind < close && !isBlank(text[behind]!))) return { at, message: "After '<?' a name is expected, then a blank or ?>." }
  if (target.toLowerCase() === 'xml') {
    if (at !== 0) return { at, message: 'The XML declaration is not the very first thing in the file: delete the lines or blanks before it.' }
    if (!DECLARATION.test(text.slice(0, close + 2))) {
      return { at, message: 'The XML declaration is not of the form <?xml version="1.0" encoding="UTF-8"?>.' }
    }
  }
  return { kind: 'aside', end: close + 2 }
}

function readDeclaration(text: string, at: number): Token | Fault {
  if (text.startsWith('<!--', at)) {
    const close = text.indexOf('--', at + 4)
    if (close === -1) return { at, message: 'The comment that begins here is not closed by -->.' }
    if (text[close + 2] !== '>') return { at: close, message: "'--' may not stand inside a comment." }
    return { kind: 'aside', end: close + 3 }
  }
  if (text.startsWith('<![CDATA[', at)) {
    const close = text.indexOf(']]>', at + 9)
    if (close === -1) return { at, message: 'The CDATA section that begins here is not closed by ]]>.' }
    return { kind: 'cdata', end: close + 3 }
  }
  const doctype = /^<!(DOCTYPE|ENTITY|ELEMENT|ATTLIST|NOTATION)/i.exec(text.slice(at, at + 12))
  if (doctype) return { kind: 'doctype', end: at + doctype[0].length }
  return { at, message: "'<!' opens neither a comment nor a CDATA section." }
}
