import type { ResultWriter } from './result-writer'

/** Writes results into the answer of which they are the "results". envelope: the rest of it, parsed by its schema. */
export function jsonWriter(envelope: object): ResultWriter {
  const head = JSON.stringify({ ...envelope, results: [] })
  const pieces = [head.slice(0, -2)]
  return {
    take(result) {
      pieces.push((pieces.length === 1 ? '' : ',') + JSON.stringify(result))
    },
    *finish() {
      return { headers: {}, chunks: [...pieces, ']}'] }
    },
  }
}
