import { describe, expect, it } from 'vitest'
import type { Model } from '@/lib/contract/model'
import { sample } from './example-request'
import { expectProblem, pointersOf } from './expect-problem'
import { importModel, postModel, postRevision } from './import-model'
import { asNewKey } from './make-key'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'
import { snake } from './urdf'

const MODELS = '/teams/tarnholm/models'

interface Page {
  readonly items: readonly Model[]
  readonly nextCursor?: string
}

const list = async (query: Record<string, string> = {}) => get(`${MODELS}?${new URLSearchParams(query)}`, await asPerson('kofi'))
const slugs = async (query: Record<string, string> = {}) => ((await list(query)).body as Page).items.map(({ slug }) => slug)

describe('importing a new model', () => {
  it('answers model and revision whole, and where the revision is', async () => {
    const made = await postModel({ name: '  Bench arm  ', note: 'For the bench.\nSecond line.' }, 'trainer-3r.urdf')
    expect(made.status).toBe(201)
    expect(made.headers.location).toBe('/api/v1/teams/tarnholm/models/bench-arm/revisions/1')
    const { model, revision } = made.body as { model: Model; revision: object }
    expect(model).toMatchObject({ slug: 'bench-arm', name: 'Bench arm', note: 'For the bench.\nSecond line.', revisions: 1, latest: { revision: 1, status: 'draft', independent: 3 } })
    expect(model).not.toHaveProperty('released')
    expect(model).not.toHaveProperty('archivedAt')
    expect(revision).toMatchObject({
      model: { slug: 'bench-arm', name: 'Bench arm' },
      revision: 1,
      status: 'draft',
      robotName: 'trainer_3r',
      importedBy: 'Ines Okafor',
      history: [{ status: 'draft', by: 'Ines Okafor' }],
      counts: { links: 5, joints: 4, independent: 3 },
      rootLink: 'table',
      chains: [{ base: 'table', tip: 'tool_point', joints: ['shoulder', 'elbow', 'wrist'], default: true }],
      findings: { error: 0 },
    })
    expect((await get(`${MODELS}/bench-arm`, await asPerson('kofi'))).body).toEqual(model)
    expect((await get(`${MODELS}/bench-arm/revisions/1`, await asPerson('kofi'))).body).toEqual(revision)
  })

  it('writes times in UTC and joints as the sheet needs them', async () => {
    const { model, revision } = await importModel('Timed arm', 'gannet-4.urdf')
    for (const at of [model.createdAt, model.changedAt, revision.importedAt, revision.history[0]!.at]) expect(at).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/)
    expect(revision.joints.find(({ name }) => name === 'quill_stroke')).toMatchObject({ type: 'prismatic', axis: [0, 0, -1], lower: 0, upper: 0.17, rate: 1.15, effort: 180 })
    expect(revision.joints.find(({ name }) => name === 'flange_plate')).not.toHaveProperty('lower')
  })

  it('records a key as the importer', async () => {
    const headers = await asNewKey('catalog:write')
    const made = await send({ method: 'POST', path: MODELS, headers, form: { fields: { name: 'By a script' }, file: { name: 'a.urdf', bytes: sample('trainer-3r.urdf') } } })
    expect((made.body as { revision: { importedBy: string } }).revision.importedBy).toBe('key For a test: catalog:write')
  })

  it('refuses a file with an error, names the place, and stores nothing', async () => {
    expectProblem(await postModel({ name: 'Flawed' }, 'flawed-error.urdf'), 'import-refused')
    expectProblem(await postModel({ name: 'Flawed' }, ''), 'import-refused')
    expect(await slugs({ query: 'flawed' })).toEqual([])
  })

  it('keeps the last part of a file name, cut where a character ends', async () => {
    const name = `C:\\robots\\${'a'.repeat(119)}🦾.urdf`
    const made = await send({ method: 'POST', path: MODELS, headers: await asPerson('ines'), form: { fields: { name: 'Long file name' }, file: { name, bytes: sample('trainer-3r.urdf') } } })
    expect(made.status).toBe(201)
    const source = await get(`${MODELS}/long-file-name/revisions/1/source`, await asPerson('ines'))
    expect(source.status).toBe(200)
    expect(source.headers['content-disposition']).toContain(`${'a'.repeat(119)}%F0%9F%A6%BE`)
  })

  it.each([
    [{ name: '   ' }, '/form/name'],
    [{ name: 'x'.repeat(121) }, '/form/name'],
    [{ name: 'two\nlines' }, '/form/name'],
    [{ name: 'nul\0' }, '/form/name'],
    [{ name: 'ok', note: 'x'.repeat(2001) }, '/form/note'],
    [{ name: 'ok', note: 'bell\x07' }, '/form/note'],
  ])('refuses the fields %j', async (fields, pointer) => {
    const response = await postModel(fields, 'trainer-3r.urdf')
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })
})

