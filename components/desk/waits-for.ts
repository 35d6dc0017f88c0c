const MOST_NAMES = 3

/** Who can end the waiting, in words. releasers: names of those who may release the revision. */
export function waitsFor(releasers: readonly string[]): string {
  if (releasers.length === 0) return 'nobody: no approver of the team is left who neither imported nor submitted it'
  const others = releasers.length - MOST_NAMES
  const named = others > 0 ? [...releasers.slice(0, MOST_NAMES), `${others} more`] : releasers
  return named.length === 1 ? named[0]! : `${named.slice(0, -1).join(', ')} or ${named.at(-1)}`
}
