/** A long line is shown in pieces of this many UTF-16 units, because a browser lays out no line of megabytes at speed. */
const PIECE = 400
/** Rows beyond this are not shown: a browser's tallest element ends there. */
export const MOST_ROWS = 600_000

/** A text cut into rows of the source view. */
export interface SourceRows {
  readonly count: number
  readonly lines: number
  /** True when the text has more rows than can be shown. */
  readonly isCut: boolean
  /** Number of the line that a row belongs to, from 1. */
  lineOf(row: number): number
  /** False on the further pieces of a long line. */
  startsLine(row: number): boolean
  textOf(row: number): string
  /** Row and offset in it (UTF-16 units) of a place given by line and column in code points, both from 1; the nearest when
   *  it lies outside the text. */
  find(line: number, column: number): { readonly row: number; readonly at: number }
}

/** Cuts a text into rows. Lines end at LF, CR or CRLF, as the importer counts them. Linear in the length of the text. */
export function sourceRows(text: string): SourceRows {
  const starts: number[] = []
  const ends: number[] = []
  const lineNumbers: number[] = []
  const firstRows: number[] = []
  let isCut = false
  let line = 0
  for (let from = 0; from <= text.length; ) {
    const [end, next] = lineEnd(text, from)
    line++
    if (starts.length >= MOST_ROWS) {
      isCut = true
      break
    }
    firstRows.push(starts.length)
    for (let at = from; ; ) {
      const cut = pieceEnd(text, at, end)
      starts.push(at)
      ends.push(cut)
      lineNumbers.push(line)
      at = cut
      if (at >= end || starts.length >= MOST_ROWS) break
    }
    from = next
  }
  return {
    count: starts.length,
    lines: lineNumbers.at(-1) ?? 0,
    isCut,
    lineOf: (row) => lineNumbers[row] ?? 0,
    startsLine: (row) => row === 0 || lineNumbers[row] !== lineNumbers[row - 1],
    textOf: (row) => text.slice(starts[row] ?? 0, ends[row] ?? 0),
    find(atLine, column) {
      const first = firstRows[Math.min(Math.max(atLine, 1), firstRows.length) - 1] ?? 0
      let row = first
      let at = starts[first] ?? 0
      const isEnd = () => at >= (ends[row] ?? 0)
      const goesOn = () => lineNumbers[row + 1] === lineNumbers[first]
      for (let left = column - 1; left > 0 && !(isEnd() && !goesOn()); left--) {
        at += (text.codePointAt(at) ?? 0) > 0xffff ? 2 : 1
        while (isEnd() && goesOn()) row++
      }
      return { row, at: Math.min(at, ends[row] ?? 0) - (starts[row] ?? 0) }
    },
  }
}

/** Where the line that begins at `from` ends, and where the next one begins (beyond the text: there is none). */
function lineEnd(text: string, from: number): [end: number, next: number] {
  for (let at = from; at < text.length; at++) {
    const code = text.charCodeAt(at)
    if (code === 10) return [at, at + 1]
    if (code === 13) return [at, text.charCodeAt(at + 1) === 10 ? at + 2 : at + 1]
  }
  return [text.length, text.length + 1]
}

/** The end of a piece that starts at `at`, never between the halves of a surrogate pair. */
function pieceEnd(text: string, at: number, end: number): number {
  if (end - at <= PIECE) return end
  const cut = at + PIECE
  const code = text.charCodeAt(cut - 1)
  return code >= 0xd800 && code <= 0xdbff ? cut + 1 : cut
}
