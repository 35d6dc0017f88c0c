/** Where a "come back here" parameter leads: path and query when it is of this site, else null. It came from outside, so a
 *  foreign address, or one that only looks like a path, is not followed. */
export function sameOriginPath(target: string | null | undefined, origin: string): string | null {
  if (!target) return null
  try {
    const url = new URL(target, origin)
    return url.origin === origin ? `${url.pathname}${url.search}` : null
  } catch {
    // Not an address at all.
    return null
  }
}