describe('slugs', () => {
  it.each(['new', 'import', 'comparison', 'released', '', '-a', 'a-', 'A', 'a_b', 'ä', 'a b', 'x'.repeat(65)])('refuses "%s"', async (slug) => {
    const response = await postModel({ name: 'Any', slug }, 'trainer-3r.urdf')
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/form/slug'])
  })

  it.each(['a', '7', 'a--b', 'x'.repeat(64)])('takes "%s" and refuses it the second time', async (slug) => {
    expect((await postModel({ name: 'Any', slug }, 'trainer-3r.urdf')).status).toBe(201)
    expectProblem(await postModel({ name: 'Any', slug }, 'trainer-3r.urdf'), 'slug-taken')
  })

  it('derives free ones from the name, numbered from 2', async () => {
    const derived = async (name: string) => (await importModel(name, 'trainer-3r.urdf')).model.slug
    expect([await derived('Größe Ångström'), await derived('grosse angstrom'), await derived('GROSSE  ANGSTROM!')]).toEqual(['grosse-angstrom', 'grosse-angstrom-2', 'grosse-angstrom-3'])
    expect([await derived('New'), await derived('new'), await derived('???')]).toEqual(['model-new', 'model-new-2', 'model'])
    const long = 'long '.repeat(24).trim()
    const cut = [await derived(long), await derived(long), await derived(long), await derived(long)]
    expect(cut.map((slug) => slug.slice(-2))).toEqual([cut[0]!.slice(-2), '-2', '-3', '-4'])
    expect(cut.every((slug) => slug.length <= 64)).toBe(true)
  })

  it('gives twenty imports of one name at the same moment twenty slugs without a gap', async () => {
    const made = await Promise.all(Array.from({ length: 20 }, () => postModel({ name: 'Twenty at once' }, 'trainer-3r.urdf')))
    expect(made.map(({ status }) => status)).toEqual(new Array(20).fill(201))
    const numbers = made.map(({ body }) => Number((body as { model: Model }).model.slug.replace(/^twenty-at-once-?/, '') || '1'))
    expect(numbers.sort((a, b) => a - b)).toEqual(Array.from({ length: 20 }, (_, i) => i + 1))
  })
})

