import type { DescribedJoint, Description, Origin } from '@/lib/urdf/description'

/** The kinematic content of a description as one JSON text (RFC 8785): what enters the computation and nothing else, links and
 *  joints sorted by name, so that equal texts compute equal numbers. The names of the robot and of its meshes, the version, and
 *  the order of the file do not enter. ECMAScript writes numbers and strings as the RFC asks (-0 as 0); its other demand, members
 *  sorted by UTF-16 code units, is met by the order in which they stand below. */
export function canonicalContent(description: Description): string {
  const byName = (a: { name: string }, b: { name: string }): number => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0)
  return JSON.stringify({
    joints: description.joints.toSorted(byName).map(jointContent),
    links: description.links.map(({ name }) => name).sort(),
  })
}

const jointContent = (joint: DescribedJoint): object => ({
  acceleration: joint.acceleration,
  axis: joint.axis,
  child: joint.child,
  deceleration: joint.deceleration,
  effort: joint.effort,
  jerk: joint.jerk,
  lower: joint.lower,
  mimic: joint.mimic && { joint: joint.mimic.joint, multiplier: joint.mimic.multiplier, offset: joint.mimic.offset },
  name: joint.name,
  origin: originContent(joint.origin),
  parent: joint.parent,
  rate: joint.rate,
  type: joint.type,
  upper: joint.upper,
})

const originContent = (origin: Origin): object =>
  'rpy' in origin ? { rpy: origin.rpy, xyz: origin.xyz } : { quaternion: origin.quaternion, xyz: origin.xyz }
