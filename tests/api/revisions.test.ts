import { createHash } from 'node:crypto'
import request from 'supertest'
import { describe, expect, inject, it } from 'vitest'
import type { RevisionSummary } from '@/lib/contract/model'
import { sample } from './example-request'
import { expectProblem, pointersOf } from './expect-problem'
import { importModel, postRevision, postTransition } from './import-model'
import { get, send } from './send'
import { asPerson } from './support/callers'
import { snake } from './urdf'

const at = (model: string, revision: number | string, more = '') => `/teams/tarnholm/models/${model}/revisions/${revision}${more}`

/** A source as bytes, which the ordinary reading of an answer would turn into text. */
async function getSource(path: string, headers: object = {}) {
  const bytes = (answer: request.Response, done: (error: Error | null, body: Buffer) => void) => {
    const pieces: Buffer[] = []
    answer.on('data', (piece: Buffer) => pieces.push(piece))
    answer.on('end', () => done(null, Buffer.concat(pieces)))
  }
  return request(inject('served').url).get(`/api/v1${path}/source`).set({ ...(await asPerson('kofi')), ...headers }).buffer(true).parse(bytes as never)
}

describe('a further revision', () => {
  it('is numbered on, is a draft, and is answered alone', async () => {
    const { model } = await importModel('Grows', 'trainer-3r.urdf')
    const made = await postRevision(model.slug, 'gannet-4.urdf', { note: 'Another arm altogether.' })
    expect(made.status).toBe(201)
    expect(made.headers.location).toBe(`/api/v1${at(model.slug, 2)}`)
    expect(made.body).toMatchObject({ revision: 2, status: 'draft', note: 'Another arm altogether.', model: { slug: model.slug }, robotName: 'gannet_4' })
    expect((await get(`/teams/tarnholm/models/${model.slug}`, await asPerson('kofi'))).body).toMatchObject({ revisions: 2, latest: { revision: 2, independent: 4 } })
  })

  it('keeps where its file comes from, which enters no number', async () => {
    const { model, revision } = await importModel('From somewhere', 'trainer-3r.urdf')
    expect(revision).not.toHaveProperty('provenance')
    const said = { serialNumber: 'TR3-0017', geometry: 'calibrated', supplierNote: 'Drawing set 2, issue B.\nValid from May.' }
    const made = await postRevision(model.slug, 'trainer-3r.urdf', { ...said, allowSame: 'true' })
    expect(made.body).toMatchObject({ revision: 2, fingerprint: revision.fingerprint, provenance: said })
    expect((await get(at(model.slug, 2), await asPerson('kofi'))).body).toMatchObject({ provenance: said })
    const silent = await postRevision(model.slug, 'trainer-3r.urdf', { serialNumber: '', supplierNote: ' ', allowSame: 'true' })
    expect(silent.body).not.toHaveProperty('provenance')
    const wrong = await postRevision(model.slug, 'trainer-3r.urdf', { geometry: 'about right', serialNumber: 'x'.repeat(101), allowSame: 'true' })
    expectProblem(wrong, 'invalid-request')
    expect(pointersOf(wrong)).toEqual(['/form/serialNumber', '/form/geometry'])
  })

  it('names the twin of a file that computes the same numbers, unless it is wanted all the same', async () => {
    const { model } = await importModel('Stored twice', 'trainer-3r.urdf')
    const commented = sample('trainer-3r.urdf').toString().replace('<robot', '<!-- the same arm -->\n<robot')
    const refused = await postRevision(model.slug, commented)
    expectProblem(refused, 'same-content')
    expect(refused.body).toMatchObject({ twin: 1 })
    expectProblem(await postRevision(model.slug, commented, { allowSame: 'false' }), 'same-content')
    const response = await postRevision(model.slug, commented, { allowSame: 'yes' })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/form/allowSame'])
    const stored = await postRevision(model.slug, commented, { allowSame: 'true' })
    expect([stored.status, (stored.body as { revision: number }).revision]).toEqual([201, 2])
  })

  it('gets a number of its own when eight are sent at once', async () => {
    const { model } = await importModel('Eight at once', 'trainer-3r.urdf')
    const made = await Promise.all(Array.from({ length: 8 }, (_, i) => postRevision(model.slug, snake(i + 2))))
    expect(made.map(({ body }) => (body as { revision: number }).revision).sort()).toEqual([2, 3, 4, 5, 6, 7, 8, 9])
    const files = await Promise.all(made.map(async ({ body }) => (await get(at(model.slug, (body as { revision: number }).revision), await asPerson('kofi'))).body as { counts: { independent: number } }))
    expect(files.map(({ counts }) => counts.independent)).toEqual([2, 3, 4, 5, 6, 7, 8, 9])
  })
})

