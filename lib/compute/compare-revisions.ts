import { getDb } from '@/db/client'
import { locateRevision } from '@/lib/access/locate'
import type { UseCase } from '@/lib/access/use-case'
import { MOST_CHANGES } from '@/lib/contract/comparison'
import { fail } from '@/lib/errors'
import { finishInSlices } from '@/lib/in-slices'
import { commonGround } from './comparison/common-ground'
import { listChanges } from './comparison/list-changes'
import { matchElements } from './comparison/match-elements'
import { NO_EFFECT, tipEffect } from './comparison/tip-effect'
import { chainOf, loadRevision } from './load-chain'

const nameBefore = (number: number): string => String(Math.max(1, number - 1))

/** Two revisions of a model side by side: what happens at the tip for the same joint values, and what differs in the description. */
export const compareRevisions: UseCase<'compareRevisions'> = async (_caller, { at, query }) => {
  const db = await getDb()
  const laterRow = await locateRevision(db, at.model, query.to ?? String(at.model.model.latest))
  const earlierRow = await locateRevision(db, at.model, query.from ?? nameBefore(laterRow.number))
  const [earlier, later] = await Promise.all([loadRevision(earlierRow.id), loadRevision(laterRow.id)])
  const matches = await finishInSlices(matchElements(earlier.description, later.description))

  const to = chainOf(later, query)
  const formerNames = new Map([...matches.links].map(([from, now]) => [now, from]))
  const former = (link: string): string =>
    formerNames.get(link) ?? fail('chain-not-found', `Revision ${earlierRow.number} has no link '${link}', so there is nothing to compare it with. Name a base and a tip that both revisions have.`)
  const from = chainOf(earlier, { base: former(to.base), tip: former(to.tip) })

  const ground = commonGround(from, to, matches.joints)
  const sameKinematics = earlierRow.fingerprint === laterRow.fingerprint
  const effect = sameKinematics ? NO_EFFECT : await tipEffect(from, to, ground)
  const { changes, limits } = await finishInSlices(listChanges(earlier.description, later.description, matches))
  const leftOut = Math.max(0, changes.length - MOST_CHANGES) + Math.max(0, limits.length - MOST_CHANGES)
  const side = ({ number, status, fingerprint }: typeof laterRow) => ({ revision: number, status, fingerprint })
  return {
    body: {
      from: side(earlierRow),
      to: side(laterRow),
      sameKinematics,
      chain: {
        base: to.base,
        tip: to.tip,
        joints: ground.joints.map(({ name }) => name),
        types: ground.joints.map(({ type }) => type),
        former: { base: from.base, tip: from.tip, joints: [...ground.former] },
        held: [...ground.held],
      },
      effect,
      limits: limits.slice(0, MOST_CHANGES),
      changes: changes.slice(0, MOST_CHANGES),
      ...(leftOut === 0 ? {} : { leftOut }),
    },
  }
}
