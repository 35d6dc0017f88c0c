import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf, LARGEST, waitsForXacro } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { readNumbers } from '@/lib/urdf/read-numbers'
import { quoted } from '@/lib/urdf/wording'

const MOMENTS = ['ixx', 'ixy', 'ixz', 'iyy', 'iyz', 'izz'] as const
type Moment = (typeof MOMENTS)[number]

/** Files round their moments: as a part of their sum. A flat plate, whose two small moments add up to the third, is on the edge. */
const ROUNDING = 0.01

/** Notes a mass or an inertia tensor that no body can have. Values of nothing but zeros stand for a link without a body. */
export function checkInertia({ text, report, unused }: Reading, inertial: XmlElement, label: string): void {
  const note = (at: number, message: string): void => report.add('inertia-implausible', at, message, { element: label })
  const numberIn = (attribute: Attribute | undefined): number | null => {
    if (!attribute || waitsForXacro(attribute.value)) return null
    const numbers = readNumbers(attribute.value, 1, LARGEST.limit)
    if (!('wrong' in numbers)) return numbers[0]!
    note(attribute.valueAt, `${attribute.name}=${quoted(attribute.value)} ${numbers.wrong}.`)
    return null
  }
  for (const part of unused.knownChildren('inertial', inertial, label)) {
    const attributes = attributesOf(text, part)
    if (part.name === 'mass') {
      const mass = numberIn(attributes.get('value'))
      if (mass !== null && mass < 0) note(attributes.get('value')!.valueAt, `The mass is ${mass} kg.`)
    }
    if (part.name === 'inertia') {
      const values = MOMENTS.map((name) => (attributes.has(name) ? numberIn(attributes.get(name)) : 0))
      if (values.every((value) => value !== null) && !isOfABody(Object.fromEntries(MOMENTS.map((name, i) => [name, values[i]!])) as Record<Moment, number>)) {
        note(part.at, 'No body has these moments of inertia: each principal moment is at most the sum of the other two.')
      }
    }
  }
}

/** Whether half the trace times the identity minus the tensor, which is the second moment of the mass, is positive semidefinite:
 *  then the tensor is, and its principal moments meet the triangle inequality. Sylvester's criterion on the slightly enlarged matrix. */
function isOfABody({ ixx, ixy, ixz, iyy, iyz, izz }: Record<Moment, number>): boolean {
  const size = Math.max(...[ixx, ixy, ixz, iyy, iyz, izz].map(Math.abs))
  if (size === 0) return true
  const half = (ixx + iyy + izz) / (2 * size)
  const more = ROUNDING * Math.abs(half)
  const [x, y, z] = [half - ixx / size + more, half - iyy / size + more, half - izz / size + more]
  const [a, b, c] = [-ixy / size, -ixz / size, -iyz / size]
  return x > 0 && x * y - a * a > 0 && x * (y * z - c * c) - a * (a * z - c * b) + b * (a * c - y * b) > 0
}
