import { request as httpRequest } from 'node:http'
import { describe, expect, inject, it } from 'vitest'
import { ALL_OPERATIONS, exampleRequest, sample } from './example-request'
import { expectProblem, pointersOf } from './expect-problem'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'

const JACOBIAN = '/teams/tarnholm/models/skerry-7/revisions/released/jacobian'
const REST = [0, 0, 0, 0, 0, 0, 0]
const json = { 'content-type': 'application/json' }

/** Asks for a Jacobian with a body as it stands. */
const ask = (raw: string, headers: object = {}) => send({ method: 'POST', path: JACOBIAN, headers: { ...asKey(), ...json, ...headers }, raw })
const askJson = (question: object) => send({ method: 'POST', path: JACOBIAN, headers: asKey(), json: question })

describe('paths and methods', () => {
  it.each(['', '/', '/teams', '/teams/tarnholm', '/teams/tarnholm/model', '/teams/tarnholm/models/skerry-7/revisions/1/spin', '/%zz', '/teams/%E0%A4/models'])(
    'answers the unknown path "%s" as a problem, whoever asks',
    async (path) => expectProblem(await get(path, {}), 'not-found'),
  )

  it('redirects nothing: a trailing slash is answered in place', async () => {
    for (const path of ['/teams/tarnholm/models/', '/teams/tarnholm/models/skerry-7/', '/nowhere/']) {
      const { status, headers } = await get(path, asKey())
      expect([403, 404], path).toContain(status)
      expect(headers.location).toBeUndefined()
    }
  })

  const paths = [...new Set(ALL_OPERATIONS.map(([, operation]) => operation.path))]
  it.each(paths)('refuses undeclared methods of %s and says which there are', async (path) => {
    const operations = ALL_OPERATIONS.filter(([, operation]) => operation.path === path)
    const declared = operations.map(([, { method }]) => method as string)
    const allowed = [...declared, ...(declared.includes('GET') ? ['HEAD'] : []), 'OPTIONS'].sort()
    const example = exampleRequest(operations[0]![1], {})
    for (const method of (['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const).filter((other) => !declared.includes(other))) {
      const response = await send({ method, path: example.path, headers: await asPerson('mira') })
      expectProblem(response, 'method-not-allowed')
      expect(response.headers.allow!.split(', ').sort()).toEqual(allowed)
    }
    const options = await send({ method: 'OPTIONS', path: example.path })
    expect([options.status, options.headers.allow!.split(', ').sort()]).toEqual([204, allowed])
  })

  it('answers HEAD like GET without the body', async () => {
    const path = '/teams/tarnholm/models/skerry-7'
    const headers = await asPerson('kofi')
    const head = await send({ method: 'HEAD', path, headers })
    const { status, headers: fields } = await get(path, headers)
    expect([head.status, head.headers.etag, head.text ?? '']).toEqual([status, fields.etag, ''])
  })

  it.each(['/teams/Tarnholm/models', '/teams/%00/models', '/teams/tarn%2Fholm/models', `/teams/${'t'.repeat(65)}/models`])('has no team at %s', async (path) =>
    expectProblem(await get(path, await asPerson('mira')), 'team-not-found'))

  it.each(['0', '01', '-1', '1.0', '1e0', '99999999999999999999', 'latest', 'Released'])('has no revision "%s"', async (revision) =>
    expectProblem(await get(`/teams/tarnholm/models/skerry-7/revisions/${revision}`, await asPerson('kofi')), 'revision-not-found'))
})

describe('who asks', () => {
  const path = '/teams/tarnholm/models'
  it.each([
    ['sign-in-required', { authorization: 'Basic bWlyYTptaXJh' }],
    ['sign-in-required', { authorization: 'Bearer' }],
    ['sign-in-required', { cookie: 'next-auth.session-token=not-a-token' }],
    ['key-mistyped', { authorization: 'Bearer elb_short' }],
    ['key-mistyped', { authorization: `Bearer ${'x'.repeat(5000)}` }],
  ] as const)('answers %s to %o', async (code, headers) => {
    const response = await get(path, headers)
    expectProblem(response, code)
    expect(response.headers['www-authenticate']).toBe(`Bearer realm="elbowroom"${code === 'key-mistyped' ? ', error="invalid_token"' : ''}`)
  })

  it('takes the key and not the cookie where both are sent', async () => {
    expectProblem(await get(path, { ...(await asPerson('mira')), ...asKey() }), 'scope-missing')
  })

  it('takes the scheme in any case', async () => {
    expect((await send({ method: 'POST', path: JACOBIAN, headers: { authorization: `bEARER ${inject('served').tarnholmKey}` }, json: { configurations: [REST] } })).status).toBe(200)
  })

  it('wants the Origin of this installation from a session that changes something, and from nobody else', async () => {
    const { cookie, origin } = await asPerson('ines')
    const check = { method: 'POST', path: '/teams/tarnholm/imports/check', form: { fields: {}, file: { name: 'a.urdf', bytes: sample('trainer-3r.urdf') } } } as const
    const { port } = new URL(origin)
    expect((await send({ ...check, headers: { cookie, origin } })).status).toBe(200)
    expect((await send({ ...check, headers: { cookie, origin: `http://localhost:${port}` } })).status).toBe(200)
    for (const other of ['null', 'https://elsewhere.example', `http://127.0.0.1:${Number(port) + 1}`, `${origin}.elsewhere.example`, `https://127.0.0.1:${port}`]) {
      expectProblem(await send({ ...check, headers: { cookie, origin: other } }), 'origin-refused')
    }
    expectProblem(await send({ ...check, headers: { cookie } }), 'origin-refused')
    expect((await get(path, { cookie })).status).toBe(200)
  })
})

describe('X-Request-Id', () => {
  it.each(['line-3.shift_2', 'a', 'x'.repeat(64)])('takes over "%s"', async (id) => {
    const response = await get('/nowhere', { 'x-request-id': id })
    expect([response.headers['x-request-id'], (response.body as { requestId: string }).requestId]).toEqual([id, id])
  })

  it.each(['', 'two words', 'x'.repeat(65), 'a/b', 'a,b'])('replaces "%s"', async (id) => {
    const response = await get('/nowhere', { 'x-request-id': id })
    expect(response.headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/)
  })

  it.each(['OPTIONS', 'HEAD', 'GET', 'DELETE'] as const)('is on the answer to %s of the document', async (method) => {
    expect((await send({ method, path: '/openapi.json', headers: { 'x-request-id': 'seen' } })).headers['x-request-id']).toBe('seen')
  })
})

describe('media types', () => {
  it.each(['application/json', '*/*', 'application/*', 'text/html, application/xml;q=0.9, */*;q=0.8', 'text/csv;q=0.4, application/json;q=0.5', 'APPLICATION/JSON', ''])(
    'answers JSON to Accept: %s',
    async (accept) => {
      const response = await ask(JSON.stringify({ configurations: [REST] }), { accept })
      expect([response.status, response.headers['content-type']]).toEqual([200, 'application/json'])
    },
  )

  it.each([
    ['text/csv', 'text/csv; charset=utf-8; header=present'],
    ['text/csv;q=0.5, application/json;q=0.4', 'text/csv; charset=utf-8; header=present'],
    ['application/json;q=0, */*', 'text/csv; charset=utf-8; header=present'],
    ['application/octet-stream, text/csv;q=0.9', 'application/octet-stream'],
  ])('answers records to Accept: %s', async (accept, type) => {
    const response = await ask(JSON.stringify({ configurations: [REST] }), { accept })
    expect([response.status, response.headers['content-type']]).toEqual([200, type])
  })

  it.each(['text/html', 'application/json;q=0', 'application/xml, image/*', 'text/csv;q=0, application/json;q=0.0'])(
    'has nothing for Accept: %s',
    async (accept) => expectProblem(await ask(JSON.stringify({ configurations: [REST] }), { accept }), 'not-acceptable'),
  )

  it.each(['application/json; charset=utf-8', 'Application/JSON;charset="UTF-8"', 'application/json;charset=utf8'])('reads %s', async (type) => {
    expect((await ask(JSON.stringify({ configurations: [REST] }), { 'content-type': type })).status).toBe(200)
  })

  it.each([
    { 'content-type': 'text/plain' },
    { 'content-type': 'application/json; charset=iso-8859-1' },
    { 'content-type': 'text/csv' },
    { 'content-type': 'multipart/form-data; boundary=x' },
    { 'content-encoding': 'gzip' },
  ])('does not read %o', async (headers) => expectProblem(await ask(JSON.stringify({ configurations: [REST] }), headers), 'unsupported-media-type'))

  it('takes no JSON where a file is wanted', async () => {
    const headers = { ...(await asPerson('ines')), ...json }
    expectProblem(await send({ method: 'POST', path: '/teams/tarnholm/imports/check', headers, raw: '{}' }), 'unsupported-media-type')
  })
})

describe('bodies', () => {
  it.each(['', '{', '{"configurations": [[NaN]]}', "{'configurations': []}", '{"configurations": [[01]]}', '[1,]', '{} {}'])('does not parse %s', async (raw) =>
    expectProblem(await ask(raw), 'malformed-body'))

  it('does not parse what is not UTF-8', async () => {
    const { status, body } = await post(Buffer.from([0x7b, 0x22, 0xff, 0xfe, 0x22, 0x3a, 0x31, 0x7d]))
    expect([status, body]).toEqual([400, expect.stringContaining('The body is not UTF-8.')])
  })

  it.each(['null', '1', '"text"', '[]', 'true'])('wants an object, not %s', async (raw) => {
    const response = await ask(raw)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([''])
  })

  it('answers a body without a length as soon as it is too large, and before it ends', async () => {
    const { status, sentAll } = await postEndlessly()
    expect({ status, sentAll }).toEqual({ status: 413, sentAll: false })
  })

  it.each([
    ['nested two million deep', `{"configurations": ${'['.repeat(2_000_000)}${']'.repeat(2_000_000)}}`],
    ['of two million lists', `{"configurations": [${'[],'.repeat(2_000_000)}[]]}`],
    ['of half a million unknown fields', `{${Array.from({ length: 500_000 }, (_, i) => `"k${i}":1`).join()}}`],
    ['of a million wrong numbers', `{"configurations": [[${'1e999,'.repeat(1_000_000)}0]]}`],
  ])('refuses a body %s without choking on it', async (_what, raw) => {
    const response = await ask(raw)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response).length).toBeLessThanOrEqual(50)
  })

  it('names every fault of an ordinary body, up to fifty', async () => {
    expect(pointersOf(await askJson({ configurations: [['a', 'b'], 3, [null]] }))).toEqual(['/configurations/0/0', '/configurations/0/1', '/configurations/1', '/configurations/2/0'])
    expect(pointersOf(await askJson({ configurations: Array.from({ length: 60 }, () => ['a']) }))).toHaveLength(50)
  })
})

