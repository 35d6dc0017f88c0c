import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Problem } from '@/lib/errors'
import { parseJsonInSteps } from '@/lib/http/parse-json'

function parse(text: string): { value: unknown; pauses: number } {
  const steps = parseJsonInSteps(text)
  for (let pauses = 0; ; pauses++) {
    const step = steps.next()
    if (step.done === true) return { value: step.value, pauses }
  }
}

/** The value, or the code of the problem. */
function verdict(text: string): unknown {
  try {
    return { value: parse(text).value }
  } catch (error) {
    if (error instanceof Problem) return error.code
    throw error
  }
}

/** What JSON.parse makes of it, which is the witness here. */
function expected(text: string): unknown {
  try {
    return { value: JSON.parse(text) as unknown }
  } catch {
    return 'malformed-body'
  }
}

/** So many blanks that no list or object around them is small. */
const WIDE = ' '.repeat(17_000)

describe('parseJsonInSteps', () => {
  it('reads every JSON value as JSON.parse does, in one piece and bit by bit', () => {
    fc.assert(
      fc.property(fc.json({ maxDepth: 5 }), fc.constantFrom('', WIDE), (json, blanks) => {
        // Blanks at the end of a list make it too long to be read at once.
        const text = /[\]}]$/.test(json) ? json.slice(0, -1) + blanks + json.at(-1)! : json
        expect(verdict(text)).toEqual(expected(text))
      }),
      { seed: 20261201, numRuns: 400 },
    )
  })

  it('refuses exactly the texts that JSON.parse refuses', () => {
    const crumbs = fc.array(fc.constantFrom('[', ']', '{', '}', ',', ':', '"', '"a"', '\\', '1', '-', '0', '.5', 'e3', 'true', 'nul', ' ', '\n', '\u00a0', '\u2028', '\u0001', '\ufeff', '\\u12', WIDE), { maxLength: 9 })
    fc.assert(
      fc.property(crumbs, (parts) => {
        const text = parts.join('')
        expect(verdict(text)).toEqual(expected(text))
      }),
      { seed: 7, numRuns: 3000 },
    )
  })

  it.each(['{"a":1,"a":2}', '{"__proto__":{"x":1}}', '{"2":0,"1":0}', '["\\ud800"]', '[1e400,-0,5e-324,0.1e+2]', '"\\\\\\""', '{"\\u0061":[]}', '[[],{},[{}],""]'])('reads %s bit by bit as in one piece', (json) => {
    const wide = json.length < 3 || !/[\]}]$/.test(json) ? json : `${json.slice(0, -1)}${WIDE}${json.at(-1)!}`
    expect(verdict(wide)).toEqual(expected(json))
    expect(Object.keys((verdict(wide) as { value: object }).value)).toEqual(Object.keys(JSON.parse(json) as object))
  })

  it('pauses often in a long text, whatever it is long of', () => {
    const row = `[${new Array(7).fill('0.12345678').join()}]`
    for (const text of [`[${new Array(20_000).fill(row).join()}]`, `[${' '.repeat(1_000_000)}1]`, `{"a"${' '.repeat(1_000_000)}:1}`, `[[${new Array(90_000).fill('0.12345678901').join()}]]`]) {
      expect(parse(text).pauses).toBeGreaterThan(text.length / 40_000)
    }
  })

  it('lets the largest question pass', () => {
    const reference = { pose: { position: [0, 0, 0], quaternion: [0, 0, 0, 1] }, twist: [0, 0, 0, 0, 0, 0], gains: { position: 1, orientation: 1 } }
    const question = { configurations: new Array(10_000).fill([0, 0, 0, 0, 0, 0, 0]), references: new Array(10_000).fill(reference) }
    expect(parse(JSON.stringify(question)).value).toEqual(question)
  })

  it('counts depth and not brackets within texts', () => {
    expect(verdict('['.repeat(64) + ']'.repeat(64))).toEqual(expected('['.repeat(64) + ']'.repeat(64)))
    expect(verdict('['.repeat(65) + ']'.repeat(65))).toBe('invalid-request')
    expect(verdict(`${'['.repeat(65)}${WIDE}${']'.repeat(65)}`)).toBe('invalid-request')
    expect(verdict(JSON.stringify(['['.repeat(100), '\\"[{'.repeat(100)]))).toMatchObject({ value: [expect.any(String), expect.any(String)] })
  })

  it('refuses more parts, entries and characters than any question has', () => {
    for (const part of ['[]', '{}', '""']) expect(verdict(`[[${new Array(90_000).fill(part).join()}],[${new Array(90_000).fill(`[${part},${part},${part}]`).join()}]]`), part).toBe('invalid-request')
    expect(verdict(`[${new Array(100_001).fill('1').join()}]`)).toBe('invalid-request')
    expect(verdict(`[${new Array(100_000).fill('1').join()}]`)).toHaveProperty('value.length', 100_000)
    expect(verdict(`["${'x'.repeat(1_000_001)}"]`)).toBe('invalid-request')
  })

  it.each([
    ['{"configurations": [[0, NaN]]}', 'at character 25, where a value has to come, found "N"'],
    ["{'a': 1}", 'at character 2, where a name in double quotes has to come, found "\'"'],
    ['[1, 2', 'at character 6, where a comma or a closing bracket has to come, it ends'],
    ['{} {}', 'at character 4, where nothing more has to come, found "{"'],
    ['{"a" 1}', 'at character 6, where a colon has to come, found "1"'],
    ['["a', 'the text that begins at character 2'],
  ])('names the place where %s stops being JSON', (text, detail) => {
    expect(() => parse(text)).toThrow(detail)
  })
})
