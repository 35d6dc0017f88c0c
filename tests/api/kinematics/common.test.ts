import { describe, expect, inject, it } from 'vitest'
import type { ModelReference } from '@/lib/contract/kinematic-answers'
import { FORWARD_KINEMATICS_FIELDS, INVERSE_KINEMATICS_FIELDS, JACOBIAN_FIELDS, JOINT_RATES_FIELDS, NULL_SPACE_FIELDS } from '@/lib/contract/kinematic-questions'
import { expectProblem, pointersOf } from '../expect-problem'
import { importModel } from '../import-model'
import { get } from '../send'
import { asPerson } from '../support/callers'
import { floatingCart } from '../urdf'
import { ABOUT_CONFIGURATIONS, ask, answerTo, QUESTIONS, resultOf, resultsOf, type Question } from './ask'
import { expectClose } from './close'

const TWIST = { twists: [[0.1, 0, 0, 0, 0, 0]] }
const FAR = { position: [9, 0, 0], quaternion: [0, 0, 0, 1] }

/** The least that can be asked, of an arm at `configuration` or from there. */
function asked(question: Question, more: object = {}, configuration: readonly number[] = [0.3, 0.4, 0.5]): object {
  if (question === 'inverse-kinematics') return { targets: [FAR], seeds: [configuration], attempts: 1, ...more }
  return { configurations: [configuration], ...(question === 'joint-rates' ? TWIST : {}), ...more }
}

const FIELDS: Readonly<Record<Question, readonly string[]>> = {
  'forward-kinematics': FORWARD_KINEMATICS_FIELDS,
  jacobian: JACOBIAN_FIELDS,
  'null-space': NULL_SPACE_FIELDS,
  'joint-rates': JOINT_RATES_FIELDS,
  'inverse-kinematics': INVERSE_KINEMATICS_FIELDS,
}

