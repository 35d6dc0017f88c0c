import type { Finding } from '@/lib/urdf/description'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text)
export const parse = (text: string) => parseUrdf(bytesOf(text))

/** The description of a text that must be accepted. */
export function described(text: string) {
  const { description, findings } = parse(text)
  if (!description) throw new Error(`refused: ${JSON.stringify(findings)}`)
  return description
}

export const rulesOf = (findings: readonly Finding[]): string[] => findings.map(({ rule }) => rule)

export const robot = (body: string, attributes = ''): string => `<robot name="r"${attributes}>${body}</robot>`
export const links = (...names: string[]): string => names.map((name) => `<link name="${name}"/>`).join('')

/** A joint from `parent` to `child`, well defined unless `body` or `type` say otherwise. */
export const joint = (name: string, parent: string, child: string, body = '', type = 'fixed'): string =>
  `<joint name="${name}" type="${type}"><parent link="${parent}"/><child link="${child}"/>${body}</joint>`

export const AXIS = '<axis xyz="0 0 1"/>'
export const LIMIT = '<limit lower="-1" upper="1" effort="5" velocity="2"/>'
/** A robot of two links and one revolute joint `turn` with this in it. */
export const turning = (body: string, attributes = '', type = 'revolute'): string =>
  robot(links('base', 'arm') + joint('turn', 'base', 'arm', body, type), attributes)

/** A text with the mark ¦ at the place where a finding is expected: the text without it, and the place. */
export function marked(text: string): { text: string; line: number; column: number } {
  const before = text.slice(0, text.indexOf('¦')).split(/\r\n|\r|\n/)
  return { text: text.replace('¦', ''), line: before.length, column: [...before.at(-1)!].length + 1 }
}
