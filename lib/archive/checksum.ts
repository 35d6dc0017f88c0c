/** CRC-32 of each byte, reflected, polynomial 0xEDB88320 (ISO 3309, as the zip format uses it). */
const TABLE = Int32Array.from({ length: 256 }, (_, byte) => {
  let rest = byte
  for (let bit = 0; bit < 8; bit++) rest = rest & 1 ? (rest >>> 1) ^ 0xedb88320 : rest >>> 1
  return rest
})

/** CRC-32 of the bytes, 0 to 2³² − 1. */
export function checksumOf(bytes: Uint8Array): number {
  let rest = -1
  for (let i = 0; i < bytes.length; i++) rest = (rest >>> 8) ^ TABLE[(rest ^ bytes[i]!) & 0xff]!
  return ~rest >>> 0
}