describe('fields', () => {
  it('names unknown fields with their pointers, nested and escaped', async () => {
    const response = await askJson({ configurations: [REST], speed: 1, 'a/b~c': 2, units: { length: 'mm', colour: 'red' }, task: { axes: [] }, tool: { position: [0, 0, 0], quaternion: [0, 0, 0, 1], 'x/y': 0 } })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response).sort()).toEqual(['/a~1b~0c', '/speed', '/task/axes', '/tool/x~1y', '/units/colour'])
  })

  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty'])('takes no field called %s', async (name) => {
    const response = await ask(`{"configurations": [${JSON.stringify(REST)}], "${name}": {}}`)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([`/${name}`])
  })

  it('refuses a query where none is declared, and a name given twice', async () => {
    const compute = { method: 'POST', headers: asKey(), json: { configurations: [REST] } } as const
    const misplaced = await send({ ...compute, path: `${JACOBIAN}?units=mm` })
    expectProblem(misplaced, 'invalid-request')
    expect(pointersOf(misplaced)).toEqual(['/query/units'])
    const twice = await get('/teams/tarnholm/models?limit=1&limit=2', await asPerson('kofi'))
    expectProblem(twice, 'invalid-request')
    expect(pointersOf(twice)).toEqual(['/query/limit'])
    expect(pointersOf(await get('/teams/tarnholm/models?a%2Fb=1&a%2Fb=2', await asPerson('kofi')))).toEqual(['/query/a~1b'])
  })

  it('refuses a field of a form that is unknown, given twice, or a file in the wrong place', async () => {
    const headers = { ...(await asPerson('ines')), 'content-type': 'multipart/form-data; boundary=edge' }
    const part = (disposition: string, text = 'x') => `--edge\r\nContent-Disposition: form-data; ${disposition}\r\n\r\n${text}\r\n`
    const file = part('name="file"; filename="a.urdf"', '<robot/>')
    const pointers = async (...parts: string[]) => {
      const response = await send({ method: 'POST', path: '/teams/tarnholm/models', headers, raw: `${parts.join('')}--edge--\r\n` })
      expectProblem(response, 'invalid-request')
      return pointersOf(response)
    }
    const name = part('name="name"')
    expect(await pointers(file, name, part('name="co/lour"'))).toEqual(['/form/co~1lour'])
    expect(await pointers(file, name, name)).toEqual(['/form/name'])
    expect(await pointers(file, file, name)).toEqual(['/form/file'])
    expect(await pointers(name)).toEqual(['/form/file'])
    expect(await pointers(file, part('name="name"; filename="b.urdf"'))).toEqual(['/form/name'])
    expect(await pointers(file)).toEqual(['/form/name'])
  })
})

