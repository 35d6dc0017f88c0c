import { describe, expect, it } from 'vitest'
import { checkAccept } from '@/lib/http/accept'

const accepts = (field: string | undefined, mediaType = 'application/json') => {
  try {
    checkAccept(new Headers(field === undefined ? {} : { accept: field }), mediaType)
    return true
  } catch {
    return false
  }
}

describe('the Accept field (RFC 9110 section 12.5.1)', () => {
  it.each([
    [undefined, true],
    ['', true],
    ['*/*', true],
    ['application/*', true],
    ['application/json', true],
    ['APPLICATION/JSON;Q=0.5', true],
    ['text/html,application/json;q=0.001', true],
    ['application/json;charset=utf-8', true],
    ['text/*, */*;q=0.1', true],
    ['text/html', false],
    ['application/xml', false],
    ['application/json;q=0', false],
    ['application/json;q=0.000', false],
    // The most specific range decides.
    ['application/json;q=0, */*', false],
    ['application/*;q=0, */*', false],
    ['*/*;q=0, application/json', true],
    ['application/json-seq', false],
    [',;', false],
  ])('%s lets JSON pass: %s', (field, verdict) => expect(accepts(field)).toBe(verdict))

  it('is asked for the type that the operation answers in', () => {
    expect(accepts('application/xml', 'application/xml')).toBe(true)
    expect(accepts('application/json', 'application/xml')).toBe(false)
  })
})
