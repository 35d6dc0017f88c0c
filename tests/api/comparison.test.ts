import { describe, expect, it } from 'vitest'
import type { Comparison } from '@/lib/contract/comparison'
import { sample } from './example-request'
import { expectProblem, pointersOf } from './expect-problem'
import { importModel, postRevision } from './import-model'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'
import { floatingCart, snake, twoArms } from './urdf'

const ask = async (model: string, query: Record<string, string> = {}) => get(`/teams/tarnholm/models/${model}/comparison?${new URLSearchParams(query)}`, await asPerson('kofi'))

async function compare(model: string, query: Record<string, string> = {}): Promise<Comparison> {
  const response = await ask(model, query)
  expect(response.status, response.text).toBe(200)
  return response.body as Comparison
}

/** A model with these files as revisions 1 and 2. */
async function modelOf(name: string, first: string, second: string): Promise<string> {
  const { model } = await importModel(name, first)
  const added = await postRevision(model.slug, second, { allowSame: 'true' })
  expect(added.status, added.text).toBe(201)
  return model.slug
}

const trainer = () => sample('trainer-3r.urdf').toString()

/** Where a revision puts the tip at a configuration. */
async function tipAt(model: string, revision: number, q: readonly number[]): Promise<readonly number[]> {
  const path = `/teams/tarnholm/models/${model}/revisions/${revision}/forward-kinematics`
  const { body } = await send({ method: 'POST', path, headers: await asPerson('kofi'), json: { configurations: [q] } })
  return (body as { results: [{ pose: { position: number[] } }] }).results[0].pose.position
}

