import type { DescribedJoint, Description, Origin } from '@/lib/urdf/description'

type Json = null | string | number | readonly Json[] | { readonly [key: string]: Json }

/** The kinematic content of a description as one JSON text (RFC 8785): what enters the computation and nothing else, links and
 *  joints sorted by name, so that equal texts compute equal numbers. The names of the robot and of its meshes, the version, and
 *  the order of the file do not enter. */
export function canonicalContent(description: Description): string {
  const byName = (a: { name: string }, b: { name: string }): number => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0)
  return serialise({
    links: description.links.map(({ name }) => name).sort(),
    joints: description.joints.toSorted(byName).map(jointContent),
  })
}

const jointContent = (joint: DescribedJoint): Json => ({
  name: joint.name,
  type: joint.type,
  parent: joint.parent,
  child: joint.child,
  origin: originContent(joint.origin),
  axis: joint.axis,
  lower: joint.lower,
  upper: joint.upper,
  rate: joint.rate,
  effort: joint.effort,
  acceleration: joint.acceleration,
  deceleration: joint.deceleration,
  jerk: joint.jerk,
  mimic: joint.mimic && { joint: joint.mimic.joint, multiplier: joint.mimic.multiplier, offset: joint.mimic.offset },
})

const originContent = (origin: Origin): Json =>
  'rpy' in origin ? { xyz: origin.xyz, rpy: origin.rpy } : { xyz: origin.xyz, quaternion: origin.quaternion }

/** RFC 8785: members sorted by UTF-16 code units, no white space; numbers and strings as ECMAScript writes them (-0 as 0). */
function serialise(value: Json): string {
  if (value === null || typeof value !== 'object') return JSON.stringify(value)
  if (isList(value)) return `[${value.map(serialise).join(',')}]`
  const members = Object.keys(value).sort().map((key) => `${JSON.stringify(key)}:${serialise(value[key]!)}`)
  return `{${members.join(',')}}`
}

const isList = (value: Json): value is readonly Json[] => Array.isArray(value)
