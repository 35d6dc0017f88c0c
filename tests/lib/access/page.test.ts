import { describe, expect, it } from 'vitest'
import { cursorOf, pageOf, parseCursor } from '@/lib/access/page'

const cursorFor = (value: unknown) => Buffer.from(JSON.stringify(value)).toString('base64url')
const rows = Array.from({ length: 7 }, (_, i) => ({ slug: `m-${i}` }))

describe('a page', () => {
  it('knows whether another follows without counting all', async () => {
    const read = async (limit: number) => rows.slice(0, limit)
    expect(await pageOf(3, read)).toEqual({ items: rows.slice(0, 3), hasMore: true })
    expect(await pageOf(7, read)).toEqual({ items: rows, hasMore: false })
    expect(await pageOf(undefined, async (limit) => Array.from({ length: limit }, () => rows[0]!))).toMatchObject({ items: { length: 50 }, hasMore: true })
  })

  it('leads to the next by a cursor that comes back as the same position', () => {
    const { nextCursor } = cursorOf({ items: rows, hasMore: true }, ({ slug }) => [slug, 7])
    expect(parseCursor(nextCursor, ['text', 'int'])).toEqual(['m-6', 7])
    expect(nextCursor).toMatch(/^[\w-]+$/)
    expect(cursorOf({ items: rows, hasMore: false }, ({ slug }) => [slug])).toEqual({})
    expect(cursorOf({ items: [] as typeof rows, hasMore: false }, ({ slug }) => [slug])).toEqual({})
    expect(parseCursor(undefined, ['text'])).toBeUndefined()
  })
})

describe('a cursor', () => {
  it.each([
    ['', ['text']],
    ['garbage', ['text']],
    [cursorFor(null), ['text']],
    [cursorFor({ 0: 'a', length: 1 }), ['text']],
    [cursorFor([]), ['text']],
    [cursorFor(['a', 'b']), ['text']],
    [cursorFor([1]), ['text']],
    [cursorFor(['nul\0']), ['text']],
    [cursorFor(['1']), ['int']],
    [cursorFor([1.5]), ['int']],
    [cursorFor([-1]), ['int']],
    [cursorFor([2 ** 31]), ['int']],
    [cursorFor([8.65e15, 'a']), ['instant', 'text']],
    [cursorFor([null, 'a']), ['instant', 'text']],
  ] as const)('that no list made is refused: %s for %j', (cursor, kinds) => {
    expect(() => parseCursor(cursor, kinds as readonly 'text'[])).toThrow('invalid-request')
  })
})