describe.each(QUESTIONS)('%s', (question) => {
  it('names the model that it was computed from, whatever its status', async () => {
    const places = { 'skerry-7/1': 'superseded', 'skerry-7/2': 'released', 'fulmar-6/1': 'in-review', 'skerry-7-rail/1': 'draft' } as const
    for (const [place, status] of Object.entries(places)) {
      const [model, revision] = place.split('/') as [string, string]
      const { body } = await get(`/teams/tarnholm/models/${model}/revisions/${revision}`, await asPerson('kofi'))
      const { fingerprint, counts } = body as { fingerprint: string; counts: { independent: number } }
      const response = await ask(question, place, asked(question, {}, new Array<number>(counts.independent).fill(0.1)))
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

  it('warns of the findings that touch the chain, and of no others', async () => {
    expect((await answerTo(question, 'dunlin-2', asked(question, {}, [0.1, 0.2]))).warnings).toMatchObject([{ rule: 'axis-normalised', element: "joint 'tilt'" }])
    expect(await answerTo(question, 'dunlin-2', asked(question, { chain: { tip: 'cradle' } }, [0.1]))).not.toHaveProperty('warnings')
    expect(await answerTo(question, 'trainer-3r', asked(question))).not.toHaveProperty('warnings')
  })

  it('does not compute across a floating joint, and does beside it', async () => {
    const { model } = await importModel(`Cart for ${question}`, floatingCart())
    expectProblem(await ask(question, model.slug, asked(question, { chain: { base: 'ground', tip: 'arm' } }, [0.1])), 'chain-not-computable')
    expect((await answerTo(question, model.slug, asked(question, { chain: { base: 'platform', tip: 'arm' } }, [0.1]))).chain.joints).toEqual(['lift'])
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

describe.each(ABOUT_CONFIGURATIONS)('%s', (question) => {
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
    expect(pointersOf(await ask(question, 'trainer-3r', asked(question, { configurations: undefined })))).toEqual(['/configurations'])
  })
})

/** What other parts of the contract bring later: unknown until then, and never half done. */
const LATER = [
  ['clearance', { obstacles: [{ shape: 'sphere', centre: [1, 0, 0], radius: 0.2 }], linkRadius: 0.05, influence: 0.3, gain: 1 }],
  ['expression', { expression: 'q1', sense: 'minimise', gain: 1 }],
  ['task', { link: 'fore_link', task: { components: ['vx'] }, twist: [0, 0, 0, 0, 0, 0] }],
] as const

describe('what is not there yet', () => {
  it.each(LATER)('is the objective %s: unknown at its place', async (objective, more) => {
    for (const question of ['joint-rates', 'inverse-kinematics'] as const) {
      const response = await ask(question, 'trainer-3r', asked(question, { secondary: [{ objective: 'mid-range', gain: 1 }, { objective, ...more }] }))
      expectProblem(response, 'invalid-request')
      expect(pointersOf(response)).toEqual(['/secondary/1/objective'])
    }
  })
})

/** Fields that are right by themselves, or nearly, and wrong where they stand. */
const MISFITS: readonly (readonly [Question, object, 'invalid-request' | 'length-mismatch', readonly string[]])[] = [
  ['forward-kinematics', { task: { components: ['vx'] } }, 'invalid-request', ['/task']],
  ['jacobian', { alignTo: [[1], [0], [0]] }, 'invalid-request', ['/alignTo']],
  ['null-space', { jointWeights: [1, 1, 1] }, 'invalid-request', ['/jointWeights']],
  ['joint-rates', { seeds: [[0, 0, 0]] }, 'invalid-request', ['/seeds']],
  ['inverse-kinematics', { configurations: [[0, 0, 0]] }, 'invalid-request', ['/configurations']],
  ['inverse-kinematics', { limits: { rates: 'scale' } }, 'invalid-request', ['/limits']],
  ['joint-rates', { inverse: { method: 'filtered' } }, 'invalid-request', ['/inverse/threshold', '/inverse/damping']],
  ['joint-rates', { inverse: { method: 'filtered', threshold: 0, damping: -1 } }, 'invalid-request', ['/inverse/threshold', '/inverse/damping']],
  ['joint-rates', { inverse: { method: 'filtered', threshold: 1e10, damping: 2e9 } }, 'invalid-request', ['/inverse/threshold', '/inverse/damping']],
  ['joint-rates', { jointWeights: [0, 1, -1] }, 'invalid-request', ['/jointWeights/0', '/jointWeights/2']],
  ['joint-rates', { jointWeights: [1e13, 1, 9e-13] }, 'invalid-request', ['/jointWeights/0', '/jointWeights/2']],
  ['joint-rates', { jointWeights: [1e-7, 1, 1e6] }, 'invalid-request', ['/jointWeights']],
  ['joint-rates', { jointWeights: [1, 1] }, 'length-mismatch', ['/jointWeights']],
  ['joint-rates', { secondary: [{ objective: 'manipulability' }] }, 'invalid-request', ['/secondary/0/gain']],
  ['joint-rates', { secondary: [{ objective: 'manipulability', gain: 1, posture: [0, 0, 0] }] }, 'invalid-request', ['/secondary/0/posture']],
  ['joint-rates', { limits: { rates: 'clip' } }, 'invalid-request', ['/limits/rates']],
  ['joint-rates', { limits: { accelerations: [1, 1, 1] } }, 'invalid-request', ['/limits/dt']],
  ['joint-rates', { limits: { previousRates: [[0, 0, 0]], dt: 0.01 } }, 'invalid-request', ['/limits/accelerations']],
  ['joint-rates', { limits: { previousRates: [[0, 0, 0]] } }, 'invalid-request', ['/limits/accelerations']],
  ['joint-rates', { limits: { dt: 0 } }, 'invalid-request', ['/limits/dt']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, 0, -1] } }, 'invalid-request', ['/limits/accelerations/1', '/limits/accelerations/2']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, null, 2e9] } }, 'invalid-request', ['/limits/accelerations/2']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, null] } }, 'length-mismatch', ['/limits/accelerations']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, 1, 1], previousRates: [[0, 0, 0], [0, 0, 0]] } }, 'length-mismatch', ['/limits/previousRates']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, 1, 1], previousRates: [[0, 0]] } }, 'length-mismatch', ['/limits/previousRates/0']],
  ['joint-rates', { limits: { dt: 0.01, accelerations: [1, 1, 1], previousRates: [] } }, 'invalid-request', ['/limits/previousRates']],
]

describe('what does not fit', () => {
  it.each(MISFITS)('%s refuses %j (%s)', async (question, more, code, pointers) => {
    const response = await ask(question, 'trainer-3r', asked(question, more))
    expectProblem(response, code)
    expect(pointersOf(response)).toEqual(pointers)
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
