import { describe, expect, it } from 'vitest'
import { QUESTIONS, type Question } from './ask'
import { askRecords, atPath, BINARY_TYPE, bytesOf, CSV_TYPE, JSON_TYPE, numbersOf, readLayout, readRecords } from './records'

/** Bent; stretched out, where directions are lost; beyond its limits. */
const CONFIGURATIONS = [[0, -0.6, 0, 1.2, 0, 0.8, 0], [0, 0, 0, 0, 0, 0, 0], [9, -0.6, 0, -9, 0, 0.8, 0.123456789012345]]
const TWISTS = [[0.5, 0.1, 0.2, 0, 0.3, 0], [0, 0, 0.1, 0, 0, 0], [-0.1, 0, 0, 0, 0, 1e-17]]
const QUATERNION = [0, 0.7071067811865476, 0, 0.7071067811865476]
const POSES = [[0.35, 0.05, 0.6], [9, 0, 0], [0.3, 0, 0.7]].map((position) => ({ position, quaternion: QUATERNION }))
const GAINS = { position: 2, orientation: 0.5 }
const MIXED = { units: { length: 'mm', angle: 'deg' } }

interface Case {
  readonly question: Question
  readonly what: string
  /** What stands beside the records. */
  readonly beside: object
  /** The numbers of each record. */
  readonly records: readonly (readonly number[])[]
  /** The same in JSON. */
  readonly json: object
}

const BY_CONFIGURATION = { records: CONFIGURATIONS, json: { configurations: CONFIGURATIONS } }
const CASES: readonly Case[] = [
  { question: 'forward-kinematics', what: 'poses', beside: {}, ...BY_CONFIGURATION },
  { question: 'forward-kinematics', what: 'links and matrices', beside: { links: ['link_3', 'link_1'], matrices: true, ...MIXED }, ...BY_CONFIGURATION },
  { question: 'jacobian', what: 'matrices and measures', beside: { frame: 'tip', ...MIXED }, ...BY_CONFIGURATION },
  { question: 'jacobian', what: 'a task', beside: { task: { components: ['vx', 'wz'] }, characteristicLength: 0.3 }, ...BY_CONFIGURATION },
  { question: 'null-space', what: 'everything', beside: { include: ['rank', 'nullity', 'singularValues', 'basis', 'lostDirections', 'projector'] }, ...BY_CONFIGURATION },
  {
    question: 'joint-rates', what: 'twists', beside: { secondary: [{ objective: 'mid-range', gain: 9 }] }, records: CONFIGURATIONS.map((q, i) => [...q, ...TWISTS[i]!]),
    json: { configurations: CONFIGURATIONS, twists: TWISTS },
  },
  {
    question: 'joint-rates', what: 'poses with gains', beside: { record: 'pose', limits: { rates: 'saturate' } }, records: CONFIGURATIONS.map((q, i) => [...q, ...POSES[i]!.position, ...QUATERNION]),
    json: { configurations: CONFIGURATIONS, references: POSES.map((pose) => ({ pose })) },
  },
  {
    question: 'joint-rates', what: 'poses and twists', beside: { record: 'pose-and-twist', ...MIXED },
    records: CONFIGURATIONS.map((q, i) => [...q, ...POSES[i]!.position, ...QUATERNION, ...TWISTS[i]!]),
    json: { configurations: CONFIGURATIONS, references: POSES.map((pose, i) => ({ pose, twist: TWISTS[i] })) },
  },
  {
    question: 'inverse-kinematics', what: 'targets and seeds', beside: { attempts: 2 }, records: POSES.map(({ position }, i) => [...position, ...QUATERNION, ...CONFIGURATIONS[i]!]),
    json: { targets: POSES, seeds: CONFIGURATIONS },
  },
  { question: 'inverse-kinematics', what: 'targets', beside: { attempts: 1, record: 'target' }, records: POSES.map(({ position }) => [...position, ...QUATERNION]), json: { targets: POSES } },
]

