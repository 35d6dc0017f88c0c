import type { Storage } from './storage'

/** Files that end with the process, beside a database in memory. */
export function memoryStorage(): Storage {
  const files = new Map<string, Uint8Array>()
  return {
    has: async (digest) => files.has(digest),
    get: async (digest) => files.get(digest)?.slice() ?? null,
    put: async (digest, bytes) => void files.set(digest, bytes.slice()),
  }
}
