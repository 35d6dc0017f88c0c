import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { digestKey, drawKey, keyPrefix, parseKey } from '@/lib/access/key-text'

describe('a key', () => {
  it('has the form of the contract and names its id', () => {
    for (let i = 0; i < 200; i++) {
      const { id, key } = drawKey()
      expect(key).toMatch(/^elb_[0-9A-Za-z]{12}_[0-9A-Za-z]{43}[0-9A-Za-z]{6}$/)
      expect(key.startsWith(`${keyPrefix(id)}_`)).toBe(true)
      expect(parseKey(key)).toBe(id)
    }
  })

  it('is never drawn twice', () => {
    expect(new Set(Array.from({ length: 2000 }, () => drawKey().key)).size).toBe(2000)
  })

  it('is told apart from a mistyped one by its checksum, whichever character is wrong', () => {
    const { key } = drawKey()
    for (let place = 4; place < key.length; place++) {
      if (key[place] === '_') continue
      const other = key[place] === 'a' ? 'b' : 'a'
      expect(parseKey(key.slice(0, place) + other + key.slice(place + 1)), `place ${place}`).toBeNull()
    }
  })

  it('is told apart from one with two neighbours swapped, or one lost or doubled', () => {
    const { key } = drawKey()
    for (let place = 17; place < key.length - 1; place++) {
      const [a, b] = [key[place]!, key[place + 1]!]
      if (a !== b) expect(parseKey(key.slice(0, place) + b + a + key.slice(place + 2))).toBeNull()
      expect(parseKey(key.slice(0, place) + key.slice(place + 1))).toBeNull()
      expect(parseKey(key.slice(0, place) + a + key.slice(place))).toBeNull()
    }
  })

  it('is read from no other text', () => {
    const { key } = drawKey()
    for (const text of ['', 'elb_', ` ${key}`, `${key}\n`, key.toUpperCase(), key.replace('elb', 'ELB'), `${key}${key}`]) expect(parseKey(text)).toBeNull()
    fc.assert(fc.property(fc.string(), (text) => parseKey(text) === null), { seed: 1, numRuns: 500 })
  })

  it('is kept under its SHA-256', () => {
    // FIPS 180-2, appendix B.1.
    expect(digestKey('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad')
  })
})
