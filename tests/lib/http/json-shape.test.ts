import { describe, expect, it } from 'vitest'
import { checkJsonShape } from '@/lib/http/json-shape'

const check = (text: string) => () => checkJsonShape(new TextEncoder().encode(text))

describe('checkJsonShape', () => {
  it('lets the largest question pass', () => {
    const reference = { pose: { position: [0, 0, 0], quaternion: [0, 0, 0, 1] }, twist: [0, 0, 0, 0, 0, 0], gains: { position: 1, orientation: 1 } }
    const question = { configurations: new Array(10_000).fill([0, 0, 0, 0, 0, 0, 0]), references: new Array(10_000).fill(reference) }
    expect(check(JSON.stringify(question))).not.toThrow()
  })

  it('counts depth and not brackets within texts', () => {
    expect(check('['.repeat(64) + ']'.repeat(64))).not.toThrow()
    expect(check('['.repeat(65) + ']'.repeat(65))).toThrow('nested deeper than 64 levels')
    expect(check(JSON.stringify(['['.repeat(100), '\\"[{'.repeat(100)]))).not.toThrow()
    expect(check('[]'.repeat(100))).not.toThrow()
  })

  it('refuses more parts than any question has, and counts no numbers', () => {
    expect(check(`[${'1,'.repeat(1_000_000)}1]`)).not.toThrow()
    for (const part of ['[]', '{}', '""']) expect(check(`[${`${part},`.repeat(400_000)}1]`), part).toThrow('holds more than')
  })

  it('leaves what does not parse to the parser', () => {
    for (const text of ['', ']', '"', '"\\', '}}}', '{"a']) expect(check(text)).not.toThrow()
  })
})
