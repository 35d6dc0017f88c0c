import { readNumbers } from '@/lib/urdf/read-numbers'
import { isFault, readTag, type Attribute } from '@/lib/urdf/read-tag'
import type { XmlElement } from '@/lib/urdf/read-tree'
import type { Report } from '@/lib/urdf/report'
import { quoted } from '@/lib/urdf/wording'

/** Magnitudes beyond these are refused. geometry: the bound that the HTTP interface sets on its inputs; limit: bounds and rates
 *  only have to survive being subtracted, squared and converted, and files write 1e16 for 'none'. */
export const LARGEST = { geometry: 1e9, limit: 1e30 } as const

export type Attributes = ReadonlyMap<string, Attribute>

/** An element whose attributes have been read. */
export interface ReadElement {
  readonly at: number
  readonly attributes: Attributes
}

/** The attributes of an element by name. */
export function attributesOf(text: string, element: XmlElement): Attributes {
  const tag = readTag(text, element.at)
  if (isFault(tag)) throw new Error(`The tag at ${element.at} passed the scan and cannot be read: ${tag.message}`)
  return new Map(tag.attributes.map((attribute) => [attribute.name, attribute]))
}

/** Whether a value was to be put in by xacro. */
export const waitsForXacro = (value: string): boolean => /\$[{(]/.test(value)

/** Whether a value still waits for xacro; reported where it does. element: such as "joint 'wrist'". */
export function isUnexpanded(report: Report, attribute: Attribute, element: string): boolean {
  if (!waitsForXacro(attribute.value)) return false
  report.add('xacro-unexpanded', attribute.valueAt, `${attribute.name}=${quoted(attribute.value)} still waits for xacro to put in a value.`, { element })
  return true
}

/** The numbers of an attribute; undefined, and reported, where they cannot be read.
 *  count: how many are expected; largest: their greatest magnitude. */
export function numbersOf(report: Report, attribute: Attribute, count: number, largest: number, element: string): readonly number[] | undefined {
  if (isUnexpanded(report, attribute, element)) return undefined
  const numbers = readNumbers(attribute.value, count, largest)
  if (!('wrong' in numbers)) return numbers
  report.add('number-malformed', attribute.valueAt, `${attribute.name}=${quoted(attribute.value)} ${numbers.wrong}.`, { element })
  return undefined
}

/** A single number, `fallback` where the attribute is left out; undefined, and reported, where it cannot be read. */
export function numberOf<T>(report: Report, attribute: Attribute | undefined, fallback: T, largest: number, element: string): number | T | undefined {
  return attribute ? numbersOf(report, attribute, 1, largest, element)?.[0] : fallback
}
