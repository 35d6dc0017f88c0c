import { describe, expect, it } from 'vitest'
import { importModel } from '../import-model'
import { snake } from '../urdf'
import { QUESTIONS, type Question } from './ask'
import { askRecords, BINARY_TYPE, bytesOf, CSV_TYPE, problemOf } from './records'

const REST = [0, -0.6, 0, 1.2, 0, 0.8, 0]
const TWIST = [0.1, 0, 0, 0, 0, 0]
const TARGET = [0.35, 0.05, 0.6, 0, 0.7071067811865476, 0, 0.7071067811865476]
const RECORD: Readonly<Record<Question, readonly number[]>> = {
  'forward-kinematics': REST,
  jacobian: REST,
  'null-space': REST,
  'joint-rates': [...REST, ...TWIST],
  'inverse-kinematics': [...TARGET, ...REST],
}

describe.each(QUESTIONS)('binary records of %s', (question) => {
  const record = RECORD[question]

  it('are refused where the bytes are no whole number of them, with how long one is and how much came', async () => {
    for (const bytes of [bytesOf(record).subarray(1), bytesOf([...record, ...record, 1]), new Uint8Array(3)]) {
      const problem = problemOf(await askRecords({ question, records: bytes }))
      expect(problem).toMatchObject({ status: 400, code: 'malformed-body', media: 'application/problem+json' })
      expect(problem.detail).toContain(`a record has ${8 * record.length} bytes here`)
      expect(problem.detail).toContain(`and ${bytes.length} came`)
    }
  })

  it('are refused where there is none, or more than a hundred thousand', async () => {
    expect(problemOf(await askRecords({ question, records: new Uint8Array() }))).toMatchObject({ status: 422, code: 'invalid-request', pointers: [''] })
    // The trainer has four joints less.
    const many = problemOf(await askRecords({ question, model: 'trainer-3r', records: new Uint8Array(8 * (record.length - 4) * 100_001) }))
    expect(many).toMatchObject({ status: 422, code: 'invalid-request', pointers: [''] })
    expect(many.detail).toContain('at most 100000')
  })

  it('are refused where a number is none, at the place that it has in the JSON question', async () => {
    for (const [value, word] of [[Number.NaN, 'NaN'], [Number.POSITIVE_INFINITY, 'infinity'], [Number.NEGATIVE_INFINITY, 'infinity']] as const) {
      const problem = problemOf(await askRecords({ question, records: [...record, ...record.slice(0, -1), value] }))
      const place = { 'joint-rates': '/twists/1/5', 'inverse-kinematics': '/seeds/1/6' }[question as string] ?? '/configurations/1/6'
      expect(problem).toMatchObject({ status: 422, code: 'invalid-request', pointers: [place] })
      expect(problem.detail).toContain(`not ${word}`)
    }
  })

  it('are refused beyond 1e9 in SI as in JSON', async () => {
    expect(problemOf(await askRecords({ question, records: [1.1e9, ...record.slice(1)] })).pointers).toEqual([question === 'inverse-kinematics' ? '/targets/0/position/0' : '/configurations/0/0'])
  })

  it('are refused with an unknown field beside them, or one that the records hold', async () => {
    expect(problemOf(await askRecords({ question, records: record, beside: { speed: 1, units: { colour: 'red' } } }))).toMatchObject({ code: 'invalid-request', pointers: expect.arrayContaining(['/speed', '/units/colour']) })
    const held = question === 'inverse-kinematics' ? { targets: [] } : { configurations: [REST] }
    expect(problemOf(await askRecords({ question, records: record, beside: held })).pointers).toEqual([`/${Object.keys(held)[0]!}`])
    expect(problemOf(await askRecords({ question, records: record, beside: { record: 'row' } })).pointers).toEqual(['/record'])
  })

  it('are refused with a question that is too long, no JSON, or in the wrong place', async () => {
    const long = (bytes: number) => `{"characteristicLength":1.${'0'.repeat(bytes - 27)}}`
    expect((await askRecords({ question, records: record, beside: long(8192) })).status).toBe(200)
    expect(problemOf(await askRecords({ question, records: record, beside: long(8193) }))).toMatchObject({ status: 422, pointers: ['/query/question'] })
    expect(problemOf(await askRecords({ question, records: record, beside: '{"units":' }))).toMatchObject({ status: 400, code: 'malformed-body' })
    expect(problemOf(await askRecords({ question, json: { configurations: [REST] }, beside: {} })).pointers).toEqual(['/query/question'])
    expect(problemOf(await askRecords({ question, records: record, beside: '[]' })).status).toBe(422)
  })

  it('are answered for the model insisted on only, before their length is looked at', async () => {
    const headers = { 'if-match': `"${'0'.repeat(64)}"` }
    expect(problemOf(await askRecords({ question, records: new Uint8Array(3), headers })).code).toBe('fingerprint-mismatch')
  })

  it('leave a problem a problem, whatever is accepted', async () => {
    for (const accept of [CSV_TYPE, BINARY_TYPE]) {
      const answer = await askRecords({ question, json: { speed: 1 }, accept })
      expect([answer.status, answer.headers.get('content-type')]).toEqual([422, 'application/problem+json'])
    }
  })

  it('are read from no other type, and answered in none that is not accepted', async () => {
    const headers = { 'content-type': 'text/csv' }
    expect(problemOf(await askRecords({ question, records: record, headers }))).toMatchObject({ status: 415, code: 'unsupported-media-type' })
    for (const accept of ['text/csv;q=0, application/json;q=0, application/octet-stream;q=0', 'image/png', 'text/html, application/xml']) {
      const problem = problemOf(await askRecords({ question, records: record, accept }))
      expect(problem).toMatchObject({ status: 406, code: 'not-acceptable' })
      expect(problem.detail).toContain('application/json or text/csv or application/octet-stream')
    }
  })
})

