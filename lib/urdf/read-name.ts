import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { isUnexpanded, type Attributes } from '@/lib/urdf/read-value'
import type { Report } from '@/lib/urdf/report'
import { checkName, XML_LIMITS } from '@/lib/urdf/scan-xml'

/** The name of a link or joint, and the label by which findings call the element. name is null, and reported, where it is missing. */
export function readName(report: Report, attributes: Attributes, { at }: XmlElement, kind: 'link' | 'joint'): { name: Attribute | null; label: string } {
  const name = attributes.get('name')
  if (!name || name.value.trim() === '') {
    const label = `${kind} without a name`
    report.add('name-missing', name?.valueAt ?? at, `The ${kind} has ${name ? 'an empty' : 'no'} name.`, { element: label })
    return { name: null, label }
  }
  const label = `${kind} '${name.value.slice(0, XML_LIMITS.name)}'`
  checkName(report, name.value, name.valueAt, `this ${kind}`)
  return { name: isUnexpanded(report, name, label) ? null : name, label }
}
