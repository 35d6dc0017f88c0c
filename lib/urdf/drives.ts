import type { DescribedJoint, Description } from '@/lib/urdf/description'

/** What decides the value of a joint: `multiplier * q[leader] + offset`, with all mimics between the two folded in.
 *  A joint that follows none is its own leader, with 1 and 0. */
export interface Drive {
  readonly leader: DescribedJoint
  readonly multiplier: number
  readonly offset: number
}

/** How a joint takes part in a chain: it moves with its leader, stands still at a value, or cannot be computed. */
export type Part = { readonly kind: 'moving'; readonly drive: Drive } | { readonly kind: 'still'; readonly value: number } | { readonly kind: 'not-computable' }

const MOVING = ['revolute', 'continuous', 'prismatic']

/** The drive of every joint by name. Linear, without recursion; mimics of a description have no cycles. */
export function resolveDrives(description: Description): ReadonlyMap<string, Drive> {
  const byName = new Map(description.joints.map((joint) => [joint.name, joint]))
  const drives = new Map<string, Drive>()
  for (const joint of description.joints) {
    const waiting: DescribedJoint[] = []
    let at = joint
    while (!drives.has(at.name) && at.mimic) {
      waiting.push(at)
      at = byName.get(at.mimic.joint)!
    }
    let drive = drives.get(at.name) ?? { leader: at, multiplier: 1, offset: 0 }
    drives.set(at.name, drive)
    for (const follower of waiting.reverse()) {
      const { multiplier, offset } = follower.mimic!
      drive = { leader: drive.leader, multiplier: multiplier * drive.multiplier, offset: multiplier * drive.offset + offset }
      drives.set(follower.name, drive)
    }
  }
  return drives
}

/** How a joint takes part, given its drive. A joint that follows a fixed one, or follows with a multiplier of 0, stands still
 *  at its offset; one that follows a joint of several degrees of freedom, or by numbers beyond binary64, is not computable. */
export function partOf(joint: DescribedJoint, drive: Drive): Part {
  if (joint.type === 'fixed') return { kind: 'still', value: 0 }
  if (!MOVING.includes(joint.type) || !Number.isFinite(drive.multiplier) || !Number.isFinite(drive.offset)) return { kind: 'not-computable' }
  if (drive.leader.type === 'fixed' || drive.multiplier === 0) return { kind: 'still', value: drive.offset }
  return MOVING.includes(drive.leader.type) ? { kind: 'moving', drive } : { kind: 'not-computable' }
}
