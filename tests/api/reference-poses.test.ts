import { describe, expect, it } from 'vitest'
import { EVIDENCE_OPERATIONS } from '@/lib/contract/evidence-operations'
import type { ReferencePoses, ReferencePosesSummary } from '@/lib/contract/reference-poses'
import { expectProblem, pointersOf } from './expect-problem'
import { importModel, postTransition } from './import-model'
import { makeKey } from './make-key'
import { get, send } from './send'
import { asKey, asPerson, type Person } from './support/callers'

/** The trainer, a planar arm with three links of 1 m: its poses are closed form. */
const STATED = { units: { length: 'mm', angle: 'deg' }, rotation: 'fixed-xyz', tool: null, tolerance: { position: 0.5, orientation: 0.1 } } as const

/** Rows that stand away from the closed form by dx (mm) and turn (deg). */
const rowOf = ([a, b, c]: readonly [number, number, number], dx = 0, turn = 0): string => {
  const angles = [a, a + b, a + b + c].map((angle) => (angle * Math.PI) / 180)
  const sum = (part: (angle: number) => number) => 1000 * angles.reduce((total, angle) => total + part(angle), 0)
  return [a, b, c, sum(Math.cos) + dx, sum(Math.sin), 0, 0, 0, a + b + c + turn].join(',')
}
const GOOD = [rowOf([0, 0, 0]), rowOf([30, 30, 30], 0.3), rowOf([10, -40, 75], 0, 0.05)].join('\n')
const BAD = [rowOf([0, 0, 0]), rowOf([30, 30, 30], 0.6), rowOf([10, -40, 75], 0, 0.2)].join('\n')

const trainer = async (name: string, by: Person = 'ines', team = 'tarnholm') =>
  `/teams/${team}/models/${(await importModel(name, 'trainer-3r.urdf', by, team)).model.slug}/revisions/1`

const post = async (revision: string, json: object, by: Person = 'ines', check = false) =>
  send({ method: 'POST', path: `${revision}/reference-poses${check ? '/check' : ''}`, headers: await asPerson(by), json: { ...STATED, ...json } })

const read = async <T>(path: string): Promise<T> => {
  const response = await get(path, await asPerson('kofi'))
  expect(response.status, response.text).toBe(200)
  return response.body as T
}