describe('what a record holds', () => {
  it('is told where the bytes do not fit', async () => {
    const problem = problemOf(await askRecords({ question: 'joint-rates', records: [...REST, ...TARGET], beside: { record: 'pose-and-twist' } }))
    expect(problem.detail).toContain('160 bytes here (20 numbers of 8: configuration 7, position 3, quaternion 4, twist 6), and 112 came')
  })

  it('is a quaternion of norm 1, pointed at where it is none', async () => {
    expect(problemOf(await askRecords({ question: 'joint-rates', records: [...REST, 0, 0, 0, 0, 0, 0, 1.01], beside: { record: 'pose' } })).pointers).toEqual(['/references/0/pose/quaternion'])
    expect(problemOf(await askRecords({ question: 'inverse-kinematics', records: [0, 0, 0, 0, 0, 0, 0.9], beside: { record: 'target' } })).pointers).toEqual(['/targets/0/quaternion'])
  })

  it('has no gains without a pose, and no seeds beside seeds', async () => {
    expect(problemOf(await askRecords({ question: 'joint-rates', records: RECORD['joint-rates'], beside: { gains: { position: 1 } } })).pointers).toEqual(['/gains'])
    expect(problemOf(await askRecords({ question: 'inverse-kinematics', records: RECORD['inverse-kinematics'], beside: { seeds: [REST] } })).pointers).toEqual(['/seeds'])
    expect((await askRecords({ question: 'inverse-kinematics', records: TARGET, beside: { record: 'target', seeds: [REST] } })).status).toBe(200)
  })

  it('still needs a period for acceleration limits', async () => {
    expect(problemOf(await askRecords({ question: 'joint-rates', records: RECORD['joint-rates'], beside: { limits: { accelerations: new Array(7).fill(1) } } })).pointers).toEqual(['/limits/dt'])
  })
})

describe('the size of a reply', () => {
  it('is counted by its format before anything is computed', async () => {
    const { model } = await importModel('Long arm for records', snake(60))
    const ask = (accept: string, count: number) => askRecords({ question: 'null-space', model: model.slug, records: new Uint8Array(8 * 60 * count), beside: { include: ['basis'] }, accept })
    // A basis of 60 x 60 numbers: 28 800 bytes in binary, up to 90 000 in text.
    for (const accept of ['application/json', CSV_TYPE]) expect(problemOf(await ask(accept, 1000))).toMatchObject({ status: 413, code: 'answer-too-large' })
    expect((await ask(BINARY_TYPE, 1000)).bytes.byteLength).toBe(28_800_000)
    const tooLarge = problemOf(await ask(BINARY_TYPE, 2331))
    expect(tooLarge).toMatchObject({ status: 413, code: 'answer-too-large' })
    expect(tooLarge.detail).toContain('at most 2330 configurations at once')
  })

  it('of a request is bounded while it is read', async () => {
    const problem = problemOf(await askRecords({ question: 'jacobian', records: new Uint8Array(64 * 1024 * 1024 + 8) }))
    expect(problem).toMatchObject({ status: 413, code: 'too-large' })
  })
})
