import type { Joint, Structure } from '@/lib/contract/description'
import { quaternionOf } from '@/lib/math/quaternion'
import { listChains } from '@/lib/urdf/default-chain'
import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { transformOfOrigin } from '@/lib/urdf/joint-transform'

const MOVING = new Set(['revolute', 'continuous', 'prismatic'])

/** A joint that moves on its own: not fixed, floating or planar, and no mimic. */
const isIndependent = (joint: DescribedJoint): boolean => MOVING.has(joint.type) && joint.mimic === null

export const countIndependent = (description: Description): number => description.joints.filter(isIndependent).length

function presentJoint(joint: DescribedJoint): Joint {
  const { origin } = joint
  const limits = { axis: [...joint.axis], lower: joint.lower, upper: joint.upper, rate: joint.rate, effort: joint.effort }
  return {
    name: joint.name,
    type: joint.type,
    parent: joint.parent,
    child: joint.child,
    origin: { position: [...origin.xyz], quaternion: quaternionOf(transformOfOrigin(origin)) },
    ...(MOVING.has(joint.type) ? limits : {}),
    ...(joint.mimic === null ? {} : { mimic: { ...joint.mimic } }),
  }
}

/** A description as the contract shows it. */
export function presentStructure(description: Description, digests: { fingerprint: string; sourceDigest: string }): Structure {
  return {
    robotName: description.robotName,
    fingerprint: digests.fingerprint,
    sourceDigest: digests.sourceDigest,
    counts: { links: description.links.length, joints: description.joints.length, independent: countIndependent(description) },
    rootLink: description.root,
    links: description.links.map(({ name }) => ({ name })),
    joints: description.joints.map(presentJoint),
    chains: listChains(description).map((chain) => ({ ...chain, joints: [...chain.joints] })),
  }
}
