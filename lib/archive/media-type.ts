import { MESH_MEDIA_TYPES } from '@/lib/contract/mesh-media-types'

/** Media type of a mesh or of what belongs to one; null for every other file. */
export function mediaTypeOf(path: string): string | null {
  const end = /\.([A-Za-z]+)$/.exec(path)?.[1]?.toLowerCase() ?? ''
  return Object.hasOwn(MESH_MEDIA_TYPES, end) ? MESH_MEDIA_TYPES[end]! : null
}
