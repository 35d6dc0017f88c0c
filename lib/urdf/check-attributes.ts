import { KNOWN_ATTRIBUTES } from '@/lib/urdf/known-elements'
import type { Attributes } from '@/lib/urdf/read-value'
import type { Report } from '@/lib/urdf/report'
import { quoted } from '@/lib/urdf/wording'

/** Warns of the attributes of an element that enters the computation and that URDF does not have; those with a prefix are vendors' own. */
export function checkAttributes(report: Report, element: string, attributes: Attributes, label: string): void {
  const known = KNOWN_ATTRIBUTES[element]!
  for (const { name, value, nameAt } of attributes.values()) {
    if (known.includes(name) || name.includes(':') || name === 'xmlns') continue
    report.add('unknown-attribute', nameAt, `${name.slice(0, 80)}=${quoted(value)} of <${element}> is not an attribute that URDF has, and is ignored.`, { element: label })
  }
}
