import { and, asc, count, eq, isNull, sql } from 'drizzle-orm'
import { type Db, schema } from '../client'
import { refreshEntry, registerPage, type RegisterFilter } from './register'

const { models, revisions } = schema

const latestColumns = { status: revisions.status, fingerprint: revisions.fingerprint, independent: revisions.independent }

const withLatest = (db: Db) =>
  db
    .select({ model: models, latest: latestColumns })
    .from(models)
    .innerJoin(revisions, and(eq(revisions.modelId, models.id), eq(revisions.number, models.latest)))

/** A model of this team with what the register shows of its newest revision. */
export const findModel = async (db: Db, teamId: string, slug: string) =>
  (await withLatest(db).where(and(eq(models.teamId, teamId), eq(models.slug, slug))).limit(1))[0] ?? null

export type ModelRow = NonNullable<Awaited<ReturnType<typeof findModel>>>

/** The register in slug order. after: slug of the last row of the page before. */
export function listModelRows(db: Db, teamId: string, filter: RegisterFilter, limit: number, after?: string) {
  const page = registerPage(db, teamId, filter, limit, after).as('page')
  return db
    .select({ model: models, latest: latestColumns })
    .from(page)
    .innerJoin(models, eq(models.id, page.modelId))
    .innerJoin(revisions, and(eq(revisions.modelId, models.id), eq(revisions.number, models.latest)))
    .orderBy(asc(page.slug))
}

/** Lets one transaction at a time derive slugs in this team, so that of many imports under one name none goes without. */
export const lockSlugs = (db: Db, teamId: string) => db.execute(sql`select pg_advisory_xact_lock(7366254, hashtext(${teamId}))`)

/** Slugs of this team that begin with `start`. start: of a slug's characters only, so that nothing has to be escaped. */
export const listTakenSlugs = async (db: Db, teamId: string, start: string) =>
  (
    await db
      .select({ slug: models.slug })
      .from(models)
      .where(and(eq(models.teamId, teamId), sql`${models.slug} like ${`${start}%`}`))
  ).map((row) => row.slug)

/** Inserts a model; null when its slug is taken. */
export async function insertModel(db: Db, model: typeof models.$inferInsert) {
  const [row] = await db.insert(models).values(model).onConflictDoNothing().returning()
  return row ?? null
}

/** Changes a model that is still at `version`; false when it is not. */
export const updateModel = (db: Db, id: string, version: number, change: Partial<typeof models.$inferInsert>, now: Date): Promise<boolean> =>
  db.transaction(async (inside) => {
    const rows = await inside
      .update(models)
      .set({ ...change, changedAt: now, version: version + 1 })
      .where(and(eq(models.id, id), eq(models.version, version)))
      .returning({ id: models.id })
    if (rows.length === 1) await refreshEntry(inside, id)
    return rows.length === 1
  })

/** Takes the model for the rest of the transaction, so that revisions are numbered and released one after the other. */
export async function lockModel(db: Db, id: string) {
  const [row] = await db.select().from(models).where(eq(models.id, id)).for('update')
  return row!
}

export const setModel = (db: Db, id: string, change: Partial<typeof models.$inferInsert>, now: Date) =>
  db.update(models).set({ ...change, changedAt: now, version: sql`${models.version} + 1` }).where(eq(models.id, id))

export async function countModels(db: Db, teamId: string) {
  const [row] = await db
    .select({ models: count(), released: count(models.released) })
    .from(models)
    .where(and(eq(models.teamId, teamId), isNull(models.archivedAt)))
  return row ?? { models: 0, released: 0 }
}

