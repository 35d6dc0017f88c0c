/** Bytes kept under the SHA-256 of what they are: what is under a digest never changes, and what was put once need not be put again.
 *  Nothing is ever taken out. A file that no row names, because the import behind it failed, is harmless: it is found again when
 *  the same bytes come. */
export interface Storage {
  /** Keeps the bytes durably. digest: their SHA-256, 64 hexadecimal digits. */
  put(digest: string, bytes: Uint8Array): Promise<void>
  /** The bytes; null when there are none of this digest. */
  get(digest: string): Promise<Uint8Array | null>
  has(digest: string): Promise<boolean>
}

/** Name of a digest in a store: spread over 256 folders. */
export const placeOf = (digest: string): string => `${digest.slice(0, 2)}/${digest}`
