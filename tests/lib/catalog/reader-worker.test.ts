import { readFileSync } from 'node:fs'
import { afterAll, describe, expect, it } from 'vitest'
import { answerReader, type ReadFile, type ReaderQuestion } from '@/lib/catalog/answer-reader'
import { createWorkerPool } from '@/lib/catalog/worker-pool'
import { CheckedImport } from '@/lib/contract/description'
import { armEntries, makeZip } from '../archive/make-zip'
import { readerThread } from './reader-thread'

const pool = createWorkerPool<ReaderQuestion, ReadFile | string>({ spawn: () => readerThread(), size: 1, queue: 100, limitMs: 20_000, idleMs: 60_000 })
afterAll(() => pool.end())

const FILES = ['skerry-7.urdf', 'flawed-error.urdf', 'flawed-warning.urdf'].map((name) => ({ name, bytes: new Uint8Array(readFileSync(`samples/${name}`)) })).concat({ name: 'arm.zip', bytes: new Uint8Array(makeZip(armEntries())) })

describe('the reader in its thread', () => {
  it.each(FILES)('makes of $name what is made without a thread', async ({ name, bytes }) => {
    expect(await pool.ask({ name, bytes, as: 'parts' })).toEqual({ answer: await answerReader({ name, bytes, as: 'parts' }) })
    expect(bytes.length).toBeGreaterThan(0)
  })

  it.each(FILES)('writes of $name what the contract declares', async ({ name, bytes }) => {
    const outcome = await pool.ask({ name, bytes, as: 'json' })
    const { findings, structure } = CheckedImport.parse(JSON.parse((outcome as { answer: string }).answer))
    const { findings: expected, read } = (await answerReader({ name, bytes, as: 'parts' })) as ReadFile
    expect(findings).toEqual(expected)
    expect(structure?.fingerprint).toBe(read?.fingerprint)
  })
})