describe('reference poses', () => {
  it('are held against the model row by row, in the units stated', async () => {
    const revision = await trainer('Measured')
    const response = await post(revision, { table: BAD, note: 'Measured by hand.' })
    expect(response.status, response.text).toBe(201)
    expect(response.headers.location).toBe(`/api/v1${revision}/reference-poses/1`)
    const set = response.body as ReferencePoses
    expect(set).toMatchObject({ number: 1, by: 'Ines Okafor', note: 'Measured by hand.', ...STATED, poses: 3, failed: 2, passed: false, decimalMark: '.', table: BAD })
    expect(set.chain).toEqual({ base: 'table', tip: 'tool_point', joints: ['shoulder', 'elbow', 'wrist'], types: ['revolute', 'revolute', 'revolute'] })
    expect(set.rows.map(({ row, passed, withinLimits }) => [row, passed, withinLimits])).toEqual([[1, true, true], [2, false, true], [3, false, true]])
    const away = set.rows.map(({ positionError, orientationError }) => [positionError, orientationError])
    const expected = [[0, 0], [0.6, 0], [0, 0.2]]
    away.forEach((row, i) => row.forEach((error, j) => expect(Math.abs(error - expected[i]![j]!)).toBeLessThan(1e-9)))
    expect(set.position.max).toBeCloseTo(0.6, 9)
    expect(set.orientation.mean).toBeCloseTo(0.2 / 3, 9)
    expect(set.rows[1]!.configuration.map((value) => Math.round(value * 1e9) / 1e9)).toEqual([30, 30, 30])
    expect(await read(`${revision}/reference-poses/1`)).toEqual(set)
  })

  it('pass when every row is within the stated tolerance', async () => {
    const set = (await post(await trainer('Measured well'), { table: GOOD })).body as ReferencePoses
    expect(set).toMatchObject({ passed: true, failed: 0 })
  })

  it('are answered in metres and radians where these were stated', async () => {
    const table = '0,0,0,3.001,0,0,0,0,0.01'
    const set = (await post(await trainer('Measured in SI'), { table, units: { length: 'm', angle: 'rad' }, tolerance: { position: 0.002, orientation: 0.02 } })).body as ReferencePoses
    expect(set.rows[0]!.positionError).toBeCloseTo(0.001, 12)
    expect(set.rows[0]!.orientationError).toBeCloseTo(0.01, 12)
    expect(set.passed).toBe(true)
  })

  it('count the tool that was measured at', async () => {
    const tool = { position: [0, 0, 250], quaternion: [0, 0, 0, 1] }
    const set = (await post(await trainer('Measured with a tool'), { table: '0,0,0,3000,0,250,0,0,0', tool })).body as ReferencePoses
    expect(set).toMatchObject({ tool, passed: true })
    expect(set.position.max).toBeLessThan(1e-9)
  })

  it('say when the model would not let the joints stand there, and compute all the same', async () => {
    const set = (await post(await trainer('Measured outside'), { table: rowOf([179, 0, 0]) })).body as ReferencePoses
    expect(set.rows[0]).toMatchObject({ withinLimits: false, passed: true })
  })

  it('are listed newest first, in pages, without their rows', async () => {
    const revision = await trainer('Measured often')
    for (const table of [BAD, GOOD, BAD]) await post(revision, { table })
    const first = await read<{ items: ReferencePosesSummary[]; nextCursor: string }>(`${revision}/reference-poses?limit=2`)
    expect(first.items.map(({ number, passed }) => [number, passed])).toEqual([[3, false], [2, true]])
    expect(first.items[0]).not.toHaveProperty('rows')
    const second = await read<{ items: ReferencePosesSummary[] }>(`${revision}/reference-poses?limit=2&cursor=${first.nextCursor}`)
    expect(second.items.map(({ number }) => number)).toEqual([1])
    expect(second).not.toHaveProperty('nextCursor')
  })

  it('can be checked without being stored', async () => {
    const revision = await trainer('Checked only')
    const { body, status } = await post(revision, { table: BAD }, 'ines', true)
    expect([status, body]).toEqual([200, expect.objectContaining({ passed: false, failed: 2 })])
    expect(await read(`${revision}/reference-poses`)).toEqual({ items: [] })
  })

  it('get numbers of their own when two people store at the same moment', async () => {
    const revision = await trainer('Measured twice at once')
    const both = await Promise.all([post(revision, { table: GOOD }), post(revision, { table: BAD }, 'tomas')])
    expect(both.map(({ status }) => status)).toEqual([201, 201])
    expect(both.map(({ body }) => (body as ReferencePoses).number).sort()).toEqual([1, 2])
  })

  it('are stored by a key under its label, and never changed or removed', async () => {
    const revision = await trainer('Measured by a machine')
    const { key } = await makeKey(['catalog:write'])
    const made = await send({ method: 'POST', path: `${revision}/reference-poses`, headers: asKey(key), json: { ...STATED, table: GOOD } })
    expect((made.body as ReferencePoses).by).toMatch(/^key /)
    for (const method of ['PUT', 'PATCH', 'DELETE'] as const) {
      const refused = await send({ method, path: `${revision}/reference-poses/1`, headers: await asPerson('mira'), json: {} })
      expectProblem(refused, 'method-not-allowed')
    }
  })

  it.each(['0', '01', '2000000', 'x', '4000000000'])('are not found under %s', async (set) => {
    expectProblem(await get(`/teams/tarnholm/models/skerry-7/revisions/1/reference-poses/${set}`, await asPerson('kofi')), 'reference-poses-not-found')
  })

  it('fail for the nominal arm of the demo and pass for the calibrated one', async () => {
    const verdicts = await Promise.all([1, 2].map((revision) => read<{ items: ReferencePosesSummary[] }>(`/teams/tarnholm/models/skerry-7/revisions/${revision}/reference-poses`)))
    expect(verdicts.map(({ items }) => items.at(-1)!.passed)).toEqual([false, true])
  })
})

