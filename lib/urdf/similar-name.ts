const key = (name: string): string => name.toLowerCase().replace(/[^\p{L}\p{N}]/gu, '')

/** A finder of names that differ from a given one in nothing but capitals, blanks and punctuation. The names are indexed when it
 *  is first asked, so that a file without faults pays nothing. */
export function createSimilarName(names: readonly string[]): (name: string) => string | undefined {
  let byKey: Map<string, string> | null = null
  return (name) => {
    byKey ??= new Map([...names].reverse().map((known) => [key(known), known]))
    return byKey.get(key(name))
  }
}
