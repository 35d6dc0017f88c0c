import { describe, expect, inject, it } from 'vitest'
import type { ModelReference } from '@/lib/contract/kinematic-answers'
import { FORWARD_KINEMATICS_FIELDS, JACOBIAN_FIELDS, JOINT_RATES_FIELDS, NULL_SPACE_FIELDS } from '@/lib/contract/kinematic-questions'
import { expectProblem, pointersOf } from '../expect-problem'
import { importModel } from '../import-model'
import { get } from '../send'
import { asPerson } from '../support/callers'
import { floatingCart } from '../urdf'
import { ask, answerTo, QUESTIONS, resultOf, resultsOf, type Question } from './ask'
import { expectClose } from './close'

const TWIST = { twists: [[0.1, 0, 0, 0, 0, 0]] }
const asked = (question: Question, more: object = {}) => ({ configurations: [[0.3, 0.4, 0.5]], ...(question === 'joint-rates' ? TWIST : {}), ...more })

const FIELDS: Readonly<Record<Question, readonly string[]>> = {
  'forward-kinematics': FORWARD_KINEMATICS_FIELDS,
  jacobian: JACOBIAN_FIELDS,
  'null-space': NULL_SPACE_FIELDS,
  'joint-rates': JOINT_RATES_FIELDS,
}

