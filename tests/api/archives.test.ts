import { existsSync } from 'node:fs'
import { request } from 'node:http'
import path from 'node:path'
import { describe, expect, inject, it } from 'vitest'
import type { Revision } from '@/lib/contract/model'
import { armEntries, makeZip, robotText, type ZipEntry } from '../lib/archive/make-zip'
import { expectProblem } from './expect-problem'
import { importModel } from './import-model'
import { get, send } from './send'
import { asPerson } from './support/callers'
import { importArchive, postArchive, sha256 } from './upload-archive'

const MEBIBYTE = 1024 * 1024
const MESH = 'solid base\nendsolid base\n'

const check = async (bytes: Buffer, fields: Record<string, string> = {}) =>
  send({ method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields, file: { name: 'arm.zip', bytes } } })

const meshPath = (slug: string, mesh: string) => `/teams/tarnholm/models/${slug}/revisions/1/meshes/${mesh.split('/').map(encodeURIComponent).join('/')}`

/** Bytes of an answer whose type supertest would not keep. */
async function fetchBytes(at: string, headers: Record<string, string> = {}) {
  const answer = await fetch(`${inject('served').url}/api/v1${at}`, { headers: { ...(await asPerson('kofi')), ...headers } })
  return { status: answer.status, headers: answer.headers, bytes: Buffer.from(await answer.arrayBuffer()) }
}