describe('checking a file', () => {
  it('says what is wrong with it and answers 200 whatever it holds', async () => {
    const check = async (bytes: Buffer) => send({ method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields: {}, file: { name: 'a.zip', bytes } } })
    const flawed = await check(sample('flawed-error.urdf'))
    expect([flawed.status, flawed.body]).toEqual([200, { findings: expect.arrayContaining([expect.objectContaining({ severity: 'error' })]) }])
    const warned = await check(sample('flawed-warning.urdf'))
    expect(warned.body).toMatchObject({ findings: [{ rule: 'axis-normalised', severity: 'warning', element: "joint 'tilt'" }], structure: { robotName: 'dunlin_2', counts: { independent: 2 } } })
    for (const bytes of [Buffer.alloc(0), Buffer.from('PK\x03\x04'), Buffer.alloc(1000, 0xff), Buffer.from('<a>'.repeat(5000))]) {
      expect(await check(bytes)).toMatchObject({ status: 200, body: { findings: [{ severity: 'error' }] } })
    }
  })

  it('answers the structure that storing would make', async () => {
    const checked = await send({ method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields: {}, file: { name: 'a.urdf', bytes: sample('skerry-7.urdf') } } })
    const { body } = await get(`${MODELS}/skerry-7/revisions/1`, await asPerson('ines'))
    expect(body).toMatchObject((checked.body as { structure: object }).structure)
  })
})

describe('the register', () => {
  it('lists by slug, page after page, each with a link to the next', async () => {
    const all = await slugs({ query: 'twenty at once' })
    expect(all).toEqual([...all].sort())
    expect(all).toHaveLength(20)
    const seen: string[] = []
    for (let path: string | undefined = `${MODELS}?limit=3&query=twenty+at+once`; path !== undefined; ) {
      const response = await get(path, await asPerson('kofi'))
      const { items, nextCursor } = response.body as Page
      seen.push(...items.map(({ slug }) => slug))
      const link: string | undefined = response.headers.link
      expect(link === undefined).toBe(nextCursor === undefined)
      expect(items.length === 3 || nextCursor === undefined).toBe(true)
      path = link && /^<\/api\/v1(.+)>; rel="next"$/.exec(link)![1]
    }
    expect(seen).toEqual(all)
  })

  it('filters by words in name, slug, note or the robot’s name, whatever the case and accents, by status and by joints, and keeps the filter in the link', async () => {
    expect(await slugs({ query: 'RAIL' })).toEqual(['skerry-7-rail'])
    expect(await slugs({ query: 'palletiser' })).toEqual(['fulmar-6'])
    expect(await slugs({ joints: '8', query: 'skerry' })).toEqual(['skerry-7-rail'])
    expect(await slugs({ joints: '4', query: 'scara' })).toEqual(['gannet-4'])
    expect(await slugs({ status: 'superseded', query: 'skerry' })).toEqual(['skerry-7'])
    expect(await slugs({ query: '100%' })).toEqual([])
    expect(await slugs({ query: 'SKÉRRY_7', joints: '8' })).toEqual(['skerry-7-rail'])
    expect(await slugs({ query: 'SKÉRRY_7', status: 'superseded' })).toEqual(['skerry-7'])
    expect(await slugs({ query: 'fulmar%6' })).toEqual([])
    expect(await slugs({ query: '\\' })).toEqual([])
    expect((await slugs({ query: '   ' })).length).toBeGreaterThan(5)
    const { headers } = await list({ query: 'skerry 7', limit: '1' })
    expect(headers.link).toMatch(/query=skerry\+7&limit=1&cursor=/)
  })

  it.each([
    { limit: '0' }, { limit: '201' }, { limit: '-1' }, { limit: '1.5' }, { limit: '1e1' }, { limit: 'ten' }, { limit: '' }, { limit: ' 5' },
    { joints: '' }, { joints: '-1' }, { joints: '0x1' }, { status: 'Released' }, { status: '' }, { query: 'x'.repeat(201) }, { query: 'a\0' },
    { cursor: '' }, { cursor: 'garbage' }, { cursor: 'bnVsbA' }, { cursor: 'WzFd' }, { cursor: 'WyJhIiwiYiJd' }, { cursor: 'x'.repeat(501) }, { sort: 'name' },
  ])('refuses %j', async (query) => {
    const response = await list(query as unknown as Record<string, string>)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([`/query/${Object.keys(query)[0]}`])
  })
})

