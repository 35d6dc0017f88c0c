import { KNOWN_SHAPES } from '@/lib/urdf/known-elements'
import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { quoted } from '@/lib/urdf/wording'

/** The filename of each mesh in a <visual> or <collision>. Shapes and pictures that are not shown are noted. */
export function readShape(reading: Reading, element: XmlElement, label: string): Attribute[] {
  const meshes: Attribute[] = []
  for (const part of reading.unused.knownChildren(element.name, element, label)) {
    if (part.name === 'geometry') for (const shape of part.children) meshes.push(...meshOf(reading, shape, label))
    if (part.name === 'material') checkMaterial(reading, part, label)
  }
  return meshes
}

function meshOf({ text, report, version }: Reading, shape: XmlElement, label: string): Attribute[] {
  if (shape.name.startsWith('xacro:')) return []
  if (!KNOWN_SHAPES.includes(shape.name)) {
    report.add('visual-only-element', shape.at, `<${shape.name.slice(0, 80)}> is not a shape that URDF has; it is not shown.`, { element: label })
  }
  if (shape.name === 'capsule' && version === '1.0') {
    report.add('later-version-feature', shape.at, 'The capsule is new in URDF 1.1, and this file counts as 1.0.', { element: label })
  }
  if (shape.name !== 'mesh') return []
  const filename = attributesOf(text, shape).get('filename')
  if (filename && filename.value.trim() !== '') return [filename]
  report.add('mesh-missing', filename?.valueAt ?? shape.at, 'The mesh names no file; the shape is not shown.', { element: label })
  return []
}

/** Notes a picture that a material is covered with. */
export function checkMaterial({ text, report, unused }: Reading, material: XmlElement, label?: string): void {
  for (const part of unused.knownChildren('material', material, label)) {
    if (part.name !== 'texture') continue
    const filename = attributesOf(text, part).get('filename')
    const which = filename ? ` ${quoted(filename.value)}` : ''
    report.add('visual-only-element', filename?.valueAt ?? part.at, `The picture${which} concerns the looks only; it is not shown.`, label === undefined ? {} : { element: label })
  }
}
