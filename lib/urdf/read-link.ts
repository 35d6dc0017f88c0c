import { checkInertia } from '@/lib/urdf/check-inertia'
import { mentionMacros } from '@/lib/urdf/mention-macros'
import { readName } from '@/lib/urdf/read-name'
import { readShape } from '@/lib/urdf/read-shape'
import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'

/** A link as read. meshes: the filename of each mesh in its visuals and collisions, in file order. */
export interface DraftLink {
  readonly at: number
  readonly label: string
  readonly name: Attribute | null
  readonly meshes: readonly Attribute[]
}

/** Reads a <link>: its name and its meshes. Inertia, colours and shapes do not enter the computation, but what is odd about them is
 *  worth a note. */
export function readLink(reading: Reading, element: XmlElement): DraftLink {
  const { text, report, unused } = reading
  const { name, label } = readName(report, attributesOf(text, element), element, 'link')
  const meshes: Attribute[] = []
  for (const part of unused.knownChildren('link', element, label)) {
    if (part.name === 'inertial') checkInertia(reading, part, label)
    else meshes.push(...readShape(reading, part, label))
  }
  mentionMacros(reading, element.children, label)
  return { at: element.at, label, name, meshes }
}
