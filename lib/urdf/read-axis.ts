import { norm } from '@/lib/math/norm'
import type { JointType, Triple } from '@/lib/urdf/description'
import { LARGEST, numbersOf, type ReadElement } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { quoted } from '@/lib/urdf/wording'

const NO_AXIS: Triple = [0, 0, 0]
const DEFAULT_AXIS: Triple = [1, 0, 0]
const SHORTEST = 1e-9
/** Six decimals of a unit vector give a length within this of 1. */
const MENTIONED = 1e-6

/** The unit axis of a joint, each component rounded to 1e-12 so that two ways of writing one direction come out the same;
 *  zero for a type that has none. What cannot be read, or is changed, is reported. jointAt: offset of the joint's tag. */
export function readAxis({ report }: Reading, element: ReadElement | undefined, type: JointType, jointAt: number, label: string): Triple {
  if (type === 'fixed' || type === 'floating') return NO_AXIS
  if (!element) {
    if (type !== 'planar') report.add('axis-defaulted', jointAt, 'No axis is given; the x axis of the joint frame is used.', { element: label })
    return DEFAULT_AXIS
  }
  const written = element.attributes.get('xyz')
  if (!written) {
    report.add('axis-zero', element.at, 'The axis has no xyz. Some programs take x, others no direction at all.', { element: label })
    return DEFAULT_AXIS
  }
  const axis = numbersOf(report, written, 3, LARGEST.geometry, label)
  if (!axis) return DEFAULT_AXIS
  const length = norm(axis)
  if (length < SHORTEST) {
    report.add('axis-zero', written.valueAt, `The axis xyz=${quoted(written.value)} has no direction.`, { element: label })
    return DEFAULT_AXIS
  }
  const unit = axis.map((part) => Math.round((part / length) * 1e12) / 1e12 + 0) as unknown as Triple
  if (Math.abs(length - 1) > MENTIONED) {
    const used = unit.map((part) => Number(part.toFixed(6)) + 0).join(' ')
    report.add('axis-normalised', written.valueAt, `The axis xyz=${quoted(written.value)} has length ${Number(length.toPrecision(6))}, not 1; ${used} is used.`, { element: label })
  }
  return unit
}
