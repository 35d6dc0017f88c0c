import path from 'node:path'
import { dataDir, isDatabaseInMemory, objectStore } from '@/lib/env'
import { folderStorage } from './folder-storage'
import { memoryStorage } from './memory-storage'
import type { Storage } from './storage'

// One a process, though its bundles load this module several times.
const shared = globalThis as typeof globalThis & { elbowroomFiles?: Promise<Storage> }

async function open(): Promise<Storage> {
  const store = objectStore()
  // The client of object stores is large, and loaded only where there is one.
  if (store !== undefined) return (await import('./object-storage')).objectStorage(store)
  return isDatabaseInMemory() ? memoryStorage() : folderStorage(path.join(/* turbopackIgnore: true */ dataDir(), 'files'))
}

/** The file storage of this installation. Fails with a sentence for the operator when it is configured wrongly. */
export const fileStorage = (): Promise<Storage> => (shared.elbowroomFiles ??= open())
