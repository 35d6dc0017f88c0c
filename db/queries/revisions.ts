import { and, asc, desc, eq, getTableColumns, inArray, isNull, lt, max } from 'drizzle-orm'
import { type Db, schema } from '../client'

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

/** Sets the status of a revision and adds the line of its history. */
export async function appendTransition(db: Db, transition: Omit<typeof transitions.$inferInsert, 'ordinal'>) {
  const [last] = await db
    .select({ ordinal: max(transitions.ordinal) })
    .from(transitions)
    .where(eq(transitions.revisionId, transition.revisionId))
  await db.insert(transitions).values({ ...transition, ordinal: (last?.ordinal ?? 0) + 1 })
  await db.update(revisions).set({ status: transition.status }).where(eq(revisions.id, transition.revisionId))
}

const teamRevisions = (db: Db) =>
  db
    .select({
      slug: models.slug,
      name: models.name,
      number: revisions.number,
      id: revisions.id,
      status: revisions.status,
      importedBy: revisions.importedBy,
      importedAt: revisions.importedAt,
    })
    .from(revisions)
    .innerJoin(models, eq(models.id, revisions.modelId))

/** Revisions of a team in one status, the oldest first; of one importer only when named. */
export const listRevisionsInStatus = (db: Db, teamId: string, status: 'draft' | 'in-review', limit: number, importedBy?: string) =>
  teamRevisions(db)
    .where(
      and(
        eq(models.teamId, teamId),
        isNull(models.archivedAt),
        eq(revisions.status, status),
        importedBy === undefined ? undefined : eq(revisions.importedBy, importedBy),
      ),
    )
    .orderBy(asc(revisions.importedAt))
    .limit(limit)

/** The latest changes of status in a team, newest first. */
export const listLatestTransitions = (db: Db, teamId: string, limit: number) =>
  db
    .select({ slug: models.slug, name: models.name, number: revisions.number, transition: transitions })
    .from(transitions)
    .innerJoin(revisions, eq(revisions.id, transitions.revisionId))
    .innerJoin(models, eq(models.id, revisions.modelId))
    .where(eq(models.teamId, teamId))
    .orderBy(desc(transitions.at), desc(transitions.ordinal))
    .limit(limit)

