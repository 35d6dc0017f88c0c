import path from 'node:path'
import { pathToFileURL } from 'node:url'
import { Worker, type ResourceLimits } from 'node:worker_threads'

const FILE = pathToFileURL(path.resolve(import.meta.dirname, '../../../lib/catalog/reader-worker.ts')).href

/** The reader's thread outside the built service, where its TypeScript has to be loaded first: flags of Node do not reach a thread's
 *  own file. */
export const readerThread = (resourceLimits: ResourceLimits = {}): Worker =>
  new Worker(`import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(FILE)}) })`, { eval: true, resourceLimits })