describe('editing and archiving', () => {
  it('changes name and note of the state that was read, and never the slug', async () => {
    const { model } = await importModel('To be renamed', 'trainer-3r.urdf')
    const path = `${MODELS}/${model.slug}`
    const headers = await asPerson('ines')
    const { etag } = (await get(path, headers)).headers
    expect(etag).toMatch(/^"[^"]+"$/)
    const edited = await send({ method: 'PATCH', path, headers: { ...headers, 'if-match': etag! }, json: { name: 'Renamed', note: 'With a note.' } })
    expect(edited.body).toMatchObject({ slug: model.slug, name: 'Renamed', note: 'With a note.' })
    expect(edited.headers.etag).not.toBe(etag)
    expectProblem(await send({ method: 'PATCH', path, headers: { ...headers, 'if-match': etag! }, json: { name: 'Again' } }), 'stale')
    expectProblem(await send({ method: 'PATCH', path, headers: { ...headers, 'if-match': `W/${edited.headers.etag}` }, json: { name: 'Again' } }), 'stale')
    const listed = { ...headers, 'if-match': `"other", ${edited.headers.etag}` }
    const bare = await send({ method: 'PATCH', path, headers: listed, json: { note: null } })
    expect(bare.body).toMatchObject({ name: 'Renamed' })
    expect(bare.body).not.toHaveProperty('note')
  })

  it('lets one of two edits of the same state through', async () => {
    const { model } = await importModel('Edited by two', 'trainer-3r.urdf')
    const path = `${MODELS}/${model.slug}`
    const headers = await asPerson('ines')
    const { etag } = (await get(path, headers)).headers
    const edits = await Promise.all(['One', 'Two', 'Three'].map((name) => send({ method: 'PATCH', path, headers: { ...headers, 'if-match': etag! }, json: { name } })))
    expect(edits.map(({ status }) => status).sort()).toEqual([200, 412, 412])
  })

  it('knows the state that a reader already has', async () => {
    const headers = await asPerson('kofi')
    const { etag } = (await get(`${MODELS}/gannet-4`, headers)).headers
    for (const known of [etag!, `W/${etag}`, `"other", ${etag}`, '*']) {
      const again = await get(`${MODELS}/gannet-4`, { ...headers, 'if-none-match': known })
      expect([again.status, again.text, again.headers.etag]).toEqual([304, '', etag])
    }
    expect((await get(`${MODELS}/gannet-4`, { ...headers, 'if-none-match': '"other"' })).status).toBe(200)
  })

  it('changes the ETag when a revision is added or changes status', async () => {
    const { model } = await importModel('Watched', 'trainer-3r.urdf')
    const etag = async () => (await get(`${MODELS}/${model.slug}`, await asPerson('kofi'))).headers.etag
    const first = await etag()
    await postRevision(model.slug, 'gannet-4.urdf')
    expect(await etag()).not.toBe(first)
  })

  it('takes an archived model out of the register and leaves it readable and computing', async () => {
    const { model } = await importModel('Soon archived', snake(2))
    const path = `${MODELS}/${model.slug}`
    const mira = await asPerson('mira')
    const { etag } = (await get(path, mira)).headers
    expect((await send({ method: 'DELETE', path, headers: { ...mira, 'if-match': etag! } })).status).toBe(204)
    expect(await slugs({ query: 'soon archived' })).toEqual([])
    expect((await get(path, mira)).body).toMatchObject({ archivedAt: expect.any(String) })
    const computed = await send({ method: 'POST', path: `${path}/revisions/1/forward-kinematics`, headers: asKey(), json: { configurations: [[0, 0]] } })
    expect((computed.body as { results: object[] }).results).toMatchObject([{ pose: { position: [0, 0, 0.2] } }])
    expect((await importModel('Soon archived', snake(2))).model.slug).toBe('soon-archived-2')
    const { etag: newer } = (await get(path, mira)).headers
    expect((await send({ method: 'DELETE', path, headers: { ...mira, 'if-match': newer! } })).status).toBe(204)
  })
})