describe.each(QUESTIONS)('%s', (question) => {
  it('names the model that it was computed from, whatever its status', async () => {
    const places = { 'skerry-7/1': 'superseded', 'skerry-7/2': 'released', 'fulmar-6/1': 'in-review', 'skerry-7-rail/1': 'draft' } as const
    for (const [place, status] of Object.entries(places)) {
      const [model, revision] = place.split('/') as [string, string]
      const { body } = await get(`/teams/tarnholm/models/${model}/revisions/${revision}`, await asPerson('kofi'))
      const { fingerprint, counts } = body as { fingerprint: string; counts: { independent: number } }
      const configurations = [new Array<number>(counts.independent).fill(0.1)]
      const response = await ask(question, place, { configurations, ...(question === 'joint-rates' ? TWIST : {}) })
      expect(response.body).toMatchObject({ model: { team: 'tarnholm', model, revision: Number(revision), status, fingerprint }, characteristicLength: 1 })
      expect(response.headers).toMatchObject({ 'model-fingerprint': fingerprint, link: '</docs/cautions>; rel="help"', 'cache-control': 'no-store' })
    }
    const released = await ask(question, 'trainer-3r/released', asked(question))
    expect((released.body as { model: typeof ModelReference }).model).toMatchObject({ revision: 1, status: 'released' })
  })

  it('answers only when the model is the one insisted on', async () => {
    const { model } = await answerTo(question, 'trainer-3r', asked(question))
    const insist = (field: string) => ask(question, 'trainer-3r', asked(question), { 'if-match': field })
    for (const field of [`"${model.fingerprint}"`, '*', `"${'0'.repeat(64)}", "${model.fingerprint}"`]) expect((await insist(field)).status, field).toBe(200)
    for (const field of [`"${'0'.repeat(64)}"`, model.fingerprint, `W/"${model.fingerprint}"`, `"${model.fingerprint.slice(0, 16)}"`]) {
      const response = await insist(field)
      expectProblem(response, 'fingerprint-mismatch')
      expect(response.headers['model-fingerprint']).toBe(model.fingerprint)
    }
  })

  it('answers exactly the fields named in include', async () => {
    for (const field of FIELDS[question]) {
      const more = field === 'links' ? { links: ['table'] } : {}
      expect(Object.keys(await resultOf(question, 'trainer-3r', asked(question, { include: [field], ...more })))).toEqual([field])
    }
    const all = Object.keys(await resultOf(question, 'trainer-3r', asked(question)))
    expect(all.sort()).toEqual(FIELDS[question].filter((field) => field !== 'projector' && field !== 'links').sort())
    for (const include of [[], ['speed'], 'pose']) expectProblem(await ask(question, 'trainer-3r', asked(question, { include })), 'invalid-request')
  })

  it('answers ten thousand configurations in their order, and not one more', async () => {
    const configurations = Array.from({ length: 10_000 }, (_, i) => [i / 10_000, 0.4, 0.5])
    const include = [FIELDS[question][0]]
    const results = await resultsOf(question, 'trainer-3r', asked(question, { configurations, include }))
    expect(results).toHaveLength(10_000)
    for (const i of [0, 1, 4999, 9998, 9999]) expect(results[i]).toEqual(await resultOf(question, 'trainer-3r', asked(question, { configurations: [configurations[i]], include })))
    const tooMany = await ask(question, 'trainer-3r', asked(question, { configurations: [...configurations, [0, 0, 0]] }))
    expectProblem(tooMany, 'invalid-request')
    expect(pointersOf(tooMany)).toEqual(['/configurations'])
  })

  it('points at every configuration of the wrong length', async () => {
    const response = await ask(question, 'trainer-3r', asked(question, { configurations: [[0, 0, 0], [0, 0], [0, 0, 0, 0], []] }))
    expectProblem(response, 'length-mismatch')
    expect(pointersOf(response)).toEqual(['/configurations/1', '/configurations/2', '/configurations/3'])
  })

  it('wants at least one configuration', async () => {
    expect(pointersOf(await ask(question, 'trainer-3r', asked(question, { configurations: [] })))).toEqual(['/configurations'])
    const { configurations: _none, ...without } = asked(question)
    expect(pointersOf(await ask(question, 'trainer-3r', without))).toEqual(['/configurations'])
  })

  it('warns of the findings that touch the chain, and of no others', async () => {
    const two = { configurations: [[0.1, 0.2]], ...(question === 'joint-rates' ? TWIST : {}) }
    expect((await answerTo(question, 'dunlin-2', two)).warnings).toMatchObject([{ rule: 'axis-normalised', element: "joint 'tilt'" }])
    expect(await answerTo(question, 'dunlin-2', { ...two, chain: { tip: 'cradle' }, configurations: [[0.1]] })).not.toHaveProperty('warnings')
    expect(await answerTo(question, 'trainer-3r', asked(question))).not.toHaveProperty('warnings')
  })

  it('does not compute across a floating joint, and does beside it', async () => {
    const { model } = await importModel(`Cart for ${question}`, floatingCart())
    const one = { configurations: [[0.1]], ...(question === 'joint-rates' ? TWIST : {}) }
    expectProblem(await ask(question, model.slug, { ...one, chain: { base: 'ground', tip: 'arm' } }), 'chain-not-computable')
    expect((await answerTo(question, model.slug, { ...one, chain: { base: 'platform', tip: 'arm' } })).chain.joints).toEqual(['lift'])
  })

  it('refuses a characteristic length that would leave nothing finite', async () => {
    for (const characteristicLength of [0, -1, 5e-324, 1e-10, 1.1e9]) {
      expect(pointersOf(await ask(question, 'trainer-3r', asked(question, { characteristicLength })))).toEqual(['/characteristicLength'])
    }
    for (const characteristicLength of [1e-9, 1e9]) expect((await answerTo(question, 'trainer-3r', asked(question, { characteristicLength }))).characteristicLength).toBe(characteristicLength)
  })

  it('takes the units one by one and no others', async () => {
    expect((await answerTo(question, 'trainer-3r', asked(question, { units: {} }))).units).toEqual({ length: 'm', angle: 'rad' })
    expect((await answerTo(question, 'trainer-3r', asked(question, { units: { length: 'mm' } }))).units).toEqual({ length: 'mm', angle: 'rad' })
    expect(pointersOf(await ask(question, 'trainer-3r', asked(question, { units: { length: 'in', angle: 'gon' } })))).toEqual(['/units/length', '/units/angle'])
  })
})

/** What other parts of the contract bring later: unknown until then, and never half done. */
const LATER: readonly (readonly [Question | 'inverse-kinematics', object, string])[] = [
  ['joint-rates', { inverse: { method: 'filtered', threshold: 0.02, damping: 0.05 } }, '/inverse/method'],
  ['joint-rates', { jointWeights: [1, 1, 1] }, '/jointWeights'],
  ['joint-rates', { limits: { rates: 'saturate' } }, '/limits/rates'],
  ['joint-rates', { limits: { accelerations: [1, 1, 1] } }, '/limits/accelerations'],
  ['joint-rates', { limits: { previousRates: [[0, 0, 0]] } }, '/limits/previousRates'],
  ['joint-rates', { limits: { dt: 0.01 } }, '/limits/dt'],
  ['joint-rates', { secondary: [{ objective: 'manipulability', gain: 1 }] }, '/secondary/0/objective'],
  ['joint-rates', { secondary: [{ objective: 'clearance', gain: 1 }] }, '/secondary/0/objective'],
  ['joint-rates', { secondary: [{ objective: 'expression', expression: 'q1', sense: 'minimise' }] }, '/secondary/0/objective'],
  ['joint-rates', { secondary: [{ objective: 'task', link: 'fore_link' }] }, '/secondary/0/objective'],
  ['null-space', { alignTo: [[1], [0], [0]] }, '/alignTo'],
  ['null-space', { jointWeights: [1, 1, 1] }, '/jointWeights'],
  ['jacobian', { seeds: [[0, 0, 0]] }, '/seeds'],
]

