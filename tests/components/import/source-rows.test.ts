import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { MOST_ROWS, sourceRows } from '@/components/import/source-rows'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

const rowsOf = (text: string) => {
  const rows = sourceRows(text)
  return Array.from({ length: rows.count }, (_, row) => ({ line: rows.lineOf(row), text: rows.textOf(row), starts: rows.startsLine(row) }))
}
const characterAt = (text: string, line: number, column: number): string => {
  const rows = sourceRows(text)
  const { row, at } = rows.find(line, column)
  return String.fromCodePoint(rows.textOf(row).codePointAt(at) ?? 0)
}

describe('sourceRows', () => {
  it('ends lines at LF, CR and CRLF', () => {
    expect(rowsOf('a\nb\r\nc\rd').map((row) => row.text)).toEqual(['a', 'b', 'c', 'd'])
    expect(rowsOf('a\n').map((row) => row.line)).toEqual([1, 2])
    expect(rowsOf('')).toEqual([{ line: 1, text: '', starts: true }])
  })

  it('shows a long line in pieces that lose nothing and belong to one line', () => {
    const long = 'x'.repeat(1234)
    const rows = rowsOf(`${long}\nend`)
    expect(rows.filter((row) => row.line === 1).map((row) => row.text).join('')).toBe(long)
    expect(rows.filter((row) => row.starts).map((row) => row.line)).toEqual([1, 2])
  })

  it('never cuts between the halves of a surrogate pair', () => {
    fc.assert(
      fc.property(fc.integer({ min: 380, max: 420 }), fc.integer({ min: 1, max: 600 }), (before, pairs) => {
        for (const { text } of rowsOf('y'.repeat(before) + '🦾'.repeat(pairs))) expect(text).not.toMatch(/\p{Cs}/u)
      }),
      { seed: 7, numRuns: 60 },
    )
  })

  it('finds the character at any line and column, as a reader would count', () => {
    const character = fc.constantFrom('a', '"', '🦾', 'ß', '\t')
    const line = fc.array(character, { maxLength: 900 })
    fc.assert(
      fc.property(fc.array(line, { minLength: 1, maxLength: 5 }), fc.constantFrom('\n', '\r\n'), fc.nat(), fc.nat(), (lines, end, a, b) => {
        const number = a % lines.length
        const characters = lines[number]!
        if (characters.length === 0) return
        const column = b % characters.length
        expect(characterAt(lines.map((one) => one.join('')).join(end), number + 1, column + 1)).toBe(characters[column])
      }),
      { seed: 11, numRuns: 300 },
    )
  })

  it('holds a place outside the text at its nearest end', () => {
    const rows = sourceRows('ab\ncd')
    expect(rows.find(9, 9)).toEqual({ row: 1, at: 2 })
    expect(rows.find(0, 0)).toEqual({ row: 0, at: 0 })
    expect(rows.find(1, 99)).toEqual({ row: 0, at: 2 })
  })

  it('says that it is cut where a text has more rows than a browser can hold', () => {
    const rows = sourceRows('\n'.repeat(MOST_ROWS + 10))
    expect(rows.isCut).toBe(true)
    expect(rows.count).toBe(MOST_ROWS)
    expect(sourceRows('\n'.repeat(10)).isCut).toBe(false)
  })

  it("agrees with the importer's line and column, on each kind of line end", () => {
    const flawed = ['<robot name="r">', '<!-- 🦾 --> <link name="a"/>', '<joint name="j" type="wobble"><parent link="a"/><child link="a"/></joint>', '</robot>']
    for (const end of ['\n', '\r\n', '\r']) {
      const text = flawed.join(end)
      const finding = parseUrdf(new TextEncoder().encode(text)).findings.find(({ rule }) => rule === 'joint-type-unknown')!
      const rows = sourceRows(text)
      const { row, at } = rows.find(finding.line, finding.column)
      expect(rows.textOf(row).slice(at)).toMatch(/^(wobble|<joint|type=)/)
    }
  })
})
