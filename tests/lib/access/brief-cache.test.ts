import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { BRIEF_MS, briefCache } from '@/lib/access/brief-cache'

beforeEach(() => void vi.useFakeTimers())
afterEach(() => void vi.useRealTimers())

describe('briefCache', () => {
  it('asks once for a burst and again after two seconds', async () => {
    const load = vi.fn(async (id: string) => `${id} loaded`)
    const cache = briefCache(load)
    expect(await Promise.all([cache.get('a'), cache.get('a'), cache.get('b')])).toEqual(['a loaded', 'a loaded', 'b loaded'])
    expect(load).toHaveBeenCalledTimes(2)
    vi.advanceTimersByTime(BRIEF_MS)
    await cache.get('a')
    expect(load).toHaveBeenCalledTimes(3)
    expect(BRIEF_MS).toBeLessThanOrEqual(2000)
  })

  it('forgets at once what it is told to forget', async () => {
    const load = vi.fn(async () => null)
    const cache = briefCache(load)
    await cache.get('a')
    cache.forget('a')
    await cache.get('a')
    expect(load).toHaveBeenCalledTimes(2)
  })

  it('does not remember a failure', async () => {
    const load = vi.fn().mockRejectedValueOnce(new Error('down')).mockResolvedValue('up')
    const cache = briefCache(load)
    await expect(cache.get('a')).rejects.toThrow('down')
    expect(await cache.get('a')).toBe('up')
  })
})
