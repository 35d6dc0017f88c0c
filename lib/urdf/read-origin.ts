import { norm } from '@/lib/math/norm'
import type { Origin, Quadruple, Triple } from '@/lib/urdf/description'
import { LARGEST, numbersOf, type ReadElement } from '@/lib/urdf/read-value'
import type { Reading } from '@/lib/urdf/reading'
import { quoted } from '@/lib/urdf/wording'

const ZERO: Triple = [0, 0, 0]
/** A quaternion whose norm differs from 1 by more is refused, as in the HTTP interface; by more than the second, mentioned. */
const REFUSED = 1e-3
const MENTIONED = 1e-6

/** The origin of a joint: identity where the element or a part of it is left out. What cannot be read is reported. */
export function readOrigin({ report, version }: Reading, element: ReadElement | undefined, label: string): Origin {
  if (!element) return { xyz: ZERO, rpy: ZERO }
  const { attributes } = element
  const triple = (name: string): Triple => {
    const attribute = attributes.get(name)
    return (attribute && (numbersOf(report, attribute, 3, LARGEST.geometry, label) as Triple | undefined)) ?? ZERO
  }
  const xyz = triple('xyz')
  const rpy = triple('rpy')
  const written = attributes.get('quat_xyzw')
  if (!written) return { xyz, rpy }
  if (attributes.has('rpy')) {
    report.add('orientation-twice', written.valueAt, `rpy=${quoted(attributes.get('rpy')!.value)} and quat_xyzw=${quoted(written.value)} are both given.`, { element: label })
  }
  if (version === '1.0') {
    report.add('later-version-feature', written.nameAt, 'quat_xyzw is new in URDF 1.1, and this file counts as 1.0.', { element: label })
  }
  const quaternion = numbersOf(report, written, 4, LARGEST.geometry, label)
  if (!quaternion) return { xyz, rpy }
  const length = norm(quaternion)
  const message = `quat_xyzw=${quoted(written.value)} has length ${Number(length.toPrecision(6))}`
  if (Math.abs(length - 1) > REFUSED) report.add('number-malformed', written.valueAt, `${message}; a rotation has length 1.`, { element: label })
  else if (Math.abs(length - 1) > MENTIONED) report.add('axis-normalised', written.valueAt, `${message}; it is divided by it.`, { element: label })
  return { xyz, quaternion: quaternion as unknown as Quadruple }
}
