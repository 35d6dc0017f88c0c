import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { readName } from '@/lib/urdf/read-name'
import { attributesOf, type Reading } from '@/lib/urdf/read-value'

/** A link as read. meshes: the filename of each mesh in its visuals and collisions, in file order. */
export interface DraftLink {
  readonly at: number
  readonly label: string
  readonly name: Attribute | null
  readonly meshes: readonly Attribute[]
}

/** Reads a <link>: its name and its meshes. Inertia, colours and shapes do not enter the computation. */
export function readLink({ text, report }: Reading, element: XmlElement): DraftLink {
  const meshes: Attribute[] = []
  for (const shape of element.children) {
    if (shape.name !== 'visual' && shape.name !== 'collision') continue
    for (const geometry of shape.children) {
      if (geometry.name !== 'geometry') continue
      for (const mesh of geometry.children) {
        const filename = mesh.name === 'mesh' && attributesOf(text, mesh).get('filename')
        if (filename) meshes.push(filename)
      }
    }
  }
  return { at: element.at, ...readName(report, attributesOf(text, element), element, 'link'), meshes }
}
