import { getDb } from '@/db/client'
import { listTransitions } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'
import { CHECK_SEED } from '@/lib/contract/check-vectors'
import { fail } from '@/lib/errors'
import { checkVectorsOf } from './evidence/check-vectors-of'
import { chainOf, loadRevision } from './load-chain'

/** Of a longer chain 24 configurations, poses, Jacobians and lists of singular values, at 25 bytes a number, would exceed 64 MiB. */
const MOST_JOINTS = 15_000

/** The check vectors of a revision that was released: seeded configurations with pose, Jacobian and singular values, SI. */
export const answerCheckVectors: UseCase<'getCheckVectors'> = async (caller, { at, query }) => {
  const { revision } = at
  const history = (await listTransitions(await getDb(), [revision.id])).get(revision.id) ?? []
  if (!history.some(({ status }) => status === 'released')) {
    fail('not-released', `Revision ${revision.number} is ${revision.status} and never was released; check vectors belong to what was.`)
  }
  const chain = chainOf(await loadRevision(revision.id), query)
  if (chain.joints.length > MOST_JOINTS) {
    fail('answer-too-large', `Check vectors of ${chain.joints.length} joints would exceed 64 MiB. Ask for a chain of at most ${MOST_JOINTS} joints with "base" and "tip".`)
  }
  const vectors = await checkVectorsOf(chain)
  const { slug } = at.model.model
  return {
    body: {
      model: { team: caller.team.slug, model: slug, revision: revision.number, fingerprint: revision.fingerprint },
      chain: { base: chain.base, tip: chain.tip, joints: chain.joints.map(({ name }) => name), types: chain.joints.map(({ type }) => type) },
      seed: CHECK_SEED,
      vectors,
    },
    fileName: `${slug}-revision-${revision.number}-check-vectors`,
  }
}