describe('numbers', () => {
  const at = (value: string, more = '') => ask(`{"configurations": [[0, 0, 0, ${value}, 0, 0, 0]]${more}}`)

  it.each(['"0.5"', '"NaN"', 'null', 'true', '1e400', '-1e400', '[0]'])('takes no %s for a number', async (value) => {
    const response = await at(value)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/configurations/0/3'])
  })

  it.each(['1e9', '-1e9', '1e-320', '-0', '0.1e1', '1E+2'])('takes %s', async (value) => expect((await at(value)).status).toBe(200))

  it.each([
    ['1.0000001e9', ''],
    ['-1e10', ''],
    ['5.8e10', ', "units": {"angle": "deg"}'],
  ])('refuses %s rad or deg%s, which is beyond 1e9 in SI, at its place', async (value, units) => {
    const response = await at(value, units)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/configurations/0/3'])
  })

  it('measures the limit of 1e9 in SI, not in the unit sent', async () => {
    expect((await at('5.7e10', ', "units": {"angle": "deg"}')).status).toBe(200)
    const tool = (mm: number) => askJson({ configurations: [REST], units: { length: 'mm' }, tool: { position: [0, 0, mm], quaternion: [0, 0, 0, 1] } })
    expect((await tool(1e12)).status).toBe(200)
    const beyond = await tool(1.0001e12)
    expectProblem(beyond, 'invalid-request')
    expect(pointersOf(beyond)).toEqual(['/tool/position/2'])
  })
})

/** Sends bytes as they are, which supertest would not. */
function post(bytes: Buffer): Promise<{ status: number; body: string }> {
  return new Promise((resolve, reject) => {
    const sending = httpRequest(`${inject('served').url}/api/v1${JACOBIAN}`, { method: 'POST', headers: { ...asKey(), ...json } }, (answer) => {
      let body = ''
      answer.setEncoding('utf8').on('data', (text: string) => (body += text))
      answer.on('end', () => resolve({ status: answer.statusCode!, body }))
    })
    sending.once('error', reject)
    sending.end(bytes)
  })
}

/** Sends piece after piece until an answer comes, and never an end. */
function postEndlessly(): Promise<{ status: number; sentAll: boolean }> {
  return new Promise((resolve, reject) => {
    const piece = Buffer.alloc(256 * 1024, ' ')
    const sending = httpRequest(`${inject('served').url}/api/v1${JACOBIAN}`, { method: 'POST', headers: { ...asKey(), ...json } }, (answer) => {
      clearInterval(timer)
      resolve({ status: answer.statusCode!, sentAll: sending.writableEnded })
      sending.destroy()
    })
    const timer = setInterval(() => sending.write(piece), 2)
    sending.on('error', reject)
  })
}
