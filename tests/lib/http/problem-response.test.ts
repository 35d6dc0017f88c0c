import { beforeEach, describe, expect, it, vi } from 'vitest'
import { fail, PROBLEMS, type ProblemCode } from '@/lib/errors'
import { problemResponse } from '@/lib/http/problem-response'
import { log } from '@/lib/log'

vi.mock('@/lib/log', () => ({ log: { error: vi.fn() } }))
beforeEach(() => vi.mocked(log.error).mockClear())

const MARK = { id: 'r-1', path: '/api/v1/teams/tarnholm/models' }

async function answerTo(error: unknown) {
  const response = problemResponse(error, MARK)
  return { response, text: await response.clone().text(), body: (await response.json()) as Record<string, unknown> }
}

function thrownBy(act: () => never): unknown {
  try {
    return act()
  } catch (error) {
    return error
  }
}

describe('problemResponse', () => {
  it.each([
    new Error('select * from keys where secret = 1'),
    new TypeError('Cannot read properties of undefined', { cause: new Error('connect ECONNREFUSED 10.0.0.1:5432') }),
    'a thrown text with a password',
    undefined,
    { code: '23505', detail: 'Key (slug)=(x) already exists.' },
  ])('tells nothing of a fault of its own: %s', async (error) => {
    const { response, body } = await answerTo(error)
    expect(response.status).toBe(500)
    expect(body).toEqual({
      type: '/docs/problems/internal-error',
      title: PROBLEMS['internal-error'].title,
      status: 500,
      detail: PROBLEMS['internal-error'].meaning,
      instance: MARK.path,
      requestId: MARK.id,
    })
    expect(response.headers.get('x-request-id')).toBe(MARK.id)
    expect(log.error).toHaveBeenCalledWith(expect.objectContaining({ requestId: MARK.id, error: expect.any(String) }), 'internal error')
  })

  it.each(Object.keys(PROBLEMS) as ProblemCode[])('answers %s with its own row of the table', async (code) => {
    const { response, body } = await answerTo(thrownBy(() => fail(code)))
    expect(response.status).toBe(PROBLEMS[code].status)
    expect(body).toMatchObject({ type: `/docs/problems/${code}`, title: PROBLEMS[code].title, detail: PROBLEMS[code].meaning })
    expect(response.headers.get('content-type')).toBe('application/problem+json')
    expect(response.headers.has('www-authenticate')).toBe(response.status === 401)
    expect(log.error).not.toHaveBeenCalled()
  })

  it('carries faults, further members and fields of the answer', async () => {
    const errors = [{ pointer: '/a~1b', detail: 'is missing' }]
    const { response, body } = await answerTo(thrownBy(() => fail('same-content', 'Revision 3 is the same.', { errors, members: { twin: 3 }, headers: { 'model-fingerprint': 'f' } })))
    expect(body).toMatchObject({ detail: 'Revision 3 is the same.', errors, twin: 3 })
    expect(response.headers.get('model-fingerprint')).toBe('f')
  })
})

describe('the table of problems', () => {
  it.each(Object.entries(PROBLEMS))('says of %s what happened and what to do', (code, { status, title, meaning, remedy }) => {
    expect(code).toMatch(/^[a-z]+(-[a-z]+)*$/)
    expect([400, 401, 403, 404, 405, 406, 409, 412, 413, 415, 422, 428, 500, 503]).toContain(status)
    expect(title).toMatch(/^[A-Z].*[^.]$/)
    for (const sentence of [meaning, remedy]) expect(sentence).toMatch(/^[A-Z].*\.$/)
  })
})
