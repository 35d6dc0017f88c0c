import type { Worker } from 'node:worker_threads'

/** What came of a question: its answer, or why none will come. error: what a worker that failed has said. */
export type Outcome<A> = { readonly answer: A } | { readonly givenUp: 'time' | 'memory' | 'failure' | 'stopped' | 'crowded'; readonly error?: unknown }

export interface WorkerPool<Q, A> {
  /** Puts a question to a worker, in turn behind those that came before. Never fails. */
  ask(question: Q): Promise<Outcome<A>>
  /** Ends the workers. What was not answered is given up, and so is everything asked later. */
  end(): Promise<void>
}

export interface PoolOptions {
  /** Makes a worker, which answers each message by one. Its memory limit is the maker's business. */
  readonly spawn: () => Worker
  /** As many questions are answered at a time; the others wait. */
  readonly size: number
  /** As many questions may wait; more are given up at once, because each holds its file in memory. */
  readonly queue: number
  /** Longer than this no worker may take over one question. ms */
  readonly limitMs: number
  /** A worker without a question is ended after this. ms */
  readonly idleMs: number
}

interface Task<Q, A> {
  readonly question: Q
  readonly settle: (outcome: Outcome<A>) => void
}

const isOutOfMemory = (error: unknown): boolean => (error as NodeJS.ErrnoException).code === 'ERR_WORKER_OUT_OF_MEMORY'

/** A pool of threads for work that would hold up the event loop. A worker that takes too long, needs too much memory or fails is
 *  replaced, and costs nothing but its own question. Idle workers do not keep the process from ending. */
export function createWorkerPool<Q, A>({ spawn, size, queue, limitMs, idleMs }: PoolOptions): WorkerPool<Q, A> {
  const waiting: Task<Q, A>[] = []
  const idle: { readonly worker: Worker; readonly timer: NodeJS.Timeout }[] = []
  const busy = new Map<Worker, (outcome: Outcome<A>) => void>()
  let hasEnded = false

  const rest = (worker: Worker): void => {
    const retire = (): void => {
      const place = idle.indexOf(entry)
      if (place !== -1) idle.splice(place, 1)
      clearTimeout(entry.timer)
      void worker.terminate()
    }
    const entry = { worker, timer: setTimeout(retire, idleMs).unref() }
    // Even a resting worker may fail, and an error that nobody hears ends the process.
    worker.on('error', retire).on('exit', retire).unref()
    idle.push(entry)
  }

  const begin = (worker: Worker, { question, settle }: Task<Q, A>): void => {
    const finish = (outcome: Outcome<A>): void => {
      clearTimeout(timer)
      busy.delete(worker)
      worker.removeAllListeners()
      if ('answer' in outcome) rest(worker)
      // A worker that is being ended may still fail; nobody is waiting for it any more.
      else void worker.on('error', () => undefined).terminate()
      settle(outcome)
      next()
    }
    const timer = setTimeout(() => finish({ givenUp: 'time' }), limitMs)
    busy.set(worker, finish)
    worker.removeAllListeners().ref()
    worker.on('message', (answer: A) => finish({ answer }))
    worker.on('messageerror', (error) => finish({ givenUp: 'failure', error }))
    worker.on('error', (error) => finish(isOutOfMemory(error) ? { givenUp: 'memory' } : { givenUp: 'failure', error }))
    worker.on('exit', (code) => finish({ givenUp: 'failure', error: new Error(`the worker ended with exit code ${code}`) }))
    worker.postMessage(question)
  }

  const next = (): void => {
    while (!hasEnded && waiting.length > 0 && busy.size < size) {
      const rested = idle.pop()
      if (rested) clearTimeout(rested.timer)
      begin(rested?.worker ?? spawn(), waiting.shift()!)
    }
  }

  return {
    ask: (question) =>
      new Promise((settle) => {
        if (hasEnded) return settle({ givenUp: 'stopped' })
        if (waiting.length >= queue) return settle({ givenUp: 'crowded' })
        waiting.push({ question, settle })
        next()
      }),
    async end() {
      hasEnded = true
      for (const { settle } of waiting.splice(0)) settle({ givenUp: 'stopped' })
      for (const finish of [...busy.values()]) finish({ givenUp: 'stopped' })
      await Promise.all(
        idle.splice(0).map(({ worker, timer }) => {
          clearTimeout(timer)
          return worker.terminate()
        }),
      )
    },
  }
}