describe('the list of revisions', () => {
  it('is newest first, in pages, without structure', async () => {
    const { model } = await importModel('Paged', snake(1))
    for (const joints of [2, 3, 4]) await postRevision(model.slug, snake(joints))
    const path = `/teams/tarnholm/models/${model.slug}/revisions?limit=3`
    const first = await get(path, await asPerson('kofi'))
    const { items, nextCursor } = first.body as { items: RevisionSummary[]; nextCursor: string }
    expect(items.map(({ revision, independent }) => [revision, independent])).toEqual([[4, 4], [3, 3], [2, 2]])
    expect(items[0]).not.toHaveProperty('joints')
    expect(first.headers.link).toContain('rel="next"')
    const second = await get(`${path}&cursor=${nextCursor}`, await asPerson('kofi'))
    expect(second.body).toMatchObject({ items: [{ revision: 1, history: [{ status: 'draft', by: 'Ines Okafor' }] }] })
    expect(second.body).not.toHaveProperty('nextCursor')
  })

  it.each(['garbage', 'WyJhIl0', 'Wy0xXQ', 'WzEuNV0', 'WzFlMzAwXQ', 'bnVsbA'])('refuses the cursor "%s"', async (cursor) => {
    const response = await get(`/teams/tarnholm/models/skerry-7/revisions?cursor=${cursor}`, await asPerson('kofi'))
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/query/cursor'])
  })
})

describe('the source', () => {
  it('comes back byte for byte, as an attachment that runs nothing', async () => {
    const { body, headers } = await getSource(at('skerry-7', 1))
    expect(Buffer.compare(body as Buffer, sample('skerry-7.urdf'))).toBe(0)
    expect(headers).toMatchObject({
      'content-type': 'application/xml',
      'content-disposition': `attachment; filename="skerry-7.urdf"; filename*=UTF-8''skerry-7.urdf`,
      'content-security-policy': "sandbox; default-src 'none'",
      'x-content-type-options': 'nosniff',
    })
    const digest = createHash('sha256').update(sample('skerry-7.urdf')).digest('hex')
    expect(headers.etag).toBe(`"${digest}"`)
    expect((await get(at('skerry-7', 1), await asPerson('kofi'))).body).toMatchObject({ sourceDigest: digest, fileName: 'skerry-7.urdf' })
  })

  it('comes back byte for byte from an encoding other than UTF-8', async () => {
    const bytes = Buffer.from(`\ufeff<?xml version="1.0" encoding="UTF-16"?>${snake(1).replace(/^<\?.*?\?>/, '')}`, 'utf16le')
    const made = await send({ method: 'POST', path: '/teams/tarnholm/models', headers: await asPerson('ines'), form: { fields: { name: 'Sixteen bits' }, file: { name: 'a.xml', bytes } } })
    expect(made.status, made.text).toBe(201)
    expect(Buffer.compare((await getSource(at('sixteen-bits', 1))).body as Buffer, bytes)).toBe(0)
  })

  it('may be kept for ever under its number and must be asked for again under "released"', async () => {
    expect((await getSource(at('skerry-7', 1))).headers['cache-control']).toBe('private, max-age=31536000, immutable')
    expect((await getSource(at('skerry-7', 'released'))).headers['cache-control']).toBe('private, no-cache')
    for (const more of ['', '/findings']) {
      expect((await get(at('skerry-7', 1, more), await asPerson('kofi'))).headers['cache-control'], more).toBe('private, no-cache')
    }
    expect((await get('/teams/tarnholm/models', await asPerson('kofi'))).headers['cache-control']).toBe('no-store')
  })

  it.each(['', '/source', '/findings'])('answers 304 to whoever has it: revision%s', async (more) => {
    const headers = await asPerson('kofi')
    const { etag } = (await get(at('skerry-7', 1, more), headers)).headers
    const again = await get(at('skerry-7', 1, more), { ...headers, 'if-none-match': etag! })
    expect([again.status, again.text ?? '', again.headers.etag]).toEqual([304, '', etag])
  })
})

describe('a revision', () => {
  it('is the one in force under the word "released"', async () => {
    const headers = await asPerson('kofi')
    expect((await get(at('skerry-7', 'released'), headers)).body).toEqual((await get(at('skerry-7', 2), headers)).body)
    expectProblem(await get(at('skerry-7-rail', 'released'), headers), 'nothing-released')
  })

  it('changes its ETag with its status and nothing else', async () => {
    const { model } = await importModel('Tagged', 'trainer-3r.urdf')
    const headers = await asPerson('kofi')
    const etag = async () => (await get(at(model.slug, 1), headers)).headers.etag
    const first = await etag()
    await postRevision(model.slug, 'gannet-4.urdf')
    expect(await etag()).toBe(first)
    await postTransition(model.slug, 1, 'in-review', 'ines')
    expect(await etag()).not.toBe(first)
  })

  it('lists its findings with place and remedy', async () => {
    const { body } = await get(at('dunlin-2', 1, '/findings'), await asPerson('kofi'))
    const line = sample('flawed-warning.urdf').toString().split('\n').findIndex((text) => text.includes('<axis xyz="0 0.7 0.7"/>')) + 1
    expect(body).toEqual({
      items: [{ rule: 'axis-normalised', severity: 'warning', message: expect.any(String), remedy: expect.any(String), line, column: expect.any(Number), element: "joint 'tilt'" }],
    })
  })
})
