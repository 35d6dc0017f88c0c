import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { createTree, type Tree } from '@/lib/urdf/tree'

/** Which joints and links of two descriptions are the same. Keys are names in `from`, values names in `to`: equal, or the new name of
 *  what was unambiguously renamed. What is missing here was removed, or added. */
export interface Matches {
  readonly joints: ReadonlyMap<string, string>
  readonly links: ReadonlyMap<string, string>
}

/** Matches by name first, anywhere in the tree. Then, from links that are matched on downwards: a joint that is left over on both sides
 *  is renamed when it has the type, the origin and the axis of the other, and no third one beside it has; the link that a matched
 *  joint carries, and the root, when neither name is known on the other side. A generator, to be run in slices. Linear. */
export function* matchElements(from: Description, to: Description): Generator<void, Matches> {
  const sides = { from: sideOf(from), to: sideOf(to) }
  const joints = sameNames(sides.from.joints, sides.to.joints)
  const links = sameNames(sides.from.links, sides.to.links)
  const waiting: string[] = []
  const matchLinks = (a: string, b: string): void => {
    if (links.has(a) || sides.to.links.has(a) || sides.from.links.has(b)) return
    links.set(a, b)
    waiting.push(a)
  }
  for (const name of links.keys()) waiting.push(name)
  matchLinks(from.root, to.root)
  for (const [a, b] of joints) {
    matchLinks(sides.from.joints.get(a)!.child, sides.to.joints.get(b)!.child)
    yield
  }
  for (let link = waiting.pop(); link !== undefined; link = waiting.pop()) {
    for (const [a, b] of renamedBelow(link, links.get(link)!, sides, links)) {
      joints.set(a.name, b.name)
      matchLinks(a.child, b.child)
    }
    yield
  }
  return { joints, links }
}

interface Side {
  readonly tree: Tree
  readonly joints: ReadonlyMap<string, DescribedJoint>
  readonly links: ReadonlyMap<string, unknown>
}

const sideOf = (description: Description): Side => ({
  tree: createTree(description),
  joints: new Map(description.joints.map((joint) => [joint.name, joint])),
  links: new Map(description.links.map((link) => [link.name, link])),
})

const sameNames = (from: ReadonlyMap<string, unknown>, to: ReadonlyMap<string, unknown>): Map<string, string> =>
  new Map([...from.keys()].filter((name) => to.has(name)).map((name) => [name, name]))

/** The joints below a matched link that have another name and nothing else. */
function renamedBelow(a: string, b: string, { from, to }: { from: Side; to: Side }, links: ReadonlyMap<string, string>) {
  const left = groupByLook(from.tree.jointsBelow(a).filter(({ name }) => !to.joints.has(name)))
  const right = groupByLook(to.tree.jointsBelow(b).filter(({ name }) => !from.joints.has(name)))
  const pairs: [DescribedJoint, DescribedJoint][] = []
  for (const [look, [one, ...more]] of left) {
    const [other, ...others] = right.get(look) ?? []
    if (one === undefined || other === undefined || more.length > 0 || others.length > 0) continue
    const carriesTheSame = links.get(one.child) === other.child || (!to.links.has(one.child) && !from.links.has(other.child))
    if (carriesTheSame) pairs.push([one, other])
  }
  return pairs
}

function groupByLook(joints: readonly DescribedJoint[]): Map<string, DescribedJoint[]> {
  const groups = new Map<string, DescribedJoint[]>()
  for (const joint of joints) {
    const look = JSON.stringify([joint.type, joint.origin, joint.axis])
    const group = groups.get(look)
    if (group === undefined) groups.set(look, [joint])
    else group.push(joint)
  }
  return groups
}
