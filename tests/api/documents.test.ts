import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, inject, it } from 'vitest'
import { OPERATIONS } from '@/lib/contract/operations'
import { PROBLEMS } from '@/lib/errors'
import { RULES } from '@/lib/urdf/rules'
import { robotText } from '../lib/archive/make-zip'
import { ALL_OPERATIONS, exampleRequest, PLACES } from './example-request'
import { importModel, release } from './import-model'
import { makeKey } from './make-key'
import { get, send } from './send'
import { asPerson } from './support/callers'
import { importArchive } from './upload-archive'

const MESHED = [{ name: 'arm.urdf', data: robotText('meshes/base.stl') }, { name: 'meshes/base.stl', data: 'solid example' }]

const page = (at: string) => fetch(`${inject('served').url}${at}`, { redirect: 'manual' })

describe('the served OpenAPI document', () => {
  it('is the committed one, open to everybody', async () => {
    const file = readFileSync(path.resolve(import.meta.dirname, '../../openapi/openapi.json'), 'utf8')
    const served = await get('/openapi.json', {})
    expect(served.status).toBe(200)
    expect(served.headers['content-type']).toMatch(/^application\/json/)
    expect(served.body).toEqual(JSON.parse(file))
  })
})

describe.each(ALL_OPERATIONS)('the example of %s', (name, operation) => {
  it('works on things of its own and is answered as declared', async () => {
    const { model } = operation.path.includes('{path}') ? await importArchive(`Example of ${name}`, MESHED) : await importModel(`Example of ${name}`, 'skerry-7.urdf')
    const places = { ...PLACES, model: model.slug, key: (await makeKey(['gateway'])).id }
    const headers = { ...(await asPerson('mira')), ...(operation.edits ? { 'if-match': '*' } : {}) }
    if (operation.errors.includes('not-released')) await release(model.slug)
    if (operation.path.includes('{set}')) await send(exampleRequest(OPERATIONS.addReferencePoses, headers, places))
    const response = await send(exampleRequest(operation, headers, places, 'gannet-4.urdf'))
    const { status, schema, mediaType } = operation.answer
    expect(response.status, response.text).toBe(status)
    if (status === 204) return expect(response.text).toBe('')
    expect([mediaType ?? 'application/json', ...(operation.answer.alsoMediaTypes ?? [])]).toContain(response.headers['content-type'])
    if (schema !== undefined) expect(schema.parse(response.body)).toEqual(response.body)
    if (status === 201) {
      const { pathname } = new URL(response.headers.location!, inject('served').url)
      expect((await get(pathname.replace('/api/v1', ''), headers)).status).toBe(200)
    }
    if (operation.conditional) expect(response.headers.etag).toMatch(/^"[!#-~]+"$/)
  })
})

describe('the pages that answers point at', () => {
  it.each(Object.entries(PROBLEMS))('explain the problem %s', async (code, { title }) => {
    const answer = await page(`/docs/problems/${code}`)
    expect([answer.status, await answer.text()]).toEqual([200, expect.stringContaining(title)])
  })

  it.each(Object.keys(RULES))('explain the finding %s', async (rule) => {
    const answer = await page(`/docs/findings/${rule}`)
    expect([answer.status, await answer.text()]).toEqual([200, expect.stringContaining(rule)])
  })

  it.each(['/docs/cautions', '/docs/conventions', '/docs/errors', '/docs/evidence', '/docs/archives'])('are there: %s', async (at) => expect((await page(at)).status).toBe(200))

  it.each(['/docs/problems/never-was', '/docs/findings/never-was', '/docs/problems/__proto__'])('are not there: %s', async (at) => expect((await page(at)).status).toBe(404))
})
