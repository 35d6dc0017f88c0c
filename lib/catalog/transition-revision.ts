import { type Db, getDb } from '@/db/client'
import { lockModel, setModel } from '@/db/queries/models'
import { findNewestVerdict } from '@/db/queries/reference-poses'
import { appendTransition, findRevision, listTransitions, type RevisionRow } from '@/db/queries/revisions'
import { type Caller, callerName } from '@/lib/access/caller'
import { includesRole } from '@/lib/access/roles'
import type { UseCase } from '@/lib/access/use-case'
import type { Status } from '@/lib/contract/scalars'
import { fail } from '@/lib/errors'
import { presentRevision } from './present-revision'
import { findTransition, skipsReview, TRANSITIONS } from './transition-table'

/** Fails with role-missing or transition-refused unless the caller may ask for this change from this status. */
function checkTransition(caller: Caller, from: Status, to: Status): void {
  const row = findTransition(from, to)
  const needed = row?.role ?? TRANSITIONS.find((other) => other.to === to)?.role
  if (caller.kind !== 'person') fail('session-only')
  if (needed !== undefined && !includesRole(caller.role, needed)) fail('role-missing', `This needs the role ${needed} or a higher one; yours is ${caller.role}.`)
  if (row === undefined) fail('transition-refused', `The revision is ${from}; from there it cannot become ${to}.`)
  if (skipsReview(from, to) && caller.team.reviewRequired) {
    fail('transition-refused', 'This team releases only after a review: submit the draft for review first.')
  }
}

/** Fails with evidence-missing where the team demands that the newest reference poses pass, and they do not. */
async function checkEvidence(db: Db, caller: Caller, revision: RevisionRow): Promise<void> {
  if (!caller.team.evidenceRequired) return
  const newest = await findNewestVerdict(db, revision.id)
  if (newest === null) fail('evidence-missing', 'This team releases only what was measured: store reference poses with this revision first.')
  if (!newest.passed) fail('evidence-missing', `The newest reference poses of this revision, number ${newest.number}, do not pass.`)
}

/** Fails with four-eyes when the releaser imported or last submitted the revision. */
async function checkFourEyes(db: Db, caller: Caller, revision: RevisionRow): Promise<void> {
  if (!caller.team.fourEyes) return
  const history = (await listTransitions(db, [revision.id])).get(revision.id) ?? []
  const submittedBy = history.findLast((line) => line.status === 'in-review')?.byUser
  if (revision.importedBy === caller.userId) fail('four-eyes', 'You imported this revision, so somebody else has to release it.')
  if (submittedBy === caller.userId) fail('four-eyes', 'You submitted this revision, so somebody else has to release it.')
}

/** Moves a revision to another status; a release supersedes the one in force, a withdrawal of it leaves none. */
export const transitionRevision: UseCase<'transitionRevision'> = async (caller, { at, body }) => {
  const modelId = at.model.model.id
  const db = await getDb()
  await db.transaction(async (inside) => {
    const now = new Date()
    const model = await lockModel(inside, modelId)
    // Read again under the lock: two people may press at the same moment.
    const revision = (await findRevision(inside, modelId, at.revision.number))!
    checkTransition(caller, revision.status, body.to)
    const act = { byName: callerName(caller), byUser: caller.userId, at: now }
    if (body.to === 'released') {
      await checkEvidence(inside, caller, revision)
      await checkFourEyes(inside, caller, revision)
      const former = model.released === null ? null : await findRevision(inside, modelId, model.released)
      if (former !== null) {
        const comment = `Revision ${revision.number} was released.`
        await appendTransition(inside, { ...act, revisionId: former.id, status: 'superseded', comment })
      }
    }
    await appendTransition(inside, { ...act, revisionId: revision.id, status: body.to, comment: body.comment || null })
    const released = body.to === 'released' ? revision.number : model.released === revision.number ? null : model.released
    await setModel(inside, modelId, { released }, now)
  })
  const row = (await findRevision(db, modelId, at.revision.number))!
  return { body: await presentRevision(db, at.model.model, row) }
}
