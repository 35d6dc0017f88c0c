/** A String of a structured field (RFC 9651 section 3.3.3), or a Display String (3.3.8) where the text goes beyond printable ASCII. */
export function fieldText(text: string): string {
  if (/^[\x20-\x7e]*$/.test(text)) return `"${text.replace(/["\\]/g, '\\$&')}"`
  const encoded = Array.from(new TextEncoder().encode(text), (byte) => {
    const isPlain = byte >= 0x20 && byte <= 0x7e && byte !== 0x25 && byte !== 0x22
    return isPlain ? String.fromCharCode(byte) : `%${byte.toString(16).padStart(2, '0')}`
  })
  return `%"${encoded.join('')}"`
}
