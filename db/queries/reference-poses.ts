import { and, desc, eq, getTableColumns, lt, max } from 'drizzle-orm'
import { type Db, schema } from '../client'

const { referencePoses } = schema

const { rows: _rows, source: _source, ...light } = getTableColumns(referencePoses)

/** A set of reference poses without its rows and its table, which are large and read on demand. */
export const findReferencePoses = async (db: Db, revisionId: string, number: number) =>
  (
    await db
      .select(light)
      .from(referencePoses)
      .where(and(eq(referencePoses.revisionId, revisionId), eq(referencePoses.number, number)))
      .limit(1)
  )[0] ?? null

export type ReferencePosesRow = NonNullable<Awaited<ReturnType<typeof findReferencePoses>>>

/** Newest first. before: number of the last row of the page before. */
export const listReferencePosesRows = (db: Db, revisionId: string, limit: number, before?: number) =>
  db
    .select(light)
    .from(referencePoses)
    .where(and(eq(referencePoses.revisionId, revisionId), before === undefined ? undefined : lt(referencePoses.number, before)))
    .orderBy(desc(referencePoses.number))
    .limit(limit)

/** Number and verdict of the newest set of a revision; null when it has none. */
export const findNewestVerdict = async (db: Db, revisionId: string) =>
  (
    await db
      .select({ number: referencePoses.number, passed: referencePoses.passed })
      .from(referencePoses)
      .where(eq(referencePoses.revisionId, revisionId))
      .orderBy(desc(referencePoses.number))
      .limit(1)
  )[0] ?? null

export async function getReferencePosesContent(db: Db, id: string) {
  const [row] = await db.select({ rows: referencePoses.rows, source: referencePoses.source }).from(referencePoses).where(eq(referencePoses.id, id))
  return row!
}

/** Stores a set under the next number of its revision. To be called with the model locked. */
export async function insertReferencePoses(db: Db, set: Omit<typeof referencePoses.$inferInsert, 'number'>): Promise<number> {
  const [last] = await db.select({ number: max(referencePoses.number) }).from(referencePoses).where(eq(referencePoses.revisionId, set.revisionId))
  const number = (last?.number ?? 0) + 1
  await db.insert(referencePoses).values({ ...set, number })
  return number
}
