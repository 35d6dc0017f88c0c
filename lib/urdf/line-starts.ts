const LF = 10
const CR = 13

/** Offset at which each line begins; lines end at LF, CR or CRLF. A file of nothing but line ends has millions, so they are counted
 *  before they are kept. */
export function lineStartsOf(text: string): Uint32Array {
  let count = 1
  for (let at = 0; at < text.length; at++) if (endsLine(text, at)) count++
  const starts = new Uint32Array(count)
  for (let at = 0, line = 1; line < count; at++) if (endsLine(text, at)) starts[line++] = at + 1
  return starts
}

function endsLine(text: string, at: number): boolean {
  const code = text.charCodeAt(at)
  return code === LF || (code === CR && text.charCodeAt(at + 1) !== LF)
}

/** The line, counted from 1, on which `offset` lies. Binary search. */
export function lineAt(starts: ArrayLike<number>, offset: number): number {
  let low = 0
  let high = starts.length
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (starts[middle]! <= offset) low = middle
    else high = middle
  }
  return low + 1
}
