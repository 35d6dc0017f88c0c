import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import { OPERATIONS } from '@/lib/contract/operations'
import type { Operation } from '@/lib/contract/operation'
import { Problem } from '@/lib/errors'
import { parsePart } from '@/lib/http/faults'
import { parseBodyInSteps } from '@/lib/http/parse-body'

function parse(schema: z.ZodObject, body: unknown): { data: unknown; pauses: number } {
  const steps = parseBodyInSteps(schema, body)
  for (let pauses = 0; ; pauses++) {
    const step = steps.next()
    if (step.done === true) return { data: step.value, pauses }
  }
}

/** What was parsed, or the faults by their places. */
function verdict(run: () => unknown): unknown {
  try {
    return run()
  } catch (error) {
    if (error instanceof Problem) return (error.more.errors ?? []).map(({ pointer, detail }) => `${pointer} ${detail}`).sort()
    throw error
  }
}

const withBody = Object.entries(OPERATIONS as Record<string, Operation>).flatMap(([name, { body, example }]) => (body === undefined ? [] : [{ name, body, example }]))
const { body: JointRates } = KINEMATIC_OPERATIONS.jointRates
const pose = { position: [0, 0, 0], quaternion: [0, 0, 0, 1] }
const wish = { twists: [[0, 0, 0, 0, 0, 0]] }

describe('parseBodyInSteps', () => {
  it.each(withBody)('parses the example of $name as its schema does', ({ body, example }) => {
    expect(parse(body, example).data).toEqual(body.parse(example))
  })

  it.each([
    [{}],
    [null],
    [[]],
    ['text'],
    [{ configurations: 'text', ...wish }],
    [{ configurations: [], ...wish }],
    [{ configurations: [[1, 'a'], null, [1e400]], ...wish, speed: 1 }],
    [{ configurations: [[0]], references: [{ pose }, { pose: { ...pose, quaternion: [0, 0, 0, 2] }, colour: 'red' }] }],
    [{ configurations: [[0]] }],
    [{ configurations: [[0]], ...wish, references: [{ pose }] }],
    [{ configurations: [[0]], ...wish, limits: { accelerations: [1], previousRates: [[0], ['a']], dt: 0 } }],
    [{ configurations: [[0]], ...wish, limits: { previousRates: [[0]] } }],
    [{ configurations: [[0]], ...wish, limits: { accelerations: [1, null, -1], previousRates: [[0]], dt: 1 } }],
    [{ configurations: [[0]], ...wish, limits: 3 }],
    [{ configurations: [[0]], ...wish, secondary: [{ objective: 'posture', posture: [0], gain: -1 }, { objective: 'rest' }] }],
    [{ configurations: [[0]], ...wish, jointWeights: [1, 0] }],
    [JSON.parse('{"configurations":[[0]],"twists":[[0,0,0,0,0,0]],"__proto__":{"x":1}}') as object],
    [{ configurations: new Array(10_001).fill([0]), ...wish }],
  ])('finds in case %# what the schema finds in one piece', (body) => {
    expect(verdict(() => parse(JointRates, body).data)).toEqual(verdict(() => parsePart(JointRates, body, '')))
  })

  it('pauses after each entry of a long list', () => {
    expect(parse(JointRates, { configurations: new Array(5000).fill([0, 1, 2]), ...wish }).pauses).toBeGreaterThan(5000)
    expect(parse(JointRates, { configurations: [[0]], ...wish, limits: { accelerations: [1], dt: 1, previousRates: new Array(3000).fill([0]) } }).pauses).toBeGreaterThan(3000)
  })

  it('tells of fifty faults at the most, and stops looking there', () => {
    const many = verdict(() => parse(JointRates, { configurations: new Array(9000).fill(['a']), ...wish }).data)
    expect(many).toHaveLength(50)
  })

  it('keeps what a schema makes of an entry', () => {
    const schema = z.strictObject({ rows: z.array(z.strictObject({ name: z.string().trim() })).max(3) })
    expect(parse(schema, { rows: [{ name: ' a ' }] }).data).toEqual({ rows: [{ name: 'a' }] })
  })
})
