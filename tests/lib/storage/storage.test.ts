import { createHash } from 'node:crypto'
import { existsSync, mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest'
import { objectStore } from '@/lib/env'
import { folderStorage } from '@/lib/storage/folder-storage'
import { checkFiles, getFile, keepFile } from '@/lib/storage/kept-file'
import { memoryStorage } from '@/lib/storage/memory-storage'
import { objectStorage } from '@/lib/storage/object-storage'
import type { Storage } from '@/lib/storage/storage'
import { log } from '@/lib/log'
import { startObjectStore } from './object-store'

vi.mock('@/lib/log', () => ({ log: { error: vi.fn() } }))

const digestOf = (bytes: Uint8Array) => createHash('sha256').update(bytes).digest('hex')
const bytesOf = (text: string) => new TextEncoder().encode(text)

const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-files-'))
let store: Awaited<ReturnType<typeof startObjectStore>>
beforeAll(async () => {
  store = await startObjectStore()
})
afterAll(async () => {
  await store.stop()
  rmSync(folder, { recursive: true, force: true })
})
afterEach(() => {
  vi.unstubAllEnvs()
  delete (globalThis as { elbowroomFiles?: Storage }).elbowroomFiles
})

function configure(env: Record<string, string>): void {
  for (const [name, value] of Object.entries(env)) vi.stubEnv(name, value)
}

function objects(): Storage {
  configure(store.env)
  return objectStorage(objectStore()!)
}

describe.each([
  ['in a folder', () => folderStorage(path.join(folder, 'files'))],
  ['in an object store', objects],
  ['in memory', memoryStorage],
])('files %s', (_where, open) => {
  it('come back as they were put, whatever they hold', async () => {
    const storage = open()
    for (const bytes of [bytesOf('solid base'), new Uint8Array(), Uint8Array.from({ length: 3_000_000 }, (_, i) => i * 7)]) {
      await storage.put(digestOf(bytes), bytes)
      const kept = await storage.get(digestOf(bytes))
      expect(Buffer.compare(kept!, bytes)).toBe(0)
      expect(await storage.has(digestOf(bytes))).toBe(true)
    }
  })

  it('are not there before they are put', async () => {
    const storage = open()
    const digest = digestOf(bytesOf('never put'))
    expect([await storage.has(digest), await storage.get(digest)]).toEqual([false, null])
  })

  it('can be put again, and by several at once', async () => {
    const storage = open()
    const bytes = bytesOf('put by several')
    await Promise.all(Array.from({ length: 8 }, () => storage.put(digestOf(bytes), bytes)))
    await storage.put(digestOf(bytes), bytes)
    expect(Buffer.from((await storage.get(digestOf(bytes)))!).toString()).toBe('put by several')
  })

  it('do not change when the bytes that were put do', async () => {
    const storage = open()
    const bytes = bytesOf('as it was')
    const digest = digestOf(bytes)
    await storage.put(digest, bytes)
    bytes.fill(0)
    expect(Buffer.from((await storage.get(digest))!).toString()).toBe('as it was')
  })
})

describe('a folder of files', () => {
  it('is readable by its owner only and holds no half-written file', async () => {
    const at = path.join(folder, 'private')
    const bytes = bytesOf('private')
    await folderStorage(at).put(digestOf(bytes), bytes)
    const inside = path.join(at, digestOf(bytes).slice(0, 2))
    expect(readdirSync(inside)).toEqual([digestOf(bytes)])
    expect(statSync(path.join(inside, digestOf(bytes))).mode & 0o777).toBe(0o600)
  })
})

describe('the file storage of an installation', () => {
  const useFolder = (name: string) => {
    const dataDir = path.join(folder, name)
    vi.stubEnv('ELBOWROOM_DATA_DIR', dataDir)
    return dataDir
  }

  it('is a folder beside the database unless an object store is configured', async () => {
    const dataDir = useFolder('own')
    const bytes = bytesOf('own')
    await keepFile(digestOf(bytes), bytes)
    expect(existsSync(path.join(dataDir, 'files', digestOf(bytes).slice(0, 2), digestOf(bytes)))).toBe(true)
    expect(Buffer.from(await getFile(digestOf(bytes))).toString()).toBe('own')
  })

  it('is the object store that is configured', async () => {
    const dataDir = useFolder('unused')
    configure(store.env)
    const bytes = bytesOf('kept elsewhere')
    await keepFile(digestOf(bytes), bytes)
    expect([existsSync(dataDir), Buffer.from(await getFile(digestOf(bytes))).toString()]).toEqual([false, 'kept elsewhere'])
  })

  it('says that a file is not to be had when it is missing or other bytes stand in its place', async () => {
    const dataDir = useFolder('damaged')
    const bytes = bytesOf('whole')
    const digest = digestOf(bytes)
    await expect(getFile(digest)).rejects.toMatchObject({ code: 'file-unavailable' })
    await expect(checkFiles([digest])).rejects.toMatchObject({ code: 'file-unavailable' })
    await keepFile(digest, bytes)
    await checkFiles([digest, digest])
    writeFileSync(path.join(dataDir, 'files', digest.slice(0, 2), digest), 'other')
    await expect(getFile(digest)).rejects.toMatchObject({ code: 'file-unavailable' })
    expect(vi.mocked(log.error)).toHaveBeenLastCalledWith({ digest }, 'a file in the file storage is damaged')
  })

  it('says that a file is not to be had when the store cannot be reached', async () => {
    configure({ ...store.env, ELBOWROOM_S3_ENDPOINT: 'http://127.0.0.1:1' })
    const bytes = bytesOf('unreachable')
    await expect(keepFile(digestOf(bytes), bytes)).rejects.toMatchObject({ code: 'file-unavailable' })
  })
})

describe('the configuration of an object store', () => {
  it.each([
    ['a bucket is missing', { ELBOWROOM_S3_ENDPOINT: 'https://store.example' }, 'ELBOWROOM_S3_BUCKET is missing'],
    ['the bucket is no name', { ELBOWROOM_S3_BUCKET: 'Our Files' }, 'ELBOWROOM_S3_BUCKET must be'],
    ['the endpoint has a path', { ELBOWROOM_S3_BUCKET: 'files', ELBOWROOM_S3_ENDPOINT: 'https://store.example/files' }, 'ELBOWROOM_S3_ENDPOINT must be'],
    ['the endpoint holds a password', { ELBOWROOM_S3_BUCKET: 'files', ELBOWROOM_S3_ENDPOINT: 'https://a:b@store.example' }, 'ELBOWROOM_S3_ENDPOINT must be'],
    ['half of a key is there', { ELBOWROOM_S3_BUCKET: 'files', ELBOWROOM_S3_ACCESS_KEY_ID: 'a' }, 'or neither'],
  ])('is refused with a sentence when %s', (_what, env, sentence) => {
    configure(env)
    expect(() => objectStore()).toThrow(sentence)
  })

  it('needs nothing but a bucket', () => {
    configure({ ELBOWROOM_S3_BUCKET: 'our.files-2' })
    expect(objectStore()).toEqual({ bucket: 'our.files-2', region: 'us-east-1', endpoint: undefined, credentials: undefined })
  })
})
