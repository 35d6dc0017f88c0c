import type { Response } from 'supertest'
import { expect } from 'vitest'
import { PROBLEMS, type ProblemCode } from '@/lib/errors'

/** Checks that an answer is exactly this problem, in the form of RFC 9457 and API.md section 1. */
export function expectProblem(response: Response, code: ProblemCode): void {
  const { status, title } = PROBLEMS[code]
  expect({ status: response.status, type: (response.body as { type?: string }).type, detail: response.text.slice(0, 400) }).toMatchObject({
    status,
    type: `/docs/problems/${code}`,
  })
  expect(response.headers['content-type']).toBe('application/problem+json')
  expect(response.headers['cache-control']).toBe('no-store')
  expect(response.body).toMatchObject({ title, status, requestId: response.headers['x-request-id'] })
  const { detail, instance } = response.body as { detail: string; instance: string }
  expect(detail).toMatch(/^\S.*[.!]$/s)
  expect(instance).toMatch(/^\/api\/v1(\/|$)/)
  // Nothing of the inside gets out.
  expect(response.text).not.toMatch(/\bat .+:\d+:\d+|select .+ from|node_modules|\.ts\b|ZodError/i)
  if (status === 401) expect(response.headers['www-authenticate']).toMatch(/^Bearer realm="elbowroom"/)
}

/** The pointers of a problem's errors. */
export const pointersOf = (response: Response): string[] => ((response.body as { errors?: { pointer: string }[] }).errors ?? []).map(({ pointer }) => pointer)
