import type { DescribedJoint, Description } from '@/lib/urdf/description'

/** Where a link hangs and what hangs on it. */
export interface Tree {
  /** The joint whose child the link is; none for the root. */
  readonly jointAbove: ReadonlyMap<string, DescribedJoint>
  /** The joints whose parent the link is; empty for a leaf. */
  jointsBelow(link: string): readonly DescribedJoint[]
  has(link: string): boolean
}

/** Indexes the tree of a description. Linear. */
export function createTree(description: Description): Tree {
  const below = new Map<string, DescribedJoint[]>(description.links.map(({ name }) => [name, []]))
  const jointAbove = new Map<string, DescribedJoint>()
  for (const joint of description.joints) {
    below.get(joint.parent)!.push(joint)
    jointAbove.set(joint.child, joint)
  }
  return { jointAbove, jointsBelow: (link) => below.get(link) ?? [], has: (link) => below.has(link) }
}

/** The joints from `base` up to the nearest common ancestor, and from there down to `tip`, each in the order they are passed. */
export function findPath(tree: Tree, base: string, tip: string): { readonly up: readonly DescribedJoint[]; readonly down: readonly DescribedJoint[] } {
  const up: DescribedJoint[] = []
  const stepsUpTo = new Map<string, number>([[base, 0]])
  for (let joint = tree.jointAbove.get(base); joint; joint = tree.jointAbove.get(joint.parent)) {
    up.push(joint)
    stepsUpTo.set(joint.parent, up.length)
  }
  const down: DescribedJoint[] = []
  let link = tip
  while (!stepsUpTo.has(link)) {
    const joint = tree.jointAbove.get(link)!
    down.push(joint)
    link = joint.parent
  }
  return { up: up.slice(0, stepsUpTo.get(link)), down: down.reverse() }
}
