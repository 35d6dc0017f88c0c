import { Worker } from 'node:worker_threads'
import { afterEach, describe, expect, it } from 'vitest'
import { createWorkerPool, type PoolOptions, type WorkerPool } from '@/lib/catalog/worker-pool'

/** Answers 'echo x' by x, and does what the other questions say. */
const CODE = `
  const { parentPort, threadId } = require('node:worker_threads')
  parentPort.on('message', (question) => {
    if (question === 'hang') for (;;);
    if (question === 'throw') throw new Error('thrown inside')
    if (question === 'exit') process.exit(3)
    if (question === 'hoard') { const kept = []; for (;;) kept.push(new Array(1e5).fill(kept.length)) }
    if (question === 'thread') parentPort.postMessage(threadId)
    else parentPort.postMessage(question)
  })`

const SMALL = { maxOldGenerationSizeMb: 16, maxYoungGenerationSizeMb: 4 }
const pools: WorkerPool<string, unknown>[] = []
let spawned = 0

function poolOf(options: Partial<PoolOptions> = {}): WorkerPool<string, unknown> {
  spawned = 0
  const spawn = () => {
    spawned++
    return new Worker(CODE, { eval: true, resourceLimits: SMALL })
  }
  const pool = createWorkerPool<string, unknown>({ spawn, size: 1, queue: 100, limitMs: 15_000, idleMs: 60_000, ...options })
  pools.push(pool)
  return pool
}

afterEach(async () => {
  await Promise.all(pools.splice(0).map((pool) => pool.end()))
})

describe('a pool of workers', () => {
  it.each([1, 2])('answers every question by no more workers than it may have: %i', async (size) => {
    const pool = poolOf({ size })
    const questions = Array.from({ length: 20 }, (_, i) => `question ${i}`)
    expect(await Promise.all(questions.map((question) => pool.ask(question)))).toEqual(questions.map((answer) => ({ answer })))
    expect(spawned).toBe(size)
  })

  it('answers questions in the order in which they were asked', async () => {
    const pool = poolOf()
    const questions = Array.from({ length: 20 }, (_, i) => `question ${i}`)
    const order: string[] = []
    await Promise.all(questions.map((question) => pool.ask(question).finally(() => order.push(question))))
    expect(order).toEqual(questions)
  })

  it('gives up at once what would wait behind more than may wait', async () => {
    const pool = poolOf({ queue: 2 })
    const outcomes = await Promise.all(['one', 'two', 'three', 'four', 'five'].map((question) => pool.ask(question)))
    expect(outcomes).toEqual([{ answer: 'one' }, { answer: 'two' }, { answer: 'three' }, { givenUp: 'crowded' }, { givenUp: 'crowded' }])
  })

  it('gives up a question that takes too long, and answers the next by a new worker', async () => {
    const pool = poolOf({ limitMs: 1500 })
    expect(await Promise.all([pool.ask('hang'), pool.ask('after')])).toEqual([{ givenUp: 'time' }, { answer: 'after' }])
    expect(spawned).toBe(2)
  })

  it('gives up a question that needs too much memory, and answers the next', async () => {
    const pool = poolOf()
    expect(await Promise.all([pool.ask('hoard'), pool.ask('after')])).toEqual([{ givenUp: 'memory' }, { answer: 'after' }])
  })

  it.each([
    ['throw', /thrown inside/],
    ['exit', /exit code 3/],
  ])('gives up a question at which the worker fails (%s), says why, and answers the next', async (question, words) => {
    const pool = poolOf()
    const [failed, next] = await Promise.all([pool.ask(question), pool.ask('after')])
    expect(failed).toMatchObject({ givenUp: 'failure' })
    expect(String((failed as { error: unknown }).error)).toMatch(words)
    expect(next).toEqual({ answer: 'after' })
  })

  it('keeps its worker from question to question, and ends one that has none to do', async () => {
    const kept = poolOf()
    expect(await kept.ask('thread')).toEqual(await kept.ask('thread'))
    const impatient = poolOf({ idleMs: 0 })
    const first = await impatient.ask('thread')
    await new Promise((resolve) => setTimeout(resolve, 200))
    expect(await impatient.ask('thread')).not.toEqual(first)
  })

  it('gives up what it has not answered when it is ended, and what is asked later', async () => {
    const pool = poolOf()
    const pending = [pool.ask('hang'), pool.ask('waiting')]
    await pool.end()
    expect(await Promise.all([...pending, pool.ask('later')])).toEqual([{ givenUp: 'stopped' }, { givenUp: 'stopped' }, { givenUp: 'stopped' }])
  })
})
