import { describe, expect, it } from 'vitest'
import { chooseMediaType } from '@/lib/http/accept'

const choose = (field: string | undefined, ...offered: [string, ...string[]]) => chooseMediaType(new Headers(field === undefined ? {} : { accept: field }), offered)

const accepts = (field: string | undefined, mediaType = 'application/json') => {
  try {
    return choose(field, mediaType) === mediaType
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

  it.each([
    [undefined, 'application/json'],
    ['*/*', 'application/json'],
    ['text/csv', 'text/csv'],
    ['application/json;q=0.4, text/csv;q=0.5', 'text/csv'],
    ['text/csv;q=0.5, */*;q=0.5', 'application/json'],
    ['text/csv, application/json', 'application/json'],
    ['application/*', 'application/json'],
    ['application/*;q=0.5, text/*', 'text/csv'],
    ['application/json;q=0, application/*', 'application/octet-stream'],
    ['application/json;q=0, */*;q=0.1', 'text/csv'],
    ['text/csv;q=0.9;header=present, application/octet-stream;q=0.91', 'application/octet-stream'],
    ['text/csv;q=0.9, image/png', 'text/csv'],
  ])('%s chooses %s of JSON, CSV and binary', (field, chosen) => {
    expect(choose(field, 'application/json', 'text/csv', 'application/octet-stream')).toBe(chosen)
  })

  it.each(['image/png', 'application/json;q=0, text/csv;q=0', '*/*;q=0', 'text/html;q=1'])('%s leaves all of them out, and is told so', (field) => {
    expect(() => choose(field, 'application/json', 'text/csv')).toThrow('answers in application/json or text/csv')
  })
})