describe('an archive', () => {
  it('is checked with its meshes and where each is found', async () => {
    const more: ZipEntry[] = [{ name: 'other.urdf', data: '<robot name="o"><link name="a"><visual><geometry><mesh filename="http://host.example/a.stl"/></geometry></visual><collision><geometry><mesh filename="gone.stl"/></geometry></collision></link></robot>' }]
    const alone = await check(makeZip(armEntries()))
    expect(alone).toMatchObject({
      status: 200,
      body: {
        findings: [],
        structure: { robotName: 'arm' },
        meshes: [{ filename: 'package://arm/meshes/base.stl', state: 'found', path: 'arm/meshes/base.stl', size: MESH.length }],
        archive: { entry: 'arm/urdf/arm.urdf', descriptions: ['arm/urdf/arm.urdf'] },
      },
    })
    const both = await check(makeZip(armEntries(...more)))
    expect([both.status, both.body.structure, both.body.archive]).toEqual([200, undefined, { descriptions: ['arm/urdf/arm.urdf', 'other.urdf'] }])
    expect(both.body.findings).toMatchObject([{ rule: 'archive-several-urdfs', severity: 'error' }])
    const other = await check(makeZip(armEntries(...more)), { entry: 'other.urdf' })
    expect(other.body).toMatchObject({
      meshes: [{ filename: 'http://host.example/a.stl', state: 'outside' }, { filename: 'gone.stl', state: 'missing' }],
      archive: { entry: 'other.urdf' },
    })
  })

  it('is stored byte for byte with its description and its meshes', async () => {
    const bytes = makeZip(armEntries(), { comment: 'as delivered' })
    const { status, body } = await postArchive({ name: 'Stored as archive' }, bytes)
    const { model, revision } = body as { model: { slug: string }; revision: Revision }
    expect([status, revision.fileName, revision.sourceDigest]).toEqual([201, 'arm.zip', sha256(bytes)])
    expect(revision.archive).toEqual({ entry: 'arm/urdf/arm.urdf', files: [{ path: 'arm/meshes/base.stl', size: MESH.length, digest: sha256(MESH), mediaType: 'model/stl' }] })
    expect(revision.meshes).toEqual([{ filename: 'package://arm/meshes/base.stl', state: 'found', path: 'arm/meshes/base.stl', size: MESH.length }])
    const at = `/teams/tarnholm/models/${model.slug}/revisions/1`
    const source = await fetchBytes(`${at}/source`)
    expect([source.headers.get('content-type'), source.headers.get('etag'), Buffer.compare(source.bytes, bytes)]).toEqual(['application/zip', `"${sha256(bytes)}"`, 0])
    const description = await fetchBytes(`${at}/source?part=description`)
    expect([description.headers.get('content-type'), description.bytes.toString()]).toEqual(['application/xml', robotText()])
    expect(await get(at, await asPerson('kofi'))).toMatchObject({ status: 200, body: revision })
  })

  it('has the fingerprint of its description sent alone', async () => {
    const { revision } = await importArchive('In an archive')
    const alone = await importModel('Sent alone', robotText())
    expect(revision.fingerprint).toBe(alone.revision.fingerprint)
    expect(alone.revision).not.toHaveProperty('archive')
    expect(alone.revision.meshes).toEqual([{ filename: 'package://arm/meshes/base.stl', state: 'missing' }])
  })

  it('with several descriptions is stored with the one that is chosen, and refused with the choice otherwise', async () => {
    const bytes = makeZip(armEntries({ name: 'left.urdf', data: robotText('base.stl', 'left') }))
    const refused = await postArchive({ name: 'Two arms' }, bytes)
    expectProblem(refused, 'import-refused')
    expect(refused.body).toMatchObject({ descriptions: ['arm/urdf/arm.urdf', 'left.urdf'], findings: [{ rule: 'archive-several-urdfs' }] })
    expect((await postArchive({ name: 'Two arms', entry: 'left.urdf' }, bytes)).body).toMatchObject({ revision: { robotName: 'left', archive: { entry: 'left.urdf' } } })
    expectProblem(await postArchive({ name: 'Two arms', entry: 'right.urdf' }, bytes), 'import-refused')
  })

  it('that is refused leaves neither model nor file behind', async () => {
    const data = 'solid never kept'
    const refused = await postArchive({ name: 'Refused archive', slug: 'refused-archive' }, makeZip(armEntries({ name: '../base.stl', data })))
    expectProblem(refused, 'import-refused')
    expect((refused.body as { findings: object[] }).findings).toMatchObject([{ rule: 'archive-path-unsafe', element: 'entry "../base.stl"' }])
    expectProblem(await get('/teams/tarnholm/models/refused-archive', await asPerson('ines')), 'model-not-found')
    const digest = sha256(data)
    expect(existsSync(path.join(inject('served').dataDir, 'files', digest.slice(0, 2), digest))).toBe(false)
  })

  it('that is stored under no row after all leaves its files, which the next import of the same bytes finds', async () => {
    const bytes = makeZip(armEntries({ name: 'arm/orphan.stl', data: 'solid orphan' }))
    expectProblem(await postArchive({ name: 'Slug taken', slug: 'skerry-7' }, bytes), 'slug-taken')
    const digest = sha256('solid orphan')
    expect(existsSync(path.join(inject('served').dataDir, 'files', digest.slice(0, 2), digest))).toBe(true)
    const { status, body } = await postArchive({ name: 'Found again' }, bytes)
    expect([status, body.revision.archive.files.map((file: { path: string }) => file.path)]).toEqual([201, ['arm/meshes/base.stl', 'arm/orphan.stl']])
  })

  it('may not name an entry when the upload is a single file', async () => {
    const sent = await send({
      method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields: { entry: 'arm.urdf' }, file: { name: 'arm.urdf', bytes: Buffer.from(robotText()) } },
    })
    expect([sent.status, sent.body.findings]).toEqual([200, [expect.objectContaining({ rule: 'archive-entry-missing' })]])
  })

  it('with a URDF over 8 MiB inside is refused as too large', async () => {
    const noise = Buffer.from(Uint8Array.from({ length: 9 * MEBIBYTE }, (_, i) => 0x20 + ((Math.imul(i + 1, 2654435761) >>> 24) % 90)))
    const { body } = await check(makeZip([{ name: 'arm.urdf', data: noise }]))
    expect(body.findings).toMatchObject([{ rule: 'too-large' }])
  })

  it('of more than 8 MiB is read, and a URDF is not', async () => {
    const mesh = Buffer.from(Uint8Array.from({ length: 12 * MEBIBYTE }, (_, i) => Math.imul(i + 1, 2654435761) >>> 24))
    expect(await check(makeZip(armEntries({ name: 'arm/scan.stl', data: mesh, method: 0 })))).toMatchObject({ status: 200, body: { findings: [] } })
    const urdf = await send({
      method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields: { entry: 'a.zip' }, file: { name: 'arm.urdf', bytes: mesh } },
    })
    expectProblem(urdf, 'too-large')
  })

  it('of more than 64 MiB is refused while it is still being sent', async () => {
    const { url } = inject('served')
    const headers = { ...(await asPerson('ines')), 'content-type': 'multipart/form-data; boundary=large' }
    const posted = request(`${url}/api/v1/teams/tarnholm/imports/check`, { method: 'POST', headers })
    const answered = new Promise<number>((resolve, reject) => posted.once('response', (response) => resolve(response.resume().statusCode!)).once('error', reject))
    posted.write('--large\r\ncontent-disposition: form-data; name="file"; filename="arm.zip"\r\n\r\n')
    const piece = Buffer.alloc(MEBIBYTE, 0x50)
    let sent = 0
    const more = (): void => {
      while (sent++ < 66) if (!posted.write(piece)) return void posted.once('drain', more)
    }
    more()
    expect(await answered).toBe(413)
    posted.destroy()
  })
})

