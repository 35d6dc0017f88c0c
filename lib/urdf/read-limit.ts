import type { DescribedJoint, JointType } from '@/lib/urdf/description'
import type { Attribute } from '@/lib/urdf/read-tag'
import { LARGEST, numberOf, type Attributes, type ReadElement } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { noteTurns } from '@/lib/urdf/note-turns'
import { quoted } from '@/lib/urdf/wording'

export type Limits = Pick<DescribedJoint, 'lower' | 'upper' | 'rate' | 'effort' | 'acceleration' | 'deceleration' | 'jerk'>

const NONE: Limits = { lower: null, upper: null, rate: null, effort: null, acceleration: null, deceleration: null, jerk: null }

/** The limits of a joint after defaults; none for a type that has none. jointAt: offset of the joint's tag. */
export function readLimit(reading: Reading, element: ReadElement | undefined, type: JointType, jointAt: number, label: string): Limits {
  if (type === 'fixed' || type === 'floating' || type === 'planar') return NONE
  const { report, version } = reading
  if (!element && type !== 'continuous' && version !== '1.2') {
    report.add('limit-missing', jointAt, `The joint is ${type} and has no <limit>, which URDF ${version} demands.`, { element: label })
    return NONE
  }
  const attributes: Attributes = element?.attributes ?? new Map()
  const at = element?.at ?? jointAt
  const positive = (name: string, required: boolean): number | null => readPositive(reading, attributes.get(name), name, required, at, label)
  const bounds = type === 'continuous' ? ignoreBounds(reading, attributes, label) : readBounds(reading, attributes, type, at, label)
  return {
    ...bounds,
    rate: positive('velocity', true),
    effort: numberOf(report, attributes.get('effort'), null, LARGEST.limit, label) ?? null,
    acceleration: positive('acceleration', false),
    deceleration: positive('deceleration', false),
    jerk: positive('jerk', false),
  }
}

function ignoreBounds({ report }: Reading, attributes: Attributes, label: string): Pick<Limits, 'lower' | 'upper'> {
  const met = ['lower', 'upper'].flatMap((name) => attributes.get(name) ?? [])
  if (met.length > 0) {
    const values = met.map(({ name, value }) => `${name}=${quoted(value)}`).join(' and ')
    report.add('continuous-with-range', met[0]!.valueAt, `A continuous joint turns without end; ${values} ${met.length > 1 ? 'are' : 'is'} ignored.`, { element: label })
  }
  return { lower: null, upper: null }
}

function readBounds({ report, version }: Reading, attributes: Attributes, type: JointType, at: number, label: string): Pick<Limits, 'lower' | 'upper'> {
  const standing = version === '1.2' ? null : 0
  const names = ['lower', 'upper'] as const
  const [lower, upper] = names.map((name) => numberOf(report, attributes.get(name), standing, LARGEST.limit, label))
  const missing = names.filter((name) => !attributes.has(name))
  if (missing.length > 0) {
    const what = missing.length === 2 ? 'Both bounds are left out and count' : `The ${missing[0]} bound is left out and counts`
    const locked = missing.length === 2 && standing === 0 ? ', which locks the joint there' : ''
    report.add('limit-defaulted', at, `${what} as ${standing ?? 'unbounded'} in URDF ${version}${locked}.`, { element: label })
  }
  const given = attributes.get('lower') ?? attributes.get('upper')
  if (given && typeof lower === 'number' && typeof upper === 'number') {
    if (lower > upper) report.add('limit-inverted', given.valueAt, `The lower limit ${lower} is above the upper limit ${upper}.`, { element: label })
    if (lower === upper) report.add('range-empty', given.valueAt, `The lower and the upper limit are both ${lower}.`, { element: label })
    if (type === 'revolute') noteTurns(report, attributes, lower, upper, label)
  }
  return { lower: lower ?? null, upper: upper ?? null }
}

/** A limit on speed or its derivatives; null = unknown. at: where to report one that is left out. */
function readPositive({ report, version }: Reading, written: Attribute | undefined, name: string, required: boolean, at: number, label: string): number | null {
  if (!written) {
    if (required) report.add('rate-limit-unknown', at, `No ${name} is given: the rate limit of this joint is unknown and never applied.`, { element: label })
    return null
  }
  if (!required && version !== '1.2') {
    report.add('later-version-feature', written.nameAt, `${name} is new in URDF 1.2, and this file counts as ${version}.`, { element: label })
  }
  const value = numberOf(report, written, null, LARGEST.limit, label) ?? null
  if (value === null || value > 0) return value
  report.add('rate-limit-unknown', written.valueAt, `${name}=${quoted(written.value)} is not a limit that a moving joint can have: it counts as unknown and is never applied.`, { element: label })
  return null
}
