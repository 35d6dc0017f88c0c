import { isFault, type Tag } from '@/lib/urdf/read-tag'
import { readToken } from '@/lib/urdf/read-token'
import { createNamespaces } from '@/lib/urdf/namespaces'
import type { Report } from '@/lib/urdf/report'
import { findIllegalCharacter, isBlank, skipBlanks } from '@/lib/urdf/xml-characters'

export const XML_LIMITS = { depth: 64, elements: 200_000, attributes: 64, name: 256 } as const

/** The bare nesting of a text: `tags` has its start and end tags without attributes and nothing between them; `starts` has the
 *  offset of each element's `<` in the text, in the order of the start tags. */
export interface ScannedXml {
  readonly tags: string
  readonly starts: readonly number[]
}

/** Checks in one pass and in linear time that a text is well-formed XML 1.0 without a document type and within our limits.
 *  The first fault is reported and ends the scan with null; names that are too long are reported without ending it. */
export function scanXml(text: string, report: Report): ScannedXml | null {
  const illegal = findIllegalCharacter(text)
  if (illegal !== -1) return malformed(report, illegal, illegalCharacter(text, illegal))
  const open: { name: string; at: number }[] = []
  const namespaces = createNamespaces(report)
  let tags = ''
  const starts: number[] = []
  for (let at = 0; at < text.length; ) {
    const token = readToken(text, at)
    if (isFault(token)) return malformed(report, token.at, token.message)
    if (token.kind === 'doctype') {
      report.add('doctype-refused', at, `The file has a declaration ${text.slice(at, token.end)} …>, which can define entities.`)
      return null
    }
    const outside = open.length === 0
    const solid = token.kind === 'start-tag' || token.kind === 'cdata' || (token.kind === 'text' && !isBlank(text.slice(at, token.end)))
    if (outside && solid && starts.length > 0) {
      report.add('text-after-robot', skipBlanks(text, at), 'Something follows the end of the outermost element.')
      return null
    }
    if (outside && solid && token.kind !== 'start-tag') return malformed(report, skipBlanks(text, at), 'Text stands before the first element.')
    if (token.kind === 'start-tag') {
      const { name, selfClosing } = token.tag
      starts.push(at)
      if (!withinLimits(report, token.tag, at, starts.length, open.length + 1)) return null
      namespaces.enter(token.tag, at)
      if (selfClosing) namespaces.leave()
      else open.push({ name, at })
      tags += `<${name}${selfClosing ? '/>' : '>'}`
    } else if (token.kind === 'end-tag') {
      const opened = open.pop()
      if (!opened) return malformed(report, at, `</${token.name}> closes an element that was not opened.`)
      if (opened.name !== token.name) {
        const where = report.lineAt(opened.at)
        return malformed(report, at, `</${token.name}> stands where </${opened.name}> is expected: the <${opened.name}> of line ${where} is not closed.`)
      }
      namespaces.leave()
      tags += `</${token.name}>`
    }
    at = token.end
  }
  const last = open.pop()
  if (last) return malformed(report, last.at, `<${last.name}> is not closed before the file ends.`)
  if (starts.length === 0) return malformed(report, 0, 'The file has no element.')
  return { tags, starts }
}

function malformed(report: Report, at: number, message: string): null {
  report.add('xml-malformed', at, message)
  return null
}

function withinLimits(report: Report, tag: Tag, at: number, elements: number, depth: number): boolean {
  const name = tag.name.slice(0, XML_LIMITS.name)
  if (elements > XML_LIMITS.elements) report.add('too-many-elements', at, `This is element ${elements}; at most ${XML_LIMITS.elements} are read.`)
  else if (depth > XML_LIMITS.depth) report.add('too-deep', at, `<${name}> stands on level ${depth}; at most ${XML_LIMITS.depth} are read.`)
  else if (tag.attributes.length > XML_LIMITS.attributes) {
    report.add('too-many-attributes', at, `<${name}> has ${tag.attributes.length} attributes; at most ${XML_LIMITS.attributes} are read.`)
  } else {
    checkName(report, tag.name, at, 'this element')
    for (const attribute of tag.attributes) checkName(report, attribute.name, attribute.nameAt, 'this attribute')
    return true
  }
  return false
}

/** Reports a name of more than 256 characters. */
export function checkName(report: Report, name: string, at: number, whose: string): void {
  if (name.length <= XML_LIMITS.name) return
  const length = [...name].length
  if (length > XML_LIMITS.name) report.add('name-too-long', at, `The name of ${whose} has ${length} characters; at most ${XML_LIMITS.name} are read.`)
}

function illegalCharacter(text: string, at: number): string {
  const code = text.codePointAt(at)!.toString(16).toUpperCase().padStart(4, '0')
  return `The character U+${code} stands here, which XML does not allow.`
}
