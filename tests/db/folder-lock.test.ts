import { rmSync } from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { environmentFor, runTypeScript, startServer, temporaryFolder, type Server } from '@/tests/api/support/server'

const IN_USE = /The database folder \S+ is in use by another process\. Stop that process, or set ELBOWROOM_DATA_DIR to another folder\./

describe('the folder of the embedded database', () => {
  const dataDir = temporaryFolder()
  let server: Server

  beforeAll(async () => {
    server = await startServer({ dataDir, seeded: false })
  })
  afterAll(async () => {
    await server.stop()
    rmSync(dataDir, { recursive: true, force: true })
  })

  it('is refused to a second server, which says why and ends', async () => {
    await expect(startServer({ dataDir, seeded: false })).rejects.toThrow(IN_USE)
  })

  it('is refused under another spelling of its path', async () => {
    const detour = `${dataDir}/../${path.basename(dataDir)}`
    await expect(startServer({ dataDir: detour, seeded: false })).rejects.toThrow(IN_USE)
  })

  it('is refused to the demo scenario, the dump and the restore while the server runs', () => {
    const env = environmentFor(dataDir)
    for (const [file, args] of [['samples/demo/seed.ts', []], ['db/dump.ts', [path.join(dataDir, 'dump.tar.gz')]]] as const) {
      const { status, stderr } = runTypeScript(file, args, env)
      expect({ file, status, isClear: IN_USE.test(stderr) }).toEqual({ file, status: 1, isClear: true })
      expect(stderr.trim().split('\n')).toHaveLength(1)
    }
    const restored = runTypeScript('db/restore.ts', [path.join(dataDir, 'dump.tar.gz')], env)
    expect(restored.status).toBe(1)
    expect(restored.stderr).toMatch(/is not empty/)
  })

  it('keeps serving the first server, and is free again as soon as that one is killed', async () => {
    expect((await fetch(`${server.url}/api/health/ready`)).status).toBe(200)
    await server.kill()
    server = await startServer({ dataDir, seeded: false })
    expect((await fetch(`${server.url}/api/health/ready`)).status).toBe(200)
  })
})
