import { describe, expect, it } from 'vitest'
import { sourceText } from '@/components/import/source-text'

const utf16 = (text: string, bigEndian = false): Uint8Array => {
  const bytes = new Uint8Array(Buffer.from(text, 'utf16le'))
  return bigEndian ? new Uint8Array(Buffer.from(bytes).swap16()) : bytes
}

describe('sourceText', () => {
  const text = '<robot name="Größe 🦾"/>\r\n'

  it.each([
    ['UTF-8', new TextEncoder().encode(text)],
    ['UTF-8 with a byte order mark', new TextEncoder().encode(`\ufeff${text}`)],
    ['UTF-16, little end first', utf16(`\ufeff${text}`)],
    ['UTF-16, big end first', utf16(`\ufeff${text}`, true)],
    ['UTF-16 without a mark', utf16(text)],
    ['UTF-16 without a mark, big end first', utf16(text, true)],
  ])('reads %s, and leaves the mark out of the columns', (_, bytes) => expect(sourceText(bytes)).toBe(text))

  it('keeps what is not text visible, and never throws', () => {
    expect(sourceText(Uint8Array.of(0x61, 0xff, 0x62))).toBe('a\ufffdb')
    expect(sourceText(Uint8Array.of(0xff, 0xfe, 0x41))).toContain('\ufffd')
    expect(sourceText(new Uint8Array(0))).toBe('')
  })
})
