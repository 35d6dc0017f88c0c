import { beforeAll, describe, expect, it } from 'vitest'
import { SCOPES } from '@/lib/contract/key-operations'
import { ALL_OPERATIONS, exampleRequest, PLACES } from './example-request'
import { expectProblem } from './expect-problem'
import { importModel } from './import-model'
import { makeKey } from './make-key'
import { type Fields, type Headers, send, type Sent } from './send'
import { asKey, asPerson } from './support/callers'

/** An answer without what must differ between two requests. */
async function answerTo(sent: Sent) {
  const { status, headers, body } = await send(sent)
  const { date: _date, 'x-request-id': _id, ...fields } = headers as Fields
  const { requestId: _requestId, instance: _instance, ...problem } = body as Fields
  return { status, fields, problem }
}

let kestrels: Fields
let callers: { readonly who: string; readonly headers: Headers }[]

beforeAll(async () => {
  const { model } = await importModel('Only at Kestrel', 'trainer-3r.urdf', 'runa', 'kestrel')
  kestrels = { team: 'kestrel', model: model.slug, revision: '1', set: '1', path: 'meshes/base.stl', key: (await makeKey(SCOPES, {}, 'runa')).id }
  callers = [
    { who: 'an administrator of another team', headers: await asPerson('mira') },
    { who: 'a key of another team with every scope', headers: asKey((await makeKey(SCOPES)).key) },
  ]
})

describe.each(ALL_OPERATIONS)('%s', (_name, operation) => {
  it("answers another team's things word for word like a team that never was", async () => {
    for (const { who, headers } of callers) {
      const theirs = await answerTo(exampleRequest(operation, headers, kestrels))
      const nobodys = await answerTo(exampleRequest(operation, headers, { team: 'never-was', model: 'never-was', revision: '1', set: '1', path: 'meshes/base.stl', key: 'neverWas0000' }))
      expect(theirs.status, who).toBe(404)
      expect(theirs, who).toEqual(nobodys)
    }
  })

  it("finds nothing of another team under the caller's own", async () => {
    for (const { who, headers } of callers) {
      if (!/\{(model|key)\}/.test(operation.path)) continue
      const theirs = await answerTo(exampleRequest(operation, headers, { ...kestrels, team: 'tarnholm' }))
      const nobodys = await answerTo(exampleRequest(operation, headers, { ...PLACES, model: 'never-was', key: 'neverWas0000' }))
      expect(theirs.status, who).toBe(404)
      expect(theirs, who).toEqual(nobodys)
    }
  })

  it('says 404 before 403 and 401 before 404', async () => {
    const missing = { ...PLACES, team: 'never-was' }
    expectProblem(await send(exampleRequest(operation, {}, missing)), 'sign-in-required')
    const { origin: _origin, ...withoutOrigin } = await asPerson('kofi')
    expectProblem(await send(exampleRequest(operation, withoutOrigin, missing)), 'team-not-found')
    if (!operation.path.includes('{model}')) return
    // A reader, and a key without any scope that counts here, learn nothing about what they may not touch.
    const gateway = asKey((await makeKey(['gateway'])).key)
    for (const headers of [withoutOrigin, gateway]) {
      expectProblem(await send(exampleRequest(operation, headers, { ...PLACES, model: 'never-was' })), 'model-not-found')
    }
  })
})

describe('the order of checks', () => {
  it('mends an edit step by step: 401, 404, 403, 415, 413, 400, 422, 428, 412, and then it is done', async () => {
    const { model } = await importModel('Mended step by step', 'trainer-3r.urdf')
    const path = `/teams/tarnholm/models/${model.slug}`
    const kofi = await asPerson('kofi')
    const ines = await asPerson('ines')
    const huge = '{'.repeat(8 * 1024 * 1024 + 1)
    const json = { 'content-type': 'application/json' }
    const steps: readonly [Sent, number][] = [
      [{ method: 'PATCH', path: '/teams/tarnholm/models/never-was', headers: { 'content-type': 'text/plain' }, raw: huge }, 401],
      [{ method: 'PATCH', path: '/teams/tarnholm/models/never-was', headers: { ...kofi, 'content-type': 'text/plain' }, raw: huge }, 404],
      [{ method: 'PATCH', path, headers: { ...kofi, 'content-type': 'text/plain' }, raw: huge }, 403],
      [{ method: 'PATCH', path, headers: { ...ines, 'content-type': 'text/plain' }, raw: huge }, 415],
      [{ method: 'PATCH', path, headers: { ...ines, ...json }, raw: huge }, 413],
      [{ method: 'PATCH', path, headers: { ...ines, ...json }, raw: '{' }, 400],
      [{ method: 'PATCH', path, headers: ines, json: { nmae: 'Mended' } }, 422],
      [{ method: 'PATCH', path, headers: ines, json: { name: 'Mended' } }, 428],
      [{ method: 'PATCH', path, headers: { ...ines, 'if-match': '"another"' }, json: { name: 'Mended' } }, 412],
      [{ method: 'PATCH', path, headers: { ...ines, 'if-match': '*' }, json: { name: 'Mended' } }, 200],
    ]
    for (const [sent, status] of steps) expect((await send(sent)).status).toBe(status)
  })

  it('looks for what is wrong with an upload before what stands in its way', async () => {
    const headers = await asPerson('ines')
    const path = '/teams/tarnholm/models'
    const refused = { fields: { name: 'Skerry', slug: 'skerry-7' }, file: { name: 'a.urdf', bytes: Buffer.from('<robot/>') } }
    expectProblem(await send({ method: 'POST', path, headers, form: { ...refused, fields: { ...refused.fields, color: 'red' } } }), 'invalid-request')
    expectProblem(await send({ method: 'POST', path, headers, form: refused }), 'import-refused')
  })
})
