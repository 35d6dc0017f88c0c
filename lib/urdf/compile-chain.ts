import { fail } from '@/lib/errors'
import type { Chain, ChainJoint, Motion } from '@/lib/kinematics/chain'
import { identityTransform, invertTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import { defaultChain } from '@/lib/urdf/default-chain'
import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { partOf, resolveDrives } from '@/lib/urdf/drives'
import { stillTransform, transformOfOrigin } from '@/lib/urdf/joint-transform'
import { coordinatesOf } from '@/lib/urdf/leader-limits'
import { createTree, findPath } from '@/lib/urdf/tree'

/** The chain between any two links of the tree, ready to compute with and frozen. base left out: the root; tip left out: that of
 *  the default chain. Equal links, and links joined by fixed joints only, give a chain without joints.
 *  Fails with chain-not-found for a link that does not exist, and with chain-not-computable where the path passes a floating or
 *  planar joint (or a joint that follows one), or where no tip is given and there is no default chain. */
export function compileChain(description: Description, base: string = description.root, tip: string = defaultTip(description)): Chain {
  const tree = createTree(description)
  for (const link of [base, tip]) if (!tree.has(link)) fail('chain-not-found', `The model has no link '${link}'.`)
  const { up, down } = findPath(tree, base, tip)
  const drives = resolveDrives(description)
  const coordinates = coordinatesOf(description, drives)
  const joints: ChainJoint[] = []
  const places = new Map<string, number>()
  const motions: Motion[] = []
  const constants: number[][] = []
  const constant = identityTransform()
  const append = (transform: Float64Array): void => multiplyTransforms(constant, 0, transform, 0, constant, 0)

  const addMotion = (joint: DescribedJoint, link: string, leader: string, multiplier: number, offset: number, sign: 1 | -1): void => {
    let place = places.get(leader)
    if (place === undefined) {
      place = joints.push(coordinates.get(leader)!) - 1
      places.set(leader, place)
    }
    const [x, y, z] = joint.axis
    const axis = [sign * x + 0, sign * y + 0, sign * z + 0] as const
    motions.push({ name: joint.name, link, rotary: joint.type !== 'prismatic', axis, joint: place, multiplier, offset })
    constants.push([...constant])
    constant.set(identityTransform())
  }

  const pass = (joint: DescribedJoint, upward: boolean): void => {
    const part = partOf(joint, drives.get(joint.name)!)
    if (part.kind === 'not-computable') fail('chain-not-computable', whyNot(joint, base, tip))
    const parentFromChild = part.kind === 'still' ? stillTransform(joint, part.value) : transformOfOrigin(joint.origin)
    if (!upward) append(parentFromChild)
    if (part.kind === 'moving') {
      const { leader, multiplier, offset } = part.drive
      addMotion(joint, upward ? joint.parent : joint.child, leader.name, multiplier, offset, upward ? -1 : 1)
    }
    if (upward) append(inverse(parentFromChild))
  }
  for (const joint of up) pass(joint, true)
  for (const joint of down) pass(joint, false)
  constants.push([...constant])
  return frozen({ base, tip, joints, motions, constants })
}

function defaultTip(description: Description): string {
  return defaultChain(description)?.tip ?? fail('chain-not-computable', 'No chain of this model from its root to a leaf can be computed: each passes a floating or planar joint.')
}

const whyNot = (joint: DescribedJoint, base: string, tip: string): string =>
  `The chain from '${base}' to '${tip}' passes the joint '${joint.name}', which ${
    joint.type === 'floating' || joint.type === 'planar' ? `is ${joint.type}` : 'follows a joint that cannot be computed'
  }.`

function inverse(transform: Float64Array): Float64Array {
  const inverted = identityTransform()
  invertTransform(transform, inverted)
  return inverted
}

function frozen(chain: Chain): Chain {
  for (const motion of chain.motions) Object.freeze(Object.freeze(motion).axis)
  for (const list of [chain.joints, chain.motions, chain.constants]) {
    for (const entry of list) Object.freeze(entry)
    Object.freeze(list)
  }
  return Object.freeze(chain)
}
