const YEAR_SECONDS = 365 * 24 * 3600

/** Keeps a choice of this browser in a cookie, so that the server draws the next page with it. */
export function remember(name: string, value: string): void {
  document.cookie = `${name}=${value}; path=/; max-age=${YEAR_SECONDS}; samesite=lax`
}
