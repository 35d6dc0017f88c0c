import { and, asc, count, eq, inArray, isNull, sql } from 'drizzle-orm'
import { type Db, schema } from '../client'

const { members, sessions, teams, users } = schema

export const findUserByEmail = async (db: Db, email: string) =>
  (await db.select().from(users).where(eq(users.email, email.toLowerCase())).limit(1))[0] ?? null

export const countUsers = async (db: Db): Promise<number> => (await db.select({ n: count() }).from(users))[0]?.n ?? 0

export async function insertUser(db: Db, user: { email: string; name: string; passwordHash: string }) {
  const [row] = await db.insert(users).values({ ...user, email: user.email.toLowerCase() }).returning()
  return row!
}

export async function insertTeam(db: Db, team: typeof teams.$inferInsert) {
  const [row] = await db.insert(teams).values(team).returning()
  return row!
}

export const findTeamBySlug = async (db: Db, slug: string) =>
  (await db.select().from(teams).where(eq(teams.slug, slug)).limit(1))[0] ?? null

export const insertMember = (db: Db, member: typeof members.$inferInsert) => db.insert(members).values(member)

/** The team of this slug with the person's role in it; null when the person is no member. */
export async function findMembership(db: Db, userId: string, teamSlug: string) {
  const [row] = await db
    .select({ team: teams, role: members.role })
    .from(members)
    .innerJoin(teams, eq(teams.id, members.teamId))
    .where(and(eq(members.userId, userId), eq(teams.slug, teamSlug)))
    .limit(1)
  return row ?? null
}

/** The people of a team with one of these roles, by name. */
export const listPeopleWithRole = (db: Db, teamId: string, roles: readonly (typeof members.$inferSelect)['role'][]) =>
  db
    .select({ id: users.id, name: users.name })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.teamId, teamId), inArray(members.role, [...roles])))
    .orderBy(asc(users.name), asc(users.id))

export const listMemberships = (db: Db, userId: string) =>
  db
    .select({ slug: teams.slug, name: teams.name, role: members.role })
    .from(members)
    .innerJoin(teams, eq(teams.id, members.teamId))
    .where(eq(members.userId, userId))
    .orderBy(asc(teams.name))

export const insertSession = (db: Db, session: typeof sessions.$inferInsert) => db.insert(sessions).values(session)

/** A session that was not ended, with its person. */
export async function findSession(db: Db, id: string) {
  const [row] = await db
    .select({ id: sessions.id, createdAt: sessions.createdAt, userId: users.id, name: users.name, email: users.email })
    .from(sessions)
    .innerJoin(users, eq(users.id, sessions.userId))
    .where(and(eq(sessions.id, id), isNull(sessions.revokedAt)))
    .limit(1)
  return row ?? null
}

export const touchSession = (db: Db, id: string, lastSeenAt: Date) => db.update(sessions).set({ lastSeenAt }).where(eq(sessions.id, id))

export const endSession = (db: Db, id: string, revokedAt: Date) =>
  db.update(sessions).set({ revokedAt }).where(and(eq(sessions.id, id), isNull(sessions.revokedAt)))

/** Lets one transaction at a time set an installation up. */
export const lockSetup = (db: Db) => db.execute(sql`select pg_advisory_xact_lock(7366253)`)
