import { and, asc, desc, eq, getTableColumns, inArray, isNull, lt, max, sql } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import { type Db, schema } from '../client'
import { refreshEntry } from './register'

const { models, revisions, sources, transitions, users } = schema

const { description: _description, findings: _findings, ...light } = getTableColumns(revisions)

const lightRevisions = (db: Db) =>
  db.select({ ...light, importedByName: users.name }).from(revisions).leftJoin(users, eq(users.id, revisions.importedBy))

/** A revision without its description and findings, which are large and read on demand. */
export const findRevision = async (db: Db, modelId: string, number: number) =>
  (await lightRevisions(db).where(and(eq(revisions.modelId, modelId), eq(revisions.number, number))).limit(1))[0] ?? null

export type RevisionRow = NonNullable<Awaited<ReturnType<typeof findRevision>>>

/** Newest first. before: number of the last row of the page before. */
export const listRevisionRows = (db: Db, modelId: string, limit: number, before?: number) =>
  db
    .select({ ...light, importedByName: users.name, findings: revisions.findings })
    .from(revisions)
    .leftJoin(users, eq(users.id, revisions.importedBy))
    .where(and(eq(revisions.modelId, modelId), before === undefined ? undefined : lt(revisions.number, before)))
    .orderBy(desc(revisions.number))
    .limit(limit)

export const findRevisionByFingerprint = async (db: Db, modelId: string, fingerprint: string) =>
  (
    await db
      .select({ number: revisions.number })
      .from(revisions)
      .where(and(eq(revisions.modelId, modelId), eq(revisions.fingerprint, fingerprint)))
      .orderBy(desc(revisions.number))
      .limit(1)
  )[0] ?? null

export async function getDescription(db: Db, revisionId: string) {
  const [row] = await db.select({ description: revisions.description }).from(revisions).where(eq(revisions.id, revisionId))
  return row!.description
}

export async function getFindingRows(db: Db, revisionId: string) {
  const [row] = await db.select({ findings: revisions.findings }).from(revisions).where(eq(revisions.id, revisionId))
  return row!.findings
}

export async function getSourceBytes(db: Db, revisionId: string) {
  const [row] = await db.select({ bytes: sources.bytes }).from(sources).where(eq(sources.revisionId, revisionId))
  return row!.bytes
}

export async function insertRevision(db: Db, revision: typeof revisions.$inferInsert, bytes: Uint8Array) {
  const [row] = await db.insert(revisions).values(revision).returning({ id: revisions.id })
  await db.insert(sources).values({ revisionId: row!.id, bytes })
  return row!.id
}

/** The statuses a revision has had, oldest first; of several revisions at once, by revision. */
export async function listTransitions(db: Db, revisionIds: readonly string[]) {
  const rows =
    revisionIds.length === 0
      ? []
      : await db
          .select()
          .from(transitions)
          .where(inArray(transitions.revisionId, [...revisionIds]))
          .orderBy(asc(transitions.ordinal))
  const byRevision = new Map<string, typeof rows>()
  for (const row of rows) byRevision.set(row.revisionId, [...(byRevision.get(row.revisionId) ?? []), row])
  return byRevision
}

export type TransitionRow = typeof transitions.$inferSelect

/** Sets the status of a revision, adds the line of its history, and brings the register up to date. */
export async function appendTransition(db: Db, transition: Omit<typeof transitions.$inferInsert, 'ordinal' | 'teamId'>) {
  const { revisionId, status } = transition
  const [place] = await db
    .select({ modelId: models.id, teamId: models.teamId })
    .from(revisions)
    .innerJoin(models, eq(models.id, revisions.modelId))
    .where(eq(revisions.id, revisionId))
  const [last] = await db.select({ ordinal: max(transitions.ordinal) }).from(transitions).where(eq(transitions.revisionId, revisionId))
  const { modelId, teamId } = place!
  await db.insert(transitions).values({ ...transition, teamId, ordinal: (last?.ordinal ?? 0) + 1 })
  await db.update(revisions).set({ status }).where(eq(revisions.id, revisionId))
  await refreshEntry(db, modelId)
}

/** Drafts of one importer in a team, the oldest first. */
export const listDrafts = (db: Db, teamId: string, importedBy: string, limit: number) =>
  db
    .select({ slug: models.slug, name: models.name, number: revisions.number, importedAt: revisions.importedAt })
    .from(revisions)
    .innerJoin(models, eq(models.id, revisions.modelId))
    // In the words of the index, which a parameter would hide from the planner; so below.
    .where(and(eq(models.teamId, teamId), isNull(models.archivedAt), sql`${revisions.status} = 'draft'`, eq(revisions.importedBy, importedBy)))
    .orderBy(asc(revisions.importedAt))
    .limit(limit)

/** Revisions of a team that are in review, the longest waiting first, each with its last submission and the revision in force that it
 *  would supersede. total: how many there are. */
export function listReviews(db: Db, teamId: string, limit: number) {
  const inForce = alias(revisions, 'in_force')
  const submission = db
    .select({ at: transitions.at, byName: transitions.byName, byUser: transitions.byUser })
    .from(transitions)
    .where(and(eq(transitions.revisionId, revisions.id), eq(transitions.status, 'in-review')))
    .orderBy(desc(transitions.ordinal))
    .limit(1)
    .as('submission')
  return db
    .select({
      slug: models.slug,
      name: models.name,
      number: revisions.number,
      fingerprint: revisions.fingerprint,
      independent: revisions.independent,
      importedBy: revisions.importedBy,
      submission: { at: submission.at, byName: submission.byName, byUser: submission.byUser },
      inForce: { number: inForce.number, fingerprint: inForce.fingerprint, independent: inForce.independent },
      total: sql<number>`(count(*) over ())::int`,
    })
    .from(revisions)
    .innerJoin(models, eq(models.id, revisions.modelId))
    .innerJoinLateral(submission, sql`true`)
    .leftJoin(inForce, and(eq(inForce.modelId, models.id), eq(inForce.number, models.released)))
    .where(and(eq(models.teamId, teamId), isNull(models.archivedAt), sql`${revisions.status} = 'in-review'`))
    .orderBy(asc(submission.at), asc(models.slug), asc(revisions.number))
    .limit(limit)
}

/** The latest changes of status in a team, newest first. */
export function listLatestTransitions(db: Db, teamId: string, limit: number) {
  // The few first, and then what belongs to them: whatever the planner thinks of the sizes, it reads no whole table.
  const latest = db
    .select()
    .from(transitions)
    .where(eq(transitions.teamId, teamId))
    .orderBy(desc(transitions.at), desc(transitions.ordinal))
    .limit(limit)
    .as('latest')
  const { status, byName, at, comment } = latest
  return db
    .select({ slug: models.slug, name: models.name, number: revisions.number, transition: { status, byName, at, comment } })
    .from(latest)
    .innerJoin(revisions, eq(revisions.id, latest.revisionId))
    .innerJoin(models, eq(models.id, revisions.modelId))
    .orderBy(desc(latest.at), desc(latest.ordinal))
}
