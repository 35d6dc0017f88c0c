import { index, integer, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { instant, teams, users } from './people'

/** A key of a team for scripts and gateways. Only the SHA-256 of the key is kept. */
export const keys = pgTable(
  'keys',
  {
    /** The 12 characters that stand in the key itself. */
    id: text('id').primaryKey(),
    teamId: uuid('team_id').notNull().references(() => teams.id),
    label: text('label').notNull(),
    scopes: jsonb('scopes').$type<readonly string[]>().notNull(),
    keyDigest: text('key_digest').notNull(),
    expiresAt: instant('expires_at'),
    createdBy: uuid('created_by').notNull().references(() => users.id),
    createdAt: instant('created_at').notNull().defaultNow(),
    revokedAt: instant('revoked_at'),
    lastUsedAt: instant('last_used_at'),
    /** Counts edits, for the ETag; last use does not touch it. */
    version: integer('version').notNull().default(1),
  },
  (table) => [index('keys_by_team').on(table.teamId, table.createdAt)],
)