const withoutRecord = ({ record: _record, ...rest }: Record<string, unknown>) => rest
const asJson = ({ beside, json }: Case) => ({ ...withoutRecord(beside as Record<string, unknown>), ...json })

/** The bits of a binary64, so that the sign of zero counts. */
const bits = (value: number) => Buffer.from(bytesOf([value])).toString('hex')

/** What the columns of text and of lists by joint should hold, worked out from the JSON result by the page /docs/formats. */
const TRANSLATED: Readonly<Record<string, (result: Record<string, unknown>, joints: readonly string[], words: readonly string[]) => number[]>> = {
  code: ({ reason }, _joints, words) => [reason === undefined ? 0 : words.indexOf(reason as string) + 1],
  bits: ({ diagnosis }, _joints, words) => [[...new Set((diagnosis as { code: string }[]).map(({ code }) => 2 ** words.indexOf(code)))].reduce((sum, bit) => sum + bit, 0)],
  flags: ({ saturated }, joints) => joints.map((joint) => ((saturated as string[]).includes(joint) ? 1 : 0)),
  sides: ({ violations }, joints) =>
    joints.map((joint) => {
      const found = (violations as { joint: string; value: number; upper: number }[]).find((one) => one.joint === joint)
      return found === undefined ? 0 : found.value > found.upper ? 1 : -1
    }),
}

/** A matrix or list, filled up with nothing to the size that the layout gives it. */
function spread(value: unknown, sizes: readonly number[]): unknown[] {
  const [length, ...rest] = sizes
  if (length === undefined) return [value]
  return Array.from({ length }, (_, i) => spread(Array.isArray(value) ? value[i] : undefined, rest)).flat()
}

describe.each(CASES)('$question, $what', (asked) => {
  it('answers in binary to the bit what it answers in JSON', async () => {
    const inJson = await askRecords({ question: asked.question, json: asJson(asked) })
    const { results, chain } = inJson.json() as { results: Record<string, unknown>[]; chain: { joints: string[] } }
    const inBinary = await askRecords({ question: asked.question, json: asJson(asked), accept: BINARY_TYPE })
    expect([inBinary.status, inBinary.headers.get('content-type')]).toEqual([200, BINARY_TYPE])
    const layout = readLayout(inBinary.headers.get('record-layout')!)
    const records = readRecords(inBinary)
    expect(records).toHaveLength(results.length)
    for (const [i, record] of records.entries()) {
      for (const { path, parameters } of layout) {
        const kind = Object.keys(parameters).find((name) => name in TRANSLATED)
        const sizes = ['length', 'planes', 'rows', 'columns'].flatMap((name) => (name in parameters ? [Number(parameters[name])] : []))
        const values = kind === undefined ? spread(atPath(results[i], path), sizes) : TRANSLATED[kind]!(results[i]!, chain.joints, parameters[kind]!.split(' '))
        const expected = values.map((value) => (typeof value === 'number' ? value : typeof value === 'boolean' ? Number(value) : Number.NaN))
        expect(record.get(path)!.map(bits), `${path} of result ${i}`).toEqual(expected.map(bits))
      }
    }
    // Every field of the JSON result has its column, but lists that can have no entry.
    for (const field of Object.keys(results[0]!)) {
      const isEmpty = Array.isArray(results[0]![field]) && /SingularValues$/.test(field) && (results[0]![field] as unknown[]).length === 0
      expect(layout.some(({ path }) => path.split('.')[0] === field), field).toBe(!isEmpty)
    }
  })

  it('takes binary records for what it takes in JSON, and answers in every format alike', async () => {
    const records = asked.records.flat()
    for (const accept of [JSON_TYPE, CSV_TYPE, BINARY_TYPE]) {
      const byJson = await askRecords({ question: asked.question, json: asJson(asked), accept })
      const byRecords = await askRecords({ question: asked.question, records, beside: asked.beside, accept })
      expect(byRecords.status, byRecords.text.slice(0, 300)).toBe(200)
      expect(byRecords.headers.get('content-type')).toBe(byJson.headers.get('content-type'))
      expect(Buffer.from(byRecords.bytes).equals(Buffer.from(byJson.bytes)), accept).toBe(true)
    }
  })
})

