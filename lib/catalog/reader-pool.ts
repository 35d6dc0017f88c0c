import { createHash } from 'node:crypto'
import { availableParallelism } from 'node:os'
import { Worker } from 'node:worker_threads'
import { isService } from '@/lib/env'
import { log } from '@/lib/log'
import { refuseReading } from '@/lib/urdf/refuse-reading'
import { answerReader, writeCheck, type ReadFile, type ReaderQuestion } from './answer-reader'
import { createWorkerPool, type Outcome, type WorkerPool } from './worker-pool'

/** The worst file of 8 MiB takes about two seconds; a busy machine may be several times slower. */
const LIMIT_MS = 20_000
const IDLE_MS = 60_000
/** Files that may wait to be read. */
const QUEUE = 32
/** MB of the heap of one reader: tests/bench/import.ts shows what the worst files need. */
const OLD_GENERATION_MB = 256

type Pool = WorkerPool<ReaderQuestion, ReadFile | string>

/** The bundler sees this expression and builds the thread's file. */
const spawn = (): Worker => new Worker(new URL('./reader-worker.ts', import.meta.url), { resourceLimits: { maxOldGenerationSizeMb: OLD_GENERATION_MB } })

// Shared by the bundles of instrumentation, routes and pages of one process.
const shared = globalThis as typeof globalThis & { elbowroomReaders?: Pool }

/** Half of the cores read, so that the others answer. */
const readers = (): Pool =>
  (shared.elbowroomReaders ??= createWorkerPool({ spawn, size: Math.max(1, availableParallelism() >> 1), queue: QUEUE, limitMs: LIMIT_MS, idleMs: IDLE_MS }))

/** A command reads in its own thread: nobody waits for anything else of it, and there is no built file for another one. */
const ask = async (question: ReaderQuestion): Promise<Outcome<ReadFile | string>> => (isService() ? readers().ask(question) : { answer: await answerReader(question) })

const WORDS = {
  time: `reading took longer than ${LIMIT_MS / 1000} s`,
  memory: 'reading needed more memory than one file is allowed',
  failure: 'the reader failed, which is logged here',
  stopped: 'the service is being stopped',
  crowded: 'too many files were waiting to be read',
} as const

function refused(bytes: Uint8Array, outcome: Exclude<Outcome<never>, { answer: never }>): ReadFile {
  if (outcome.givenUp !== 'stopped') {
    const said = outcome.error === undefined ? {} : { error: String(outcome.error) }
    log.error({ reason: outcome.givenUp, bytes: bytes.length, ...said }, 'reading a file was given up')
  }
  return { sourceDigest: createHash('sha256').update(bytes).digest('hex'), findings: refuseReading(WORDS[outcome.givenUp]), read: null }
}

interface Upload {
  readonly name: string
  readonly bytes: Uint8Array
}

/** What the importer makes of an upload, read in a thread of its own. Never fails on what it holds. entry: path of the description in
 *  an archive that has several. */
export async function readFile({ name, bytes }: Upload, entry?: string): Promise<ReadFile> {
  const outcome = await ask({ name, bytes, entry, as: 'parts' })
  return 'answer' in outcome ? (outcome.answer as ReadFile) : refused(bytes, outcome)
}

/** The JSON that the check of an import answers about an upload, read and written in a thread of its own. Never fails on what it holds. */
export async function readCheck({ name, bytes }: Upload, entry?: string): Promise<string> {
  const outcome = await ask({ name, bytes, entry, as: 'json' })
  return 'answer' in outcome ? (outcome.answer as string) : writeCheck(refused(bytes, outcome))
}

/** Ends the threads, when the process is told to end. */
export const endReaders = async (): Promise<void> => shared.elbowroomReaders?.end()
