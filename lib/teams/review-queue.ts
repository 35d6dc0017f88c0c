import type { Db } from '@/db/client'
import { listPeopleWithRole } from '@/db/queries/people'
import { listReviews } from '@/db/queries/revisions'
import type { Caller } from '@/lib/access/caller'
import { includesRole, ROLES } from '@/lib/access/roles'

/** The role that releases. */
const RELEASER = 'approver'

/** A revision in review, with what somebody who decides on it asks first. */
export interface Review {
  readonly model: string
  readonly name: string
  readonly revision: number
  readonly fingerprint: string
  /** Independent joints. */
  readonly independent: number
  readonly submittedBy: string
  readonly at: string
  /** What the caller had to do with it; under four eyes either is enough for somebody else having to release it. */
  readonly own: readonly ('imported' | 'submitted')[]
  /** Names of those who may release it, the caller included. */
  readonly releasers: readonly string[]
  /** The revision that it would supersede, and whether both compute the same numbers. */
  readonly inForce?: { readonly revision: number; readonly independent: number; readonly sameNumbers: boolean }
}

export interface ReviewQueue {
  /** The longest waiting first. */
  readonly reviews: readonly Review[]
  /** How many wait, those beyond the limit included. */
  readonly total: number
}

/** What waits for a decision in the team of the call, and for whom. */
export async function getReviewQueue(db: Db, caller: Caller, limit: number): Promise<ReviewQueue> {
  const rows = await listReviews(db, caller.team.id, limit)
  const approvers = rows.length === 0 ? [] : await listPeopleWithRole(db, caller.team.id, ROLES.filter((role) => includesRole(role, RELEASER)))
  return {
    total: rows[0]?.total ?? 0,
    reviews: rows.map(({ slug, name, number, fingerprint, independent, importedBy, submission, inForce }) => {
      const took = (userId: string | null) => [...(importedBy === userId ? (['imported'] as const) : []), ...(submission.byUser === userId ? (['submitted'] as const) : [])]
      return {
        model: slug,
        name,
        revision: number,
        fingerprint,
        independent,
        submittedBy: submission.byName,
        at: submission.at.toISOString(),
        own: took(caller.userId),
        releasers: approvers.filter(({ id }) => !caller.team.fourEyes || took(id).length === 0).map((person) => person.name),
        ...(inForce === null ? {} : { inForce: { revision: inForce.number, independent: inForce.independent, sameNumbers: inForce.fingerprint === fingerprint } }),
      }
    }),
  }
}