describe('a question with reference poses', () => {
  it.each(['units', 'rotation', 'tool', 'tolerance', 'table'])('has to state %s', async (field) => {
    const { [field]: _left, ...question } = { ...STATED, table: GOOD } as Record<string, unknown>
    const response = await send({ method: 'POST', path: '/teams/tarnholm/models/trainer-3r/revisions/1/reference-poses/check', headers: await asPerson('ines'), json: question })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([`/${field}`])
  })

  it.each([
    [{ units: { length: 'mm' } }, '/units/angle'],
    [{ rotation: 'euler' }, '/rotation'],
    [{ tolerance: { position: 0, orientation: 1 } }, '/tolerance/position'],
    [{ table: `${GOOD}\u0000` }, '/table'],
    [{ tool: { position: [0, 0, 1e13], quaternion: [0, 0, 0, 1] } }, '/tool/position/2'],
    [{ tolerance: { position: 1e13, orientation: 1 } }, '/tolerance/position'],
    [{ table: `${GOOD}\n1,2,x,4,5,6,7,8,9` }, '/table'],
    [{ colour: 'red' }, '/colour'],
  ])('is refused with %j', async (json, pointer) => {
    const response = await post('/teams/tarnholm/models/trainer-3r/revisions/1', { table: GOOD, ...json }, 'ines', true)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })

  it('names every bad cell by row and column', async () => {
    const response = await post('/teams/tarnholm/models/trainer-3r/revisions/1', { table: `${GOOD}\n1,2,x,4,5,6,7,8,9\n1,2,3` }, 'ines', true)
    expect((response.body as { errors: object[] }).errors).toEqual([
      { pointer: '/table', detail: 'row 4, column 3 (wrist): "x" is not a number' },
      { pointer: '/table', detail: 'row 5 has 3 columns; 9 are needed: shoulder, elbow, wrist, x, y, z, roll, pitch, yaw' },
    ])
  })

  it('does not parse with an open quote', async () => {
    expectProblem(await post('/teams/tarnholm/models/trainer-3r/revisions/1', { table: '"1,2,3' }, 'ines', true), 'malformed-body')
  })

  it('works as the reference shows it', async () => {
    const { example } = EVIDENCE_OPERATIONS.checkReferencePoses
    const response = await send({ method: 'POST', path: '/teams/tarnholm/models/skerry-7/revisions/1/reference-poses/check', headers: await asPerson('ines'), json: example })
    expect(response.body).toMatchObject({ passed: true, poses: 2 })
  })
})

describe('a team that releases only what was measured', () => {
  const release = async (revision: string, by: Person) => {
    const [, , , , model] = revision.split('/')
    return postTransition(model!, 1, 'released', by, undefined, 'kestrel')
  }

  it('refuses a release until the newest reference poses pass', async () => {
    const revision = await trainer('Released when measured', 'runa', 'kestrel')
    await postTransition(revision.split('/')[4]!, 1, 'in-review', 'runa', undefined, 'kestrel')
    const without = await release(revision, 'edda')
    expectProblem(without, 'evidence-missing')
    expect((without.body as { detail: string }).detail).toContain('store reference poses')
    await post(revision, { table: GOOD }, 'runa')
    await post(revision, { table: BAD }, 'runa')
    const failing = await release(revision, 'edda')
    expectProblem(failing, 'evidence-missing')
    expect((failing.body as { detail: string }).detail).toContain('number 2')
    await post(revision, { table: GOOD }, 'runa')
    expect((await release(revision, 'edda')).status).toBe(200)
  })

  it('still demands four eyes', async () => {
    const revision = await trainer('Measured and released by one', 'runa', 'kestrel')
    await postTransition(revision.split('/')[4]!, 1, 'in-review', 'runa', undefined, 'kestrel')
    await post(revision, { table: GOOD }, 'runa')
    expectProblem(await release(revision, 'runa'), 'four-eyes')
  })
})
