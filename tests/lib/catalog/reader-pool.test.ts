import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { afterAll, afterEach, describe, expect, it, vi } from 'vitest'
import { answerReader } from '@/lib/catalog/answer-reader'
import { endReaders, readCheck, readFile } from '@/lib/catalog/reader-pool'
import { CheckedImport } from '@/lib/contract/description'
import { log } from '@/lib/log'

vi.mock('@/lib/log', () => ({ log: { error: vi.fn() } }))

const bytes = new Uint8Array(readFileSync('samples/trainer-3r.urdf'))
const upload = { name: 'trainer-3r.urdf', bytes }
afterEach(() => vi.unstubAllEnvs())
afterAll(() => endReaders())

/** As in the service, but for the file of the thread, which only the bundler makes: every reader fails. */
const asService = () => vi.stubEnv('NEXT_RUNTIME', 'nodejs')

describe('reading a file', () => {
  it('is done in the own thread of a command', async () => {
    expect(await readFile(upload)).toEqual(await answerReader({ ...upload, as: 'parts' }))
    expect(await readCheck(upload)).toBe(await answerReader({ ...upload, as: 'json' }))
  })

  it('ends in a finding and a line in the log, and in no failure of ours, when the reader fails', async () => {
    asService()
    const { read, findings, sourceDigest } = await readFile(upload)
    expect([read, sourceDigest]).toEqual([null, createHash('sha256').update(bytes).digest('hex')])
    expect(findings).toEqual([
      {
        rule: 'reading-given-up',
        severity: 'error',
        message: 'The file was not read to its end: the reader failed, which is logged here.',
        remedy: expect.stringContaining('Send the file once more'),
        line: 1,
        column: 1,
      },
    ])
    expect(vi.mocked(log.error).mock.calls).toEqual([[{ reason: 'failure', bytes: bytes.length, error: expect.stringContaining('.ts') }, expect.any(String)]])
    expect(CheckedImport.parse(JSON.parse(await readCheck(upload)))).toEqual({ findings })
  })

  it('is refused when the service is being stopped', async () => {
    asService()
    await readFile(upload)
    await endReaders()
    expect((await readFile(upload)).findings[0]!.message).toContain('the service is being stopped')
  })
})
