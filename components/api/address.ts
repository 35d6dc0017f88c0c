import { ROUTES } from './routes'
import type { CalledName } from './routes'

/** Address of an operation on this site, with its path parameters and query filled in. */
export function addressOf(name: CalledName, path: Readonly<Record<string, string | number>>, query: object = {}): string {
  const filled = ROUTES[name][1].replace(/\{(\w+)\}/g, (_, parameter: string) => {
    const value = String(path[parameter] ?? '')
    // The one parameter that may have several parts, each encoded by itself.
    return parameter === 'path' ? value.split('/').map(encodeURIComponent).join('/') : encodeURIComponent(value)
  })
  const search = new URLSearchParams()
  for (const [field, value] of Object.entries(query)) {
    if (value !== undefined && value !== null && value !== '') search.set(field, String(value))
  }
  return `/api/v1${filled}${search.size > 0 ? `?${search}` : ''}`
}
