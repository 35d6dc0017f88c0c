import { revisionHref } from '@/components/import/revision-href'
import { addressOfConfiguration } from '@/components/sheet/configuration-text'
import type { Comparison } from '@/lib/contract/comparison'
import type { Chain } from '@/lib/kinematics/chain'

interface Side {
  readonly revision: number
  readonly base: string
  readonly tip: string
  /** The common joints under the names of this side, in the order of a configuration. */
  readonly joints: readonly string[]
  /** Its own chain. */
  readonly chain: Chain
}

/** The sides of a comparison, each under its own names. */
export function sidesOf({ from, to, chain }: Comparison, chains: { readonly from: Chain; readonly to: Chain }): { readonly from: Side; readonly to: Side } {
  return {
    from: { revision: from.revision, ...chain.former, chain: chains.from },
    to: { revision: to.revision, base: chain.base, tip: chain.tip, joints: chain.joints, chain: chains.to },
  }
}

/** Address of the sheet of one side, drawn at a configuration of the common joints. What is held stands at its value. */
export function worstHref(team: string, model: string, side: Side, worst: readonly number[], held: Comparison['chain']['held']): string {
  const values = new Map(held.map(({ joint, value }) => [joint, value]))
  side.joints.forEach((joint, i) => values.set(joint, worst[i]!))
  const q = addressOfConfiguration(side.chain.joints, side.chain.joints.map(({ name }) => values.get(name) ?? 0))
  return `${revisionHref(team, model, side.revision)}?${new URLSearchParams({ base: side.base, tip: side.tip, q })}`
}
