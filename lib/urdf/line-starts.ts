const LF = 10
const CR = 13

/** Offset at which each line begins; lines end at LF, CR or CRLF. */
export function lineStartsOf(text: string): number[] {
  const starts = [0]
  for (let at = 0; at < text.length; at++) {
    const code = text.charCodeAt(at)
    if (code === LF || (code === CR && text.charCodeAt(at + 1) !== LF)) starts.push(at + 1)
  }
  return starts
}

/** The line, counted from 1, on which `offset` lies. Binary search. */
export function lineAt(starts: readonly number[], offset: number): number {
  let low = 0
  let high = starts.length
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (starts[middle]! <= offset) low = middle
    else high = middle
  }
  return low + 1
}
