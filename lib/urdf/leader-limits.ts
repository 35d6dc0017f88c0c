import type { ChainJoint, JointKind } from '@/lib/kinematics/chain'
import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { partOf, type Drive } from '@/lib/urdf/drives'

/** The independent joints as coordinates of a chain, by name. The range of each is its own cut with those of all joints that
 *  follow it, wherever they are in the tree: lower <= m·q + o <= upper, whose ends change places when m < 0; its rate likewise
 *  with |m|. Ranges that do not meet give lower > upper. A continuous joint that a follower bounds is revolute in the chain. */
export function coordinatesOf(description: Description, drives: ReadonlyMap<string, Drive>): ReadonlyMap<string, ChainJoint> {
  const coordinates = new Map<string, ChainJoint>()
  for (const joint of description.joints) {
    const part = partOf(joint, drives.get(joint.name)!)
    if (part.kind !== 'moving') continue
    const { leader } = part.drive
    const known = coordinates.get(leader.name) ?? { name: leader.name, type: leader.type as JointKind, lower: null, upper: null, rate: null }
    coordinates.set(leader.name, cut(known, joint, part.drive))
  }
  return coordinates
}

function cut(coordinate: ChainJoint, joint: DescribedJoint, { multiplier, offset }: Drive): ChainJoint {
  const mapped = (bound: number | null): number | null => (bound === null ? null : finite((bound - offset) / multiplier))
  const [low, high] = multiplier > 0 ? [joint.lower, joint.upper] : [joint.upper, joint.lower]
  const lower = tighter(Math.max, coordinate.lower, mapped(low))
  const upper = tighter(Math.min, coordinate.upper, mapped(high))
  const rate = tighter(Math.min, coordinate.rate, joint.rate === null ? null : finite(joint.rate / Math.abs(multiplier)))
  const bounded = lower !== null || upper !== null
  return { ...coordinate, type: coordinate.type === 'continuous' && bounded ? 'revolute' : coordinate.type, lower, upper, rate }
}

/** A bound that is too far away for binary64 is none. -0 becomes 0. */
const finite = (value: number): number | null => (Number.isFinite(value) ? value + 0 : null)

const tighter = (choose: (a: number, b: number) => number, a: number | null, b: number | null): number | null =>
  a === null ? b : b === null ? a : choose(a, b)
