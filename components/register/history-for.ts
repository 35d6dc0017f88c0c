/** Whether a change of filters makes an entry of its own in the browser's history: typing on in a field that is in the address already
 *  does not, so that going back takes one step and not one a letter. */
export function historyFor(change: Readonly<Record<string, unknown>>, address: URLSearchParams): 'push' | 'replace' {
  const isTypedOn = Object.entries(change).every(([field, value]) => field !== 'status' && value !== null && address.has(field))
  return isTypedOn ? 'replace' : 'push'
}
