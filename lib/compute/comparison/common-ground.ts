import type { HeldJoint } from '@/lib/contract/comparison'
import type { Chain, ChainJoint } from '@/lib/kinematics/chain'

/** What two chains have in common: coordinates that both can take, and how a configuration of them becomes one of either chain. */
export interface CommonGround {
  /** Named and ordered as in `to`; limits are the intersection of both. */
  readonly joints: readonly ChainJoint[]
  /** The same joints under the names of `from`. */
  readonly former: readonly string[]
  readonly held: readonly HeldJoint[]
  /** For each joint of a chain: its place among `joints`, or the value it stands at. */
  readonly from: readonly Coordinate[]
  readonly to: readonly Coordinate[]
}

export type Coordinate = { readonly place: number } | { readonly value: number }

const isRotary = ({ type }: ChainJoint) => type !== 'prismatic'

const quantityOf = (joint: ChainJoint): HeldJoint['quantity'] => (isRotary(joint) ? 'angle' : 'length')

const tighter = (choose: (a: number, b: number) => number, a: number | null, b: number | null) => (a === null ? b : b === null ? a : choose(a, b))

/** Both ranges at once. A turning joint that one side bounds is bounded. */
function meet(a: ChainJoint, b: ChainJoint): ChainJoint {
  const lower = tighter(Math.max, a.lower, b.lower)
  const upper = tighter(Math.min, a.upper, b.upper)
  const type = isRotary(b) ? (lower === null && upper === null ? 'continuous' : 'revolute') : 'prismatic'
  return { name: b.name, type, lower, upper, rate: null }
}

/** The middle between two ranges that do not meet; null where they do. */
const gapOf = ({ lower, upper }: ChainJoint): number | null => (lower !== null && upper !== null && lower > upper ? (lower + upper) / 2 : null)

/** Pairs the independent joints of two chains by `renamed` (name in `from` to name in `to`). A joint that only one chain has, or that
 *  turns in one and slides in the other, stands at 0, where a joint that is not there stands as well; one whose ranges do not meet
 *  stands in the middle of the gap, which is as near as either comes to the other. */
export function commonGround(from: Chain, to: Chain, renamed: ReadonlyMap<string, string>): CommonGround {
  const earlier = new Map(from.joints.map((joint) => [renamed.get(joint.name), joint]))
  const joints: ChainJoint[] = []
  const former: string[] = []
  const held: HeldJoint[] = []
  const fromCoordinates = new Map<string, Coordinate>()
  const toCoordinates = to.joints.map((joint): Coordinate => {
    const other = earlier.get(joint.name)
    if (other === undefined || isRotary(other) !== isRotary(joint)) {
      held.push({ joint: joint.name, in: 'to', quantity: quantityOf(joint), value: 0 })
      return { value: 0 }
    }
    const both = meet(other, joint)
    const gap = gapOf(both)
    if (gap !== null) held.push({ joint: joint.name, in: 'both', quantity: quantityOf(joint), value: gap })
    if (gap === null) former.push(other.name)
    const coordinate = gap === null ? { place: joints.push(both) - 1 } : { value: gap }
    fromCoordinates.set(other.name, coordinate)
    return coordinate
  })
  const fromCoordinatesInOrder = from.joints.map((joint): Coordinate => {
    const known = fromCoordinates.get(joint.name)
    if (known === undefined) held.push({ joint: joint.name, in: 'from', quantity: quantityOf(joint), value: 0 })
    return known ?? { value: 0 }
  })
  return { joints, former, held, from: fromCoordinatesInOrder, to: toCoordinates }
}

/** Fills `own` (a configuration of one chain) from `common` (one of the common joints). */
export function takeUp(coordinates: readonly Coordinate[], common: ArrayLike<number>, own: Float64Array): void {
  coordinates.forEach((coordinate, i) => {
    own[i] = 'place' in coordinate ? common[coordinate.place]! : coordinate.value
  })
}
