import { readdirSync } from 'node:fs'
import path from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { PASSWORD, startServer, type Server } from '@/tests/api/support/server'
import { signIn } from '@/tests/api/support/sign-in'
import { armEntries, makeZip } from '@/tests/lib/archive/make-zip'
import { startObjectStore } from '@/tests/lib/storage/object-store'

let store: Awaited<ReturnType<typeof startObjectStore>>
let server: Server
beforeAll(async () => {
  store = await startObjectStore()
  server = await startServer({ env: store.env })
})
afterAll(async () => {
  await server?.stop()
  await store?.stop()
})

describe('an installation with an object store', () => {
  it('keeps archives and meshes there and in no folder of its own', async () => {
    const headers = await signIn(server.url, 'ines@tarnholm.example', PASSWORD)
    const models = `${server.url}/api/v1/teams/tarnholm/models`
    const form = new FormData()
    form.set('name', 'Kept elsewhere')
    form.set('file', new Blob([new Uint8Array(makeZip(armEntries()))]), 'arm.zip')
    expect((await fetch(models, { method: 'POST', headers, body: form })).status).toBe(201)
    const mesh = await fetch(`${models}/kept-elsewhere/revisions/1/meshes/arm/meshes/base.stl`, { headers })
    expect([mesh.status, await mesh.text()]).toEqual([200, 'solid base\nendsolid base\n'])
    const source = await fetch(`${models}/kept-elsewhere/revisions/1/source`, { headers })
    expect(Buffer.compare(Buffer.from(await source.arrayBuffer()), makeZip(armEntries()))).toBe(0)
    expect(readdirSync(server.dataDir)).not.toContain('files')
    expect(readdirSync(store.directory, { recursive: true }).map((file) => path.basename(String(file))).filter((name) => /^[0-9a-f]{64}/.test(name)).length).toBeGreaterThan(1)
  })

  it('does not start when the store is configured by halves', async () => {
    await expect(startServer({ seeded: false, env: { ELBOWROOM_S3_ENDPOINT: 'https://store.example' } })).rejects.toThrow('ELBOWROOM_S3_BUCKET is missing')
  })
})