describe('what is not there yet', () => {
  it.each(LATER)('%s refuses %j at its place', async (question, more, pointer) => {
    const response = await ask(question, 'trainer-3r', asked(question as Question, more))
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })

  it('is an unknown path or format', async () => {
    expectProblem(await ask('inverse-kinematics', 'trainer-3r', {}), 'not-found')
    for (const question of QUESTIONS) {
      expectProblem(await ask(question, 'trainer-3r', asked(question), { accept: 'text/csv' }), 'not-acceptable')
      expectProblem(await ask(question, 'trainer-3r', asked(question), { accept: 'application/octet-stream' }), 'not-acceptable')
    }
  })
})

describe('lists beside the configurations', () => {
  const three = { configurations: [[0.3, 0.4, 0.5], [0.4, 0.5, 0.6], [0.5, 0.6, 0.7]], task: { components: ['vx', 'vy'] } }

  it('have one entry for each or one for all', async () => {
    const twist = (vx: number) => [vx, 0, 0, 0, 0, 0]
    const each = await resultsOf('joint-rates', 'trainer-3r', { ...three, twists: [twist(0.1), twist(0.2), twist(0.3)] })
    expectClose(each.map(({ achievedTwist }) => achievedTwist![0]!), [0.1, 0.2, 0.3], 1e-12)
    const all = await resultsOf('joint-rates', 'trainer-3r', { ...three, twists: [twist(0.1)] })
    expectClose(all.map(({ achievedTwist }) => achievedTwist![0]!), [0.1, 0.1, 0.1], 1e-12)
    const response = await ask('joint-rates', 'trainer-3r', { ...three, twists: [twist(0.1), twist(0.2)] })
    expectProblem(response, 'length-mismatch')
    expect(pointersOf(response)).toEqual(['/twists'])
    const pose = { position: [1, 1, 0], quaternion: [0, 0, 0, 1] }
    expect(pointersOf(await ask('joint-rates', 'trainer-3r', { ...three, references: [{ pose }, { pose }] }))).toEqual(['/references'])
  })

  it('are told of together when several have the wrong length', async () => {
    const response = await ask('joint-rates', 'trainer-3r', { ...three, configurations: [[1]], twists: [[0, 0, 0, 0, 0, 0], [0, 0, 0, 0, 0, 0]], secondary: [{ objective: 'posture', posture: [0], gain: 1 }] })
    expectProblem(response, 'length-mismatch')
    expect(pointersOf(response).sort()).toEqual(['/configurations/0', '/secondary/0/posture', '/twists'])
  })

  it('are twists or references, one of the two', async () => {
    const pose = { position: [1, 1, 0], quaternion: [0, 0, 0, 1] }
    for (const more of [{}, { twists: [[0, 0, 0, 0, 0, 0]], references: [{ pose }] }]) {
      const response = await ask('joint-rates', 'trainer-3r', { ...three, ...more })
      expectProblem(response, 'invalid-request')
      expect(response.body).toMatchObject({ detail: expect.stringContaining('exactly one of "twists" and "references"') })
    }
    expect(pointersOf(await ask('joint-rates', 'trainer-3r', { ...three, twists: [[0, 0, 0]] }))).toEqual(['/twists/0'])
  })
})

describe('a large batch', () => {
  it('leaves others their turn: health answers while it is computed', async () => {
    const configurations = Array.from({ length: 10_000 }, (_, i) => [0, -0.6, i / 20_000, 1.2, 0, 0.8, 0])
    let isFinished = false
    const batch = resultsOf('null-space', 'skerry-7', { configurations, include: ['rank'] }).finally(() => (isFinished = true))
    let answered = 0
    while (!isFinished) {
      const { ok } = await fetch(`${inject('served').url}/api/health/ready`)
      if (ok && !isFinished) answered++
    }
    expect(await batch).toHaveLength(10_000)
    // One or two come in before the computing begins.
    expect(answered).toBeGreaterThan(5)
  })
})
