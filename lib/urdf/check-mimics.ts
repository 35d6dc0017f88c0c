import { findLoops } from '@/lib/urdf/find-loops'
import { moves, type DraftJoint } from '@/lib/urdf/read-joint'
import type { Report } from '@/lib/urdf/report'
import { createSimilarName } from '@/lib/urdf/similar-name'
import { leavesRange } from '@/lib/urdf/leaves-range'
import { listed, quoted } from '@/lib/urdf/wording'

interface Follows {
  readonly joint: DraftJoint
  readonly parent: string
  readonly child: string
}

/** Reports mimics that follow nothing, themselves or each other, and warns of those whose leader has no coordinate. */
export function checkMimics(report: Report, joints: ReadonlyMap<string, DraftJoint>): void {
  const similar = createSimilarName([...joints.keys()])
  const into = new Map<string, Follows[]>([...joints.keys()].map((name) => [name, []]))
  for (const [name, joint] of joints) {
    if (!joint.mimic) continue
    const { value: leader, valueAt } = joint.mimic.joint
    if (leader === name) report.add('mimic-self', valueAt, 'The joint mimics itself.', { element: joint.label })
    else if (joints.has(leader)) into.get(name)!.push({ joint, parent: leader, child: name })
    else {
      const meant = similar(leader)
      const hint = meant === undefined ? '' : ` The file has ${quoted(meant)}.`
      report.add('mimic-missing', valueAt, `The joint mimics ${quoted(leader)}, which is not a joint of this file.${hint}`, { element: joint.label })
    }
  }
  for (const loop of findLoops(into)) {
    const { joint } = loop.reduce((last, follows) => (follows.joint.at > last.joint.at ? follows : last))
    const names = loop.map((follows) => follows.child)
    report.add('mimic-cycle', joint.mimic!.joint.valueAt, `The joints ${listed(names)} mimic each other in a circle.`, { element: joint.label })
  }
  warnOfLeaders(report, joints, into)
}

/** Walks down from the joints that follow none, so that each joint is told its leader once. */
function warnOfLeaders(report: Report, joints: ReadonlyMap<string, DraftJoint>, into: ReadonlyMap<string, readonly Follows[]>): void {
  const followers = new Map<string, string[]>()
  for (const { parent, child } of [...into.values()].flat()) {
    const known = followers.get(parent)
    if (known) known.push(child)
    else followers.set(parent, [child])
  }
  const settled = [...joints.keys()].filter((name) => into.get(name)!.length === 0).map((name) => ({ name, leader: name, multiplier: 1, offset: 0 }))
  for (const { name, leader, ...drive } of settled) {
    for (const follower of followers.get(name) ?? []) {
      const { label, mimic, limits } = joints.get(follower)!
      const multiplier = mimic!.multiplier * drive.multiplier
      const offset = mimic!.multiplier * drive.offset + mimic!.offset
      settled.push({ name: follower, leader, multiplier, offset })
      const { type, limits: range } = joints.get(leader)!
      if (type === null || moves(type)) {
        const leaves = range && limits && leavesRange(range, limits, multiplier, offset)
        if (leaves) report.add('mimic-leaves-range', mimic!.joint.valueAt, `Following ${quoted(leader)} over its range, the joint would come to ${leaves}.`, { element: label })
      } else if (type === 'fixed') {
        report.add('mimic-of-fixed', mimic!.joint.valueAt, `The joint follows ${quoted(leader)}, which is fixed; it is held at its offset.`, { element: label })
      } else {
        report.add('floating-or-planar', mimic!.joint.valueAt, `The joint follows ${quoted(leader)}, which is ${type}: chains that pass through it are not computed.`, { element: label })
      }
    }
  }
}
