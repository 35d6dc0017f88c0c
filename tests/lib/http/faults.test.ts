import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { Problem } from '@/lib/errors'
import { parsePart, pointerOf } from '@/lib/http/faults'

function refusal(schema: z.ZodType, value: unknown, prefix = ''): Problem {
  try {
    parsePart(schema, value, prefix)
  } catch (error) {
    if (error instanceof Problem) return error
    throw error
  }
  throw new Error('the value was accepted')
}

const only = (schema: z.ZodType, value: unknown) => {
  const { errors } = refusal(z.strictObject({ field: schema }), { field: value }).more
  expect(errors).toHaveLength(1)
  return errors![0]!.detail
}

describe('parsePart', () => {
  it.each([
    [z.number(), '7', 'must be a number, not text'],
    [z.number(), null, 'must be a number, not null'],
    [z.number(), [1], 'must be a number, not a list'],
    [z.number(), Infinity, 'must be a number, not a number beyond binary64'],
    [z.string(), 7, 'must be text, not a number'],
    [z.boolean(), 'true', 'must be true or false, not text'],
    [z.array(z.number()), {}, 'must be a list, not an object'],
    [z.strictObject({}), [], 'must be an object, not a list'],
    [z.string(), undefined, 'is missing'],
    [z.enum(['m', 'mm']), 'in', 'must be one of "m", "mm"'],
    [z.literal('posture'), 'x', 'must be "posture"'],
    [z.discriminatedUnion('kind', [z.strictObject({ kind: z.literal('a') }), z.strictObject({ kind: z.literal('b') })]), { kind: 'c' }, 'must be one of "a", "b"'],
    [z.number().max(1), 2, 'must be at most 1'],
    [z.number().min(1, 'our own words'), 0, 'our own words'],
    [z.array(z.number()).length(3), [1], 'must have exactly 3 entries'],
    [z.array(z.number()).min(2), [1], 'must have at least 2 entries'],
    [z.string().max(2), 'abc', 'must have at most 2 characters'],
    [z.iso.datetime(), 'noon', 'must be a time in UTC such as 2026-12-01T14:05:00Z'],
    [z.string().refine(() => false, 'refused in words'), 'x', 'refused in words'],
  ])('says of %#: %j … %s', (schema, value, detail) => expect(only(schema, value)).toBe(detail))

  it('gives back what the schema makes of the value', () => {
    expect(parsePart(z.strictObject({ name: z.string().trim() }), { name: ' a ' }, '')).toEqual({ name: 'a' })
  })

  it('puts the only fault into the detail, and counts several', () => {
    const schema = z.strictObject({ a: z.number(), b: z.number() })
    expect(refusal(schema, { a: 1 }).detail).toBe('/b: is missing.')
    expect(refusal(schema, {}, '/query').more.errors!.map(({ pointer }) => pointer)).toEqual(['/query/a', '/query/b'])
    expect(refusal(schema, {}).detail).toBe('2 places are wrong; see "errors".')
    expect(refusal(schema, 7).detail).toBe('The body: must be an object, not a number.')
  })

  it('names each unknown field by itself', () => {
    const { errors } = refusal(z.strictObject({}), { x: 1, 'y/z': 2 }).more
    expect(errors).toEqual([
      { pointer: '/x', detail: '"x" is not a field of this request' },
      { pointer: '/y~1z', detail: '"y/z" is not a field of this request' },
    ])
  })

  it('lists at most fifty faults, and of a very large value the first', () => {
    const numbers = z.array(z.number())
    expect(refusal(numbers, new Array(60).fill('a')).more.errors).toHaveLength(50)
    const huge = new Array<unknown>(300_000).fill('a')
    huge[0] = 1
    expect(refusal(numbers, huge).more.errors).toEqual([{ pointer: '/1', detail: 'must be a number, not text' }])
  })
})

describe('pointerOf', () => {
  it('escapes as RFC 6901 says', () => {
    // The example of RFC 6901 section 5.
    expect([pointerOf('', ['a/b']), pointerOf('', ['m~n']), pointerOf('', [' ']), pointerOf('', ['foo', 0])]).toEqual(['/a~1b', '/m~0n', '/ ', '/foo/0'])
    expect(pointerOf('/query', ['~1'])).toBe('/query/~01')
  })
})