describe('the layout of binary records', () => {
  const layoutOf = async (json: object, question: Question = 'null-space') => (await askRecords({ question, json, accept: BINARY_TYPE })).headers.get('record-layout')

  it('depends on the question and the chain, and never on what the results hold', async () => {
    const [bent, stretched] = await Promise.all([layoutOf({ configurations: [CONFIGURATIONS[0]] }), layoutOf({ configurations: [CONFIGURATIONS[1]] })])
    expect(bent).toBe(stretched)
    expect(bent).toMatch(/^rank, nullity, singularValues;length=6, basis;rows=7;columns=7, lostDirections\.\*\.direction;rows=6;columns=6, lostDirections\.\*\.structural;length=6$/)
  })

  it('has room for as many singular values as the task can have', async () => {
    expect(await layoutOf({ configurations: [CONFIGURATIONS[0]], include: ['singularValues', 'translationalSingularValues', 'rotationalSingularValues'], task: { components: ['vx', 'wy'] } }, 'jacobian')).toBe(
      'singularValues;length=2, translationalSingularValues;length=1, rotationalSingularValues;length=1',
    )
  })

  it('says what the numbers in place of words mean', async () => {
    expect(await layoutOf({ configurations: [CONFIGURATIONS[0]], twists: [TWISTS[0]], include: ['saturated', 'diagnosis'] }, 'joint-rates')).toBe(
      'saturated;length=7;flags, diagnosis;bits="direction-lost near-singular rate-limited secondary-starved at-limit outside-limits gain-too-high"',
    )
    expect(await layoutOf({ targets: [POSES[0]], include: ['reason'] }, 'inverse-kinematics')).toBe('reason;code="unreachable at-limits stalled"')
  })

  it('does not stand in other replies', async () => {
    for (const accept of [JSON_TYPE, CSV_TYPE]) expect((await askRecords({ question: 'jacobian', json: { configurations: CONFIGURATIONS }, accept })).headers.get('record-layout')).toBeNull()
  })
})

describe('many records', () => {
  it('are a hundred thousand at once, in their order', async () => {
    const count = 100_000
    const numbers = Array.from({ length: count }, (_, i) => [i / count, 0.4, 0.5]).flat()
    const answer = await askRecords({ question: 'forward-kinematics', model: 'trainer-3r', records: numbers, beside: { include: ['pose'] }, accept: BINARY_TYPE })
    expect([answer.status, answer.bytes.byteLength]).toEqual([200, count * 7 * 8])
    const poses = numbersOf(answer.bytes)
    for (const i of [0, 1, 49_999, 99_999]) {
      const { results } = (await askRecords({ question: 'forward-kinematics', model: 'trainer-3r', json: { configurations: [[i / count, 0.4, 0.5]] } })).json() as { results: { pose: { position: number[]; quaternion: number[] } }[] }
      expect(poses.slice(7 * i, 7 * i + 7)).toEqual([...results[0]!.pose.position, ...results[0]!.pose.quaternion])
    }
  })

  it('are taken by every question', async () => {
    for (const question of QUESTIONS) {
      const { records, beside } = CASES.find((one) => one.question === question)!
      expect((await askRecords({ question, records: records.flat(), beside, accept: BINARY_TYPE })).status, question).toBe(200)
    }
  })
})

describe('gains beside records of poses', () => {
  it('count for every reference', async () => {
    const records = CONFIGURATIONS.flatMap((q, i) => [...q, ...POSES[i]!.position, ...QUATERNION])
    const references = POSES.map((pose) => ({ pose, gains: GAINS }))
    const byRecords = await askRecords({ question: 'joint-rates', records, beside: { record: 'pose', gains: GAINS } })
    expect(byRecords.json()).toEqual((await askRecords({ question: 'joint-rates', json: { configurations: CONFIGURATIONS, references } })).json())
  })
})
