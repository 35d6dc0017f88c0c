import type { Finding, Joint } from '@/lib/contract/description'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { groupBy } from './group-by'

/** One line of the joints table; SI. */
export interface JointRow extends ChainJoint {
  /** Rules of the warnings that the importer gave about this joint. */
  readonly warnings: readonly string[]
}

/** Element by which a finding names a joint. */
const elementOf = (joint: string): string => `joint '${joint}'`

/** The joints of a compiled chain, with the warnings about each. */
export function rowsOfChain(joints: readonly ChainJoint[], findings: readonly Finding[]): JointRow[] {
  const byElement = groupBy(
    findings.filter(({ severity }) => severity === 'warning'),
    ({ element }) => element,
  )
  return joints.map((joint) => ({ ...joint, warnings: [...new Set((byElement.get(elementOf(joint.name)) ?? []).map(({ rule }) => rule))] }))
}

/** The named joints as a file declares them, before a chain is compiled. */
export function jointRowsOf(declared: readonly Joint[], names: readonly string[]): JointRow[] {
  const byName = new Map(declared.map((joint) => [joint.name, joint]))
  return names.flatMap((name) => {
    const joint = byName.get(name)
    if (joint === undefined || (joint.type !== 'revolute' && joint.type !== 'continuous' && joint.type !== 'prismatic')) return []
    const { type, lower = null, upper = null, rate = null } = joint
    return [{ name, type, lower, upper, rate, warnings: [] }]
  })
}
