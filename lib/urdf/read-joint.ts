import type { DescribedJoint, JointType, Origin, Triple } from '@/lib/urdf/description'
import { checkAttributes } from '@/lib/urdf/check-attributes'
import { checkNumbers } from '@/lib/urdf/check-numbers'
import { mentionMacros } from '@/lib/urdf/mention-macros'
import { readAxis } from '@/lib/urdf/read-axis'
import { readLimit, type Limits } from '@/lib/urdf/read-limit'
import { readName } from '@/lib/urdf/read-name'
import { readOrigin } from '@/lib/urdf/read-origin'
import type { Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import { attributesOf, isUnexpanded, LARGEST, numberOf, type Attributes, type ReadElement } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { listed, quoted } from '@/lib/urdf/wording'

const TYPES: readonly JointType[] = ['revolute', 'continuous', 'prismatic', 'fixed', 'floating', 'planar']

/** A joint as read, before it is known whether what it refers to exists. A part that could not be read is null and reported. */
export interface DraftJoint {
  readonly at: number
  /** Such as "joint 'wrist'". */
  readonly label: string
  readonly name: Attribute | null
  readonly type: JointType | null
  readonly parent: Attribute | null
  readonly child: Attribute | null
  readonly origin: Origin
  readonly axis: Triple
  readonly limits: Limits | null
  readonly mimic: { readonly joint: Attribute; readonly multiplier: number; readonly offset: number } | null
  /** Where the values that may be in a wrong unit are written. */
  readonly places: { readonly xyz: number | undefined; readonly rpy: number | undefined; readonly bound: number | undefined }
}

export const moves = (type: JointType | null): boolean => type === 'revolute' || type === 'continuous' || type === 'prismatic'

/** Reads a <joint> with all that is in it, and reports every fault that can be seen without looking elsewhere. */
export function readJoint(reading: Reading, element: XmlElement): DraftJoint {
  const { text, report } = reading
  const attributes = attributesOf(text, element)
  const { name, label } = readName(report, attributes, element, 'joint')
  const parts = uniqueParts(reading, element, label)
  checkAttributes(report, element.name, attributes, label)
  const type = readType(reading, attributes, element, label)
  if (type === null) checkNumbers(reading, parts, label)
  return {
    at: element.at,
    label,
    name,
    type,
    parent: readEnd(reading, parts, 'parent', element, label),
    child: readEnd(reading, parts, 'child', element, label),
    origin: readOrigin(reading, parts.get('origin'), label),
    axis: readAxis(reading, parts.get('axis'), type ?? 'fixed', element.at, label),
    limits: type && readLimit(reading, parts.get('limit'), type, element.at, label),
    mimic: moves(type) ? readMimic(reading, parts.get('mimic'), label) : null,
    places: {
      xyz: parts.get('origin')?.attributes.get('xyz')?.valueAt,
      rpy: parts.get('origin')?.attributes.get('rpy')?.valueAt,
      bound: (parts.get('limit')?.attributes.get('lower') ?? parts.get('limit')?.attributes.get('upper'))?.valueAt,
    },
  }
}

/** The described joint; only of a draft in which nothing is missing. */
export function describeJoint({ name, type, parent, child, origin, axis, limits, mimic }: DraftJoint): DescribedJoint {
  return {
    name: name!.value,
    type: type!,
    parent: parent!.value,
    child: child!.value,
    origin,
    axis,
    ...limits!,
    mimic: mimic && { joint: mimic.joint.value, multiplier: mimic.multiplier, offset: mimic.offset },
  }
}

const PARTS = ['parent', 'child', 'origin', 'axis', 'limit', 'mimic']

/** The first of each part; further ones, and macros among the parts, are reported. */
function uniqueParts(reading: Reading, joint: XmlElement, label: string): ReadonlyMap<string, ReadElement> {
  const { text, report, unused } = reading
  for (const { name, at } of joint.children) {
    if (name.startsWith('xacro:')) report.add('xacro-unexpanded', at, `<${name}> still waits for xacro to be expanded.`, { element: label })
  }
  const parts = new Map<string, ReadElement>()
  for (const part of unused.knownChildren('joint', joint, label)) {
    if (!PARTS.includes(part.name)) mentionMacros(reading, [part], label)
    else if (parts.has(part.name)) report.add('joint-incomplete', part.at, `The joint has a second <${part.name}>.`, { element: label })
    else {
      const attributes = attributesOf(text, part)
      checkAttributes(report, part.name, attributes, label)
      parts.set(part.name, { at: part.at, attributes })
    }
  }
  return parts
}

function readType({ report }: Reading, attributes: Attributes, joint: XmlElement, label: string): JointType | null {
  const written = attributes.get('type')
  if (!written) {
    report.add('joint-incomplete', joint.at, 'The joint has no type.', { element: label })
    return null
  }
  if (isUnexpanded(report, written, label)) return null
  const type = TYPES.find((known) => known === written.value)
  if (!type) {
    report.add('joint-type-unknown', written.valueAt, `type=${quoted(written.value)} is none of ${listed(TYPES)}.`, { element: label })
    return null
  }
  if (type === 'floating' || type === 'planar') {
    report.add('floating-or-planar', written.valueAt, `The joint is ${type}: chains that pass through it are not computed.`, { element: label })
  }
  return type
}

function readEnd({ report }: Reading, parts: ReadonlyMap<string, ReadElement>, which: 'parent' | 'child', joint: XmlElement, label: string): Attribute | null {
  const element = parts.get(which)
  if (!element) {
    report.add('joint-incomplete', joint.at, `The joint has no <${which}>.`, { element: label })
    return null
  }
  const link = element.attributes.get('link')
  if (!link || link.value.trim() === '') {
    report.add('joint-incomplete', element.at, `The <${which}> of the joint names no link.`, { element: label })
    return null
  }
  return isUnexpanded(report, link, label) ? null : link
}

function readMimic({ report }: Reading, element: ReadElement | undefined, label: string): DraftJoint['mimic'] {
  if (!element) return null
  const { attributes } = element
  const multiplier = numberOf(report, attributes.get('multiplier'), 1, LARGEST.geometry, label) ?? 1
  const offset = numberOf(report, attributes.get('offset'), 0, LARGEST.geometry, label) ?? 0
  const joint = attributes.get('joint')
  if (!joint) {
    report.add('mimic-missing', element.at, 'The <mimic> names no joint.', { element: label })
    return null
  }
  return isUnexpanded(report, joint, label) ? null : { joint, multiplier, offset }
}