describe('a mesh', () => {
  it('is an attachment in a sandbox that never changes', async () => {
    const { model } = await importArchive('With a mesh')
    const { status, headers, bytes } = await fetchBytes(meshPath(model.slug, 'arm/meshes/base.stl'))
    expect([status, bytes.toString()]).toEqual([200, MESH])
    expect(Object.fromEntries(headers)).toMatchObject({
      'content-type': 'model/stl',
      'content-disposition': 'attachment; filename="base.stl"; filename*=UTF-8\'\'base.stl',
      'content-security-policy': "sandbox; default-src 'none'",
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, max-age=31536000, immutable',
      etag: `"${sha256(MESH)}"`,
    })
    const again = await fetchBytes(meshPath(model.slug, 'arm/meshes/base.stl'), { 'if-none-match': `"${sha256(MESH)}"` })
    expect([again.status, again.bytes.length]).toEqual([304, 0])
    expect((await fetchBytes(meshPath(model.slug, 'arm/meshes/base.stl'), { accept: 'model/stl' })).status).toBe(200)
  })

  it.each(['kügelchen.stl', 'a b.stl', '100%.stl', '%2e%2e.stl', 'a#b?c.stl', '日本/腕.stl', "it's (1)+&;.stl", '<script>.stl', 'ab:c.stl', '...stl', 'عربي.stl'])(
    'is found under the name %s',
    async (name) => {
      const data = `solid ${name}`
      const { model } = await importArchive('Odd names of meshes', [{ name: 'arm.urdf', data: robotText('base.stl') }, { name, data }])
      const { status, bytes } = await fetchBytes(meshPath(model.slug, name))
      expect([status, bytes.toString()]).toEqual([200, data])
    },
  )

  it.each(['../../../../etc/hostname', '..%2f..%2f..%2fetc%2fhostname', 'arm/urdf/arm.urdf', 'arm/meshes', 'arm/meshes/BASE.stl', 'base.stl', 'a%00b', 'x'.repeat(2000), '%C3%28'])(
    'is not found at %s',
    async (asked) => {
      const { model } = await importArchive('Nothing beside its meshes')
      const answer = await new Promise<number>((resolve, reject) => {
        void asPerson('kofi').then((headers) => {
          // Sent as it stands: fetch would tidy the path.
          const { hostname, port } = new URL(inject('served').url)
          request({ hostname, port, path: `/api/v1/teams/tarnholm/models/${model.slug}/revisions/1/meshes/${asked}`, headers: { ...headers } }, (response) => resolve(response.resume().statusCode!))
            .once('error', reject)
            .end()
        })
      })
      expect(answer).toBe(404)
    },
  )

  it('is kept once for all revisions that have it, and each team sees its own only', async () => {
    const entries = armEntries({ name: 'arm/shared.stl', data: 'solid shared' })
    const first = await importArchive('First with it', entries)
    const second = await postArchive({ name: 'Second with it' }, makeZip(entries), 'runa', 'kestrel')
    expect(second.status).toBe(201)
    const theirs = await get(`/teams/kestrel/models/second-with-it/revisions/1/meshes/arm/shared.stl`, await asPerson('kofi'))
    expectProblem(theirs, 'team-not-found')
    expect((await fetchBytes(meshPath(first.model.slug, 'arm/shared.stl'))).bytes.toString()).toBe('solid shared')
  })
})
