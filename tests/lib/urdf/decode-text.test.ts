import { describe, expect, it } from 'vitest'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { bytesOf } from './urdf-text'

const body = '<robot name="Gelenk-ä 🤖">\n  <link name="a"/></robot>'
const declared = (encoding: string) => `<?xml version="1.0" encoding="${encoding}"?>\n${body}`
const utf16 = (text: string, order: 'little' | 'big', mark = true): Uint8Array => {
  const units = (mark ? '\uFEFF' : '') + text
  const bytes = new DataView(new ArrayBuffer(2 * units.length))
  for (let i = 0; i < units.length; i++) bytes.setUint16(2 * i, units.charCodeAt(i), order === 'little')
  return new Uint8Array(bytes.buffer)
}
const join = (...parts: (string | readonly number[] | Uint8Array)[]): Uint8Array =>
  Uint8Array.from(parts.flatMap((part) => (typeof part === 'string' ? [...bytesOf(part)] : [...part])))
const MARK = [0xef, 0xbb, 0xbf]

describe('the encoding of a file', () => {
  it.each([
    ['UTF-8 without anything', bytesOf(body)],
    ['UTF-8 with a byte order mark', join(MARK, body)],
    ['UTF-8 that says so', bytesOf(declared('utf-8'))],
    ['UTF-8 with both', join(MARK, declared('UTF-8'))],
    ['UTF-16, little end first', utf16(body, 'little')],
    ['UTF-16, big end first', utf16(body, 'big')],
    ['UTF-16 that says so, little end first', utf16(declared('UTF-16'), 'little')],
    ['UTF-16 that says so, big end first', utf16(declared('utf-16'), 'big')],
    ['UTF-16LE without a mark, by its declaration', utf16(declared('UTF-16LE'), 'little', false)],
    ['UTF-16BE without a mark, by its declaration', utf16(declared('UTF-16'), 'big', false)],
  ])('is read: %s', (_what, bytes) => {
    const { description, findings } = parseUrdf(bytes)
    expect(findings).toEqual([])
    expect(description!.robotName).toBe('Gelenk-ä 🤖')
  })

  it('is read as ASCII where it says so and is', () => {
    expect(parseUrdf(bytesOf(declared('US-ASCII').replace('ä 🤖', 'a'))).findings).toEqual([])
  })

  it.each([
    ['ISO 8859-1', bytesOf(declared('ISO-8859-1')), 1, 31, "'ISO-8859-1', which is not read here"],
    ['Windows-1252', bytesOf(declared('windows-1252')), 1, 31, "'windows-1252', which is not read here"],
    ['UTF-8 that says UTF-16', bytesOf(declared('UTF-16')), 1, 31, 'but its bytes are UTF-8'],
    ['UTF-16 that says UTF-8', utf16(declared('UTF-8'), 'little'), 1, 31, 'but its bytes are UTF-16'],
    ['UTF-16, little end first, that says big', utf16(declared('UTF-16BE'), 'little'), 1, 31, 'but its bytes are UTF-16'],
    ['UTF-16 without mark and declaration', utf16(body, 'little', false), 1, 1, 'UTF-16 without a byte order mark'],
    ['UTF-32', join([0xff, 0xfe, 0, 0, 0x3c, 0, 0, 0]), 1, 1, 'UTF-32'],
    ['EBCDIC', join([0x4c, 0x6f, 0xa7, 0x94, 0x93]), 1, 1, 'EBCDIC'],
    ['ASCII with an umlaut', bytesOf(declared('ascii')), 2, 21, "'ascii', which does not have the character"],
    ['an umlaut of ISO 8859-1', join('<robot>\n <link name="', [0xe4], '"/></robot>'), 2, 14, 'The byte E4'],
    ['an overlong slash', join('<robot name="', [0xc0, 0xaf], '"/>'), 1, 14, 'The byte C0'],
    ['an overlong NUL', join('<robot name="', [0xe0, 0x80, 0x80], '"/>'), 1, 14, 'The byte E0'],
    ['half a surrogate pair in UTF-8', join('<robot name="', [0xed, 0xa0, 0x80], '"/>'), 1, 14, 'The byte ED'],
    ['a code point beyond Unicode', join('<robot name="', [0xf4, 0x90, 0x80, 0x80], '"/>'), 1, 14, 'The byte F4'],
    ['a sequence that the next character cuts short', join('<robot name="é', [0xe2, 0x82], 'x"/>'), 1, 15, 'The byte E2'],
    ['a sequence that the end cuts short', join('<robot/>', [0xf0, 0x9f, 0xa4]), 1, 9, 'The byte F0'],
    ['half a surrogate pair in UTF-16', utf16('<robot name="\ud800"/>', 'little'), 1, 14, 'The byte 00'],
    ['UTF-16 of an odd length', utf16(body, 'big').subarray(0, -1), 2, 26, 'The byte 00'],
  ])('is refused, named and located: %s', (_what, bytes, line, column, words) => {
    const { description, findings } = parseUrdf(bytes)
    expect(description).toBeNull()
    expect(findings).toMatchObject([{ rule: 'encoding-unsupported', line, column }])
    expect(findings[0]!.message).toContain(words)
  })

  it('keeps U+FFFD where the file has it', () => {
    expect(parseUrdf(bytesOf('<robot name="\uFFFD"><link name="a"/></robot>')).description!.robotName).toBe('\uFFFD')
  })
})

describe('a file that is not XML', () => {
  it.each([
    ['a PNG picture', join([0x89], 'PNG\r\n', [0x1a, 0x0a])],
    ['a JPEG picture', join([0xff, 0xd8, 0xff, 0xe0])],
    ['a PDF document', bytesOf('%PDF-1.7\n')],
    ['a zip archive', join('PK', [3, 4, 20, 0])],
    ['a gzip archive', join([0x1f, 0x8b, 8])],
    ['an STL mesh', bytesOf('solid arm\nfacet normal 0 0 1\n')],
    ['a binary glTF model', bytesOf('glTF\u0002')],
    ['a web page', bytesOf('<!DOCTYPE html>\n<html></html>')],
    ['a web page', bytesOf('\n<!-- saved --><html lang="en"><head/></html>')],
    ['JSON', bytesOf(' {"robot": {}}')],
    ['JSON', bytesOf('[\n  1, 2]')],
    ['plain text', bytesOf('robot: arm\n')],
    ['empty', new Uint8Array()],
    ['empty', bytesOf(' \r\n\t')],
    ['empty', join(MARK)],
  ])('is called %s', (kind, bytes) => {
    const { description, findings } = parseUrdf(bytes)
    expect(description).toBeNull()
    expect(findings).toMatchObject([{ rule: 'not-xml', severity: 'error', line: 1, column: 1 }])
    expect(findings[0]!.message).toContain(kind)
  })
})
