import type { MeshReference } from '@/lib/contract/mesh'
import type { Description } from '@/lib/urdf/description'
import { leadsOutside, meshResolver } from '@/lib/urdf/resolve-mesh'

/** Where each mesh that a description refers to is found, once for each filename in the order of the file. files: what came with the
 *  description. Left out when it refers to none. */
export function presentMeshes(description: Description, files: readonly { readonly path: string; readonly size: number }[]): { meshes?: MeshReference[] } {
  const sizes = new Map(files.map(({ path, size }) => [path, size]))
  const resolve = meshResolver([...sizes.keys()])
  const filenames = new Set(description.links.flatMap(({ meshes }) => meshes))
  const meshes = [...filenames].map((filename): MeshReference => {
    if (leadsOutside(filename)) return { filename, state: 'outside' }
    const path = resolve(filename)
    return path === null ? { filename, state: 'missing' } : { filename, state: 'found', path, size: sizes.get(path)! }
  })
  return meshes.length === 0 ? {} : { meshes }
}