describe('the comparison of two revisions', () => {
  it('says first how far the tip moves for the same joint values', async () => {
    const { from, to, sameKinematics, chain, effect, limits, changes } = await compare('skerry-7', { from: '1', to: '2' })
    expect([from.revision, to.revision, sameKinematics]).toEqual([1, 2, false])
    expect(chain).toMatchObject({ base: 'base_link', tip: 'tool_flange', joints: ['shoulder_pan', 'shoulder_lift', 'upper_roll', 'elbow', 'fore_roll', 'wrist', 'flange_roll'], held: [] })
    expect(effect).toMatchObject({ samples: 2000, seed: 1, rotation: { max: 0, mean: 0, p95: 0 } })
    expect(effect.rotation.worst).toBeUndefined()
    // The corrections add up to 0.84 mm at the most, along a stretched arm with all of them in line.
    const { max, mean, p95, worst } = effect.translation
    expect(mean).toBeLessThan(p95)
    expect(p95).toBeLessThan(max)
    expect(max).toBeLessThan(0.00084)
    const poses = [await tipAt('skerry-7', 1, worst!), await tipAt('skerry-7', 2, worst!)] as const
    expect(Math.hypot(...poses[0].map((value, i) => value - poses[1][i]!))).toBeCloseTo(max, 15)
    expect(limits).toEqual([{ joint: 'wrist', limit: 'lower', from: -2, to: -1.92, change: 'narrowed', quantity: 'angle' }])
    expect(changes.map(({ what }) => what)).toEqual(new Array(8).fill('origin'))
  })

  it('moves the tip of a planar arm by the difference of one link, wherever it stands', async () => {
    const model = await modelOf('One longer link', trainer(), trainer().replace('<origin xyz="1 0 0"/>', '<origin xyz="1.0025 0 0"/>'))
    const { effect } = await compare(model)
    for (const measure of ['max', 'mean', 'p95'] as const) expect(effect.translation[measure]).toBeCloseTo(0.0025, 14)
  })

  it('says that nothing kinematic changed where the fingerprints agree, and computes nothing', async () => {
    const model = await modelOf('Renamed only', trainer(), trainer().replace(/<robot name="[^"]*"/, '<robot name="another"'))
    const { sameKinematics, effect, changes, limits, from, to } = await compare(model)
    expect(from.fingerprint).toBe(to.fingerprint)
    expect({ sameKinematics, effect, limits }).toEqual({
      sameKinematics: true,
      effect: { samples: 0, seed: 1, translation: { max: 0, mean: 0, p95: 0 }, rotation: { max: 0, mean: 0, p95: 0 } },
      limits: [],
    })
    expect(changes).toMatchObject([{ element: 'robot', what: 'name', to: 'another' }])
  })

  it('holds the newest against the one before it when nothing is named, and takes the word released', async () => {
    expect(await compare('skerry-7')).toEqual(await compare('skerry-7', { from: '1', to: '2' }))
    expect(await compare('skerry-7', { from: '1', to: 'released' })).toEqual(await compare('skerry-7', { from: '1', to: '2' }))
    expect(await compare('trainer-3r')).toMatchObject({ from: { revision: 1 }, to: { revision: 1 }, sameKinematics: true })
  })

  it('compares between any two links that both have', async () => {
    const { chain, effect } = await compare('skerry-7', { from: '1', to: '2', base: 'link_3', tip: 'link_4' })
    expect(chain).toMatchObject({ base: 'link_3', tip: 'link_4', joints: ['elbow'] })
    expect(effect.translation.max).toBeCloseTo(Math.hypot(0.00011, 0.00027), 12)
  })

  it('matches renamed joints and links, and says so', async () => {
    const model = await modelOf('Renamed parts', snake(3), snake(3).replaceAll('"j2"', '"elbow"').replaceAll('"l2"', '"forearm"'))
    const { chain, changes, effect } = await compare(model, { tip: 'forearm' })
    expect(chain).toMatchObject({ tip: 'forearm', joints: ['j1', 'elbow'], former: { base: 'l0', tip: 'l2', joints: ['j1', 'j2'] }, held: [] })
    expect(changes).toEqual([
      { element: "joint 'elbow'", what: 'renamed', from: 'j2', to: 'elbow' },
      { element: "link 'forearm'", what: 'renamed', from: 'l2', to: 'forearm' },
    ])
    expect(effect.translation.max).toBe(0)
  })

  it('lets a joint that only one revision has stand at 0, and lists it', async () => {
    const railless = snake(3)
    const model = await modelOf('One joint fixed', railless, railless.replace('<joint name="j2" type="revolute">', '<joint name="j2" type="fixed">'))
    const { chain, effect, changes } = await compare(model)
    expect(chain).toMatchObject({ joints: ['j1', 'j3'], held: [{ joint: 'j2', in: 'from', quantity: 'angle', value: 0 }] })
    expect(effect.translation.max).toBe(0)
    expect(changes).toContainEqual({ element: "joint 'j2'", what: 'type', from: 'revolute', to: 'fixed' })
  })

  it('names the link that one of them lacks', async () => {
    const model = await modelOf('Another arm', snake(2), twoArms())
    const response = await ask(model)
    expectProblem(response, 'chain-not-found')
    expect((response.body as { detail: string }).detail).toContain("Revision 1 has no link 'right_hand'")
  })

  it('names the joint that cannot be computed', async () => {
    const { model } = await importModel('A cart to compare', floatingCart())
    const response = await ask(model.slug, { base: 'ground', tip: 'arm' })
    expectProblem(response, 'chain-not-computable')
    expect((response.body as { detail: string }).detail).toContain("'ride'")
  })

  it.each([
    [{ from: '0' }, '/query/from'],
    [{ from: 'draft' }, '/query/from'],
    [{ to: '1.5' }, '/query/to'],
    [{ to: '-1' }, '/query/to'],
    [{ until: '1' }, '/query/until'],
  ])('refuses %j', async (query, pointer) => {
    const response = await ask('skerry-7', query as unknown as Record<string, string>)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })

  it.each(['4', '2147483648', '9999999999'])('knows no revision %s', async (from) => expectProblem(await ask('skerry-7', { from }), 'revision-not-found'))

  it('answers 304 to who has it already', async () => {
    const first = await ask('skerry-7')
    const again = await get('/teams/tarnholm/models/skerry-7/comparison', { ...(await asPerson('kofi')), 'if-none-match': first.headers.etag! })
    expect(again.status).toBe(304)
  })

  it('lists a thousand changes and counts the others', async () => {
    const model = await modelOf('Many changes', snake(1500, 0.001), snake(1500, 0.0011))
    const { changes, leftOut } = await compare(model)
    expect([changes.length, leftOut]).toEqual([1000, 500])
  })

  it('is refused to a key without the scope of the catalog', async () => expectProblem(await get('/teams/tarnholm/models/skerry-7/comparison', asKey()), 'scope-missing'))
})
