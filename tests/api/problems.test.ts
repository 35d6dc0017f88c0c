import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { problemsOf } from '@/openapi/common-problems'
import { ALL_OPERATIONS } from './example-request'
import { expectProblem } from './expect-problem'
import { PROVOCATIONS } from './provocations'
import { send } from './send'

/** internal-error cannot be provoked from outside, which is the point of it; tests/lib/http/problem-response.test.ts has it. */
const fromOutside = (code: string) => code !== 'internal-error'

describe.each(ALL_OPERATIONS)('%s', (name, operation) => {
  it.each(problemsOf(name, operation).filter(fromOutside))('answers %s as it declares', async (code) => {
    const provoke = PROVOCATIONS[code]
    if (provoke === undefined) throw new Error(`no request that provokes ${code} is known to these tests`)
    const sent = await provoke(operation, name)
    const response = await send(sent)
    expectProblem(response, code)
    expect((response.body as { instance: string }).instance).toBe(`/api/v1${sent.path.replace(/\?.*/, '')}`)
    if (operation.pinned) expect(response.headers.link).toBe('</docs/cautions>; rel="help"')
  })
})

describe('a problem with more to say', () => {
  const answerTo = async (code: keyof typeof PROVOCATIONS, name: string) => {
    const [operationName, operation] = ALL_OPERATIONS.find(([other]) => other === name)!
    return send(await PROVOCATIONS[code]!(operation, operationName))
  }

  it('lists the findings of a refused import', async () => {
    const { body } = await answerTo('import-refused', 'createModel')
    expect(body).toMatchObject({ findings: [{ rule: expect.any(String), severity: 'error', line: expect.any(Number), column: expect.any(Number), remedy: expect.any(String) }] })
  })

  it('names the twin of a revision that is already there', async () => {
    expect((await answerTo('same-content', 'createRevision')).body).toMatchObject({ twin: 1 })
  })

  it('shows the fingerprint that is there instead of the one insisted on', async () => {
    const response = await answerTo('fingerprint-mismatch', 'jacobian')
    expect(response.headers['model-fingerprint']).toMatch(/^[0-9a-f]{64}$/)
  })

  it('points at each list of the wrong length', async () => {
    expect((await answerTo('length-mismatch', 'jointRates')).body).toMatchObject({ errors: [{ pointer: '/configurations/0', detail: 'has 6 entries; the chain has 7' }] })
  })

  it('points at the link that is not determined', async () => {
    expect((await answerTo('link-not-determined', 'forwardKinematics')).body).toMatchObject({ errors: [{ pointer: '/links/1' }] })
  })

  it('says how much would be accepted when the answer would be too large', async () => {
    expect((await answerTo('answer-too-large', 'nullSpace')).body).toMatchObject({ detail: expect.stringMatching(/at most \d+ configurations at once/) })
    expect((await answerTo('answer-too-large', 'inverseKinematics')).body).toMatchObject({ detail: expect.stringMatching(/at most \d+ targets at once/) })
  })
})

describe('the generated document', () => {
  it('lists the same problems at each operation', () => {
    const file = readFileSync(path.resolve(import.meta.dirname, '../../openapi/openapi.json'), 'utf8')
    const { paths } = JSON.parse(file) as { paths: Record<string, Record<string, { responses: Record<string, { description: string }> }>> }
    for (const [name, operation] of ALL_OPERATIONS) {
      const { responses } = paths[operation.path]![operation.method.toLowerCase()]!
      const listed = Object.values(responses).flatMap(({ description }) => [...description.matchAll(/`([a-z-]+)`/g)].map(([, code]) => code))
      expect(listed.sort(), name).toEqual([...problemsOf(name, operation)].sort())
    }
  })
})
