import { and, asc, desc, eq, gt, isNull, lt, or, sql } from 'drizzle-orm'
import { type Db, schema } from '../client'

const { keys, teams, users } = schema

const withMaker = (db: Db) => db.select({ key: keys, createdByName: users.name }).from(keys).innerJoin(users, eq(users.id, keys.createdBy))

/** A key of this team with the name of who made it. */
export const findKey = async (db: Db, teamId: string, id: string) =>
  (await withMaker(db).where(and(eq(keys.teamId, teamId), eq(keys.id, id))).limit(1))[0] ?? null

export type KeyRow = NonNullable<Awaited<ReturnType<typeof findKey>>>

/** A key of any team with its team: only for telling who calls. */
export const findKeyOfAnyTeam = async (db: Db, id: string) =>
  (await db.select({ key: keys, team: teams }).from(keys).innerJoin(teams, eq(teams.id, keys.teamId)).where(eq(keys.id, id)).limit(1))[0] ?? null

/** Newest first. after: position of the last row of the page before. */
export const listKeyRows = (db: Db, teamId: string, limit: number, after?: { createdAt: Date; id: string }) =>
  withMaker(db)
    .where(
      and(
        eq(keys.teamId, teamId),
        after && or(lt(keys.createdAt, after.createdAt), and(eq(keys.createdAt, after.createdAt), lt(keys.id, after.id))),
      ),
    )
    .orderBy(desc(keys.createdAt), desc(keys.id))
    .limit(limit)

/** Keys in force that expire before `until`, the soonest first. */
export const listExpiringKeys = (db: Db, teamId: string, now: Date, until: Date) =>
  db
    .select({ id: keys.id, label: keys.label, expiresAt: keys.expiresAt })
    .from(keys)
    .where(and(eq(keys.teamId, teamId), isNull(keys.revokedAt), gt(keys.expiresAt, now), lt(keys.expiresAt, until)))
    .orderBy(asc(keys.expiresAt))

export const insertKey = (db: Db, key: typeof keys.$inferInsert) => db.insert(keys).values(key)

/** Changes a key that is still at `version`; false when it is not. */
export async function updateKey(db: Db, id: string, version: number, change: Partial<Pick<typeof keys.$inferInsert, 'label' | 'expiresAt'>>) {
  const rows = await db
    .update(keys)
    .set({ ...change, version: version + 1 })
    .where(and(eq(keys.id, id), eq(keys.version, version)))
    .returning({ id: keys.id })
  return rows.length === 1
}

export const revokeKeyRow = (db: Db, id: string, revokedAt: Date) =>
  db.update(keys).set({ revokedAt, version: sql`${keys.version} + 1` }).where(and(eq(keys.id, id), isNull(keys.revokedAt)))

export const touchKey = (db: Db, id: string, lastUsedAt: Date) => db.update(keys).set({ lastUsedAt }).where(eq(keys.id, id))
