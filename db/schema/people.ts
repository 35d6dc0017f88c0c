import { boolean, index, pgTable, primaryKey, text, timestamp, uuid } from 'drizzle-orm/pg-core'

export const instant = (name: string) => timestamp(name, { withTimezone: true, mode: 'date', precision: 3 })

/** A person who can sign in. email: lower case. */
export const users = pgTable('users', {
  id: uuid('id').primaryKey().defaultRandom(),
  email: text('email').notNull().unique(),
  name: text('name').notNull(),
  passwordHash: text('password_hash').notNull(),
  createdAt: instant('created_at').notNull().defaultNow(),
})

/** Who owns models and keys: the boundary of every permission. */
export const teams = pgTable('teams', {
  id: uuid('id').primaryKey().defaultRandom(),
  slug: text('slug').notNull().unique(),
  name: text('name').notNull(),
  /** The releaser of a revision is neither its importer nor its submitter. */
  fourEyes: boolean('four_eyes').notNull().default(true),
  /** A draft is released only through a review. */
  reviewRequired: boolean('review_required').notNull().default(true),
  /** A revision is released only when its newest reference poses pass. */
  evidenceRequired: boolean('evidence_required').notNull().default(false),
  createdAt: instant('created_at').notNull().defaultNow(),
})

export const members = pgTable(
  'members',
  {
    teamId: uuid('team_id').notNull().references(() => teams.id),
    userId: uuid('user_id').notNull().references(() => users.id),
    role: text('role', { enum: ['reader', 'engineer', 'approver', 'administrator'] }).notNull(),
    joinedAt: instant('joined_at').notNull().defaultNow(),
  },
  (table) => [primaryKey({ columns: [table.teamId, table.userId] }), index('members_by_user').on(table.userId)],
)

/** A sign-in. The cookie carries only the id, inside next-auth's encrypted token; ending the row ends the session. */
export const sessions = pgTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: uuid('user_id').notNull().references(() => users.id),
    createdAt: instant('created_at').notNull().defaultNow(),
    lastSeenAt: instant('last_seen_at').notNull().defaultNow(),
    agent: text('agent'),
    revokedAt: instant('revoked_at'),
  },
  (table) => [index('sessions_by_user').on(table.userId)],
)
