import type { Located } from './locate'

/** ETag of a stored thing that is edited: changes with every edit and with nothing else. */
export const versionTag = (row: { id: string; version: number }): string => `${row.id}.${row.version}`

/** ETag of the innermost thing that a path names and that can be edited. */
export function currentTag(at: Partial<Located>): string | null {
  if (at.key !== undefined) return versionTag(at.key.key)
  if (at.model !== undefined) return versionTag(at.model.model)
  return null
}
