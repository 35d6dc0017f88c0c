import { getDb } from '@/db/client'
import { listExpiringKeys } from '@/db/queries/keys'
import { countModels } from '@/db/queries/models'
import { listDrafts, listLatestTransitions } from '@/db/queries/revisions'
import type { Caller } from '@/lib/access/caller'
import { may } from '@/lib/access/permissions'
import type { Status } from '@/lib/contract/scalars'
import { getReviewQueue, type ReviewQueue } from './review-queue'

const MOST_LINES = 20
/** How long ahead an expiring key is shown. */
export const EXPIRY_NOTICE_DAYS = 30

interface RevisionLine {
  readonly model: string
  readonly name: string
  readonly revision: number
}

/** A team's first page: what waits for whom. */
export interface Desk {
  readonly queue: ReviewQueue
  /** Drafts that the caller imported. */
  readonly drafts: readonly (RevisionLine & { readonly importedAt: string })[]
  /** Keys that expire within EXPIRY_NOTICE_DAYS, for those who may see keys. */
  readonly keys: readonly { readonly id: string; readonly label: string; readonly expiresAt: string }[]
  readonly latest: readonly (RevisionLine & { readonly status: Status; readonly by: string; readonly at: string; readonly comment?: string })[]
  readonly counts: { readonly models: number; readonly released: number }
}

/** What waits for this caller in the team of the call. */
export async function getDesk(caller: Caller): Promise<Desk> {
  const db = await getDb()
  const teamId = caller.team.id
  const now = new Date()
  const until = new Date(now.getTime() + EXPIRY_NOTICE_DAYS * 86_400_000)
  const [queue, drafts, keys, latest, counts] = await Promise.all([
    getReviewQueue(db, caller, MOST_LINES),
    listDrafts(db, teamId, caller.userId, MOST_LINES),
    may(caller, 'listKeys') ? listExpiringKeys(db, teamId, now, until) : [],
    listLatestTransitions(db, teamId, MOST_LINES),
    countModels(db, teamId),
  ])
  return {
    queue,
    drafts: drafts.map((row) => ({ model: row.slug, name: row.name, revision: row.number, importedAt: row.importedAt.toISOString() })),
    keys: keys.map(({ id, label, expiresAt }) => ({ id, label, expiresAt: expiresAt!.toISOString() })),
    latest: latest.map(({ slug, name, number, transition }) => ({
      model: slug,
      name,
      revision: number,
      status: transition.status,
      by: transition.byName,
      at: transition.at.toISOString(),
      ...(transition.comment === null ? {} : { comment: transition.comment }),
    })),
    counts,
  }
}
