import { execFileSync } from 'node:child_process'
import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterAll, describe, expect, inject, it } from 'vitest'
import { armEntries } from '../lib/archive/make-zip'
import { expectProblem } from './expect-problem'
import { postRevision, release } from './import-model'
import { send } from './send'
import { makeKey } from './make-key'
import { asKey, asPerson } from './support/callers'
import { importArchive, importLost, loseFile, postArchive, sha256 } from './upload-archive'

const folder = mkdtempSync(path.join(tmpdir(), 'elbowroom-export-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

async function fetchExport(slug: string) {
  const answer = await fetch(`${inject('served').url}/api/v1/teams/tarnholm/models/${slug}/export`, { headers: await asPerson('kofi') })
  return { status: answer.status, headers: answer.headers, bytes: Buffer.from(await answer.arrayBuffer()) }
}

/** Python's zipfile is the witness: it shares no code with the writer, checks each checksum and refuses what it cannot read. */
function unpack(bytes: Buffer, name: string): string {
  const file = path.join(folder, `${name}.zip`)
  const into = path.join(folder, name)
  writeFileSync(file, bytes)
  execFileSync('/usr/bin/python3', ['-c', 'import sys, zipfile\nz = zipfile.ZipFile(sys.argv[1])\nassert z.testzip() is None\nz.extractall(sys.argv[2])', file, into])
  return into
}

const filesUnder = (at: string, within = ''): string[] =>
  readdirSync(path.join(at, within)).flatMap((name) => {
    const inner = path.posix.join(within, name)
    return statSync(path.join(at, inner)).isDirectory() ? filesUnder(at, inner) : [inner]
  })

const readJson = (at: string, file: string) => JSON.parse(readFileSync(path.join(at, file), 'utf8')) as Record<string, unknown>

describe('the export of a model', () => {
  it('holds every revision with its source, findings, history, canonical JSON, meshes and evidence, and a digest of each file', async () => {
    const { model, revision } = await importArchive('Exported', armEntries({ name: 'arm/meshes/kügelchen.stl', data: 'solid odd' }))
    await release(model.slug)
    await send({
      method: 'POST', path: `/teams/tarnholm/models/${model.slug}/revisions/1/reference-poses`, headers: await asPerson('ines'),
      json: { table: 'turn,x,y,z,qx,qy,qz,qw\n0,0,0,0,0,0,0,1\n', units: { length: 'm', angle: 'rad' }, rotation: 'quaternion-xyzw', tool: null, tolerance: { position: 1, orientation: 1 } },
    })
    await postRevision(model.slug, 'trainer-3r.urdf')
    const { status, headers, bytes } = await fetchExport(model.slug)
    expect([status, headers.get('content-type'), headers.get('content-disposition')]).toEqual([200, 'application/zip', expect.stringContaining('filename="exported-export.zip"')])
    const at = unpack(bytes, 'whole')
    const manifest = readJson(at, 'manifest.json') as { files: { path: string; size: number; sha256: string }[] }
    expect(manifest).toMatchObject({ team: 'tarnholm', model: model.slug })
    expect(manifest.files.map((file) => file.path).sort()).toEqual(filesUnder(at).filter((file) => file !== 'manifest.json').sort())
    for (const file of manifest.files) {
      const content = readFileSync(path.join(at, file.path))
      expect([file.path, content.length, sha256(content)]).toEqual([file.path, file.size, file.sha256])
    }
    expect(manifest.files.map((file) => file.path)).toEqual([
      'README.txt', 'model.json',
      'revisions/1/revision.json', 'revisions/1/history.json', 'revisions/1/findings.json', 'revisions/1/source/arm.zip', 'revisions/1/description.urdf', 'revisions/1/canonical.json',
      'revisions/1/meshes/arm/meshes/base.stl', 'revisions/1/meshes/arm/meshes/kügelchen.stl', 'revisions/1/reference-poses/1.csv', 'revisions/1/reference-poses/1.json', 'revisions/1/check-vectors.json',
      'revisions/2/revision.json', 'revisions/2/history.json', 'revisions/2/findings.json', 'revisions/2/source/robot.urdf', 'revisions/2/canonical.json',
    ])
    const exported = readJson(at, 'revisions/1/revision.json')
    expect(exported).toMatchObject({ fingerprint: revision.fingerprint, sourceDigest: revision.sourceDigest, status: 'released' })
    expect(sha256(readFileSync(path.join(at, 'revisions/1/canonical.json')))).toBe(revision.fingerprint)
    expect(sha256(readFileSync(path.join(at, 'revisions/1/source/arm.zip')))).toBe(revision.sourceDigest)
    expect(readJson(at, 'revisions/1/history.json')).toEqual(exported.history)
    expect((readJson(at, 'revisions/1/check-vectors.json').vectors as unknown[]).length).toBe(24)
    const text = filesUnder(at).map((file) => readFileSync(path.join(at, file), 'latin1')).join('\n')
    expect(text).not.toMatch(/elb_[0-9A-Za-z]{12}_|argon2|@tarnholm\.example|keyDigest|passwordHash/)
  })

  it('comes back with the same fingerprint when its source is imported again', async () => {
    const { model, revision } = await importArchive('Exported and back')
    const at = unpack((await fetchExport(model.slug)).bytes, 'back')
    const again = await postArchive({ name: 'Back again' }, readFileSync(path.join(at, 'revisions/1/source/arm.zip')))
    expect([again.status, again.body.revision.fingerprint, again.body.revision.sourceDigest]).toEqual([201, revision.fingerprint, revision.sourceDigest])
  })

  it('is the same byte for byte when nothing has changed', async () => {
    const first = await fetchExport('skerry-7')
    const second = await fetchExport('skerry-7')
    expect(Buffer.compare(first.bytes, second.bytes)).toBe(0)
    expect(first.bytes.length).toBeGreaterThan(1000)
  })

  it('is refused before its first byte when a file is missing in the storage', async () => {
    expectProblem(await send({ method: 'GET', path: `/teams/tarnholm/models/${await importLost()}/export`, headers: await asPerson('kofi') }), 'file-unavailable')
  })

  it('is whole for a revision whose archive holds a lost file that came again', async () => {
    const entries = armEntries({ name: 'arm/twice.stl', data: 'solid twice' })
    const { model, revision } = await importArchive('Lost and found', entries)
    loseFile(revision.sourceDigest)
    await importArchive('Lost and found again', entries)
    expect((await fetchExport(model.slug)).status).toBe(200)
  })

  it('can be taken by a script whose key may read the catalog', async () => {
    const { key } = await makeKey(['catalog:read'])
    const answer = await send({ method: 'HEAD', path: '/teams/tarnholm/models/skerry-7/export', headers: asKey(key) })
    expect([answer.status, answer.headers['content-type']]).toEqual([200, 'application/zip'])
  })
})
