import { index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { revisions } from './catalog'
import { keys } from './keys'
import { instant } from './people'

/** When a key last called a revision; no row when it never did. */
export const keyUses = pgTable(
  'key_uses',
  {
    keyId: text('key_id').notNull().references(() => keys.id),
    revisionId: uuid('revision_id').notNull().references(() => revisions.id),
    lastUsedAt: instant('last_used_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.keyId, table.revisionId] }), index('key_uses_by_revision').on(table.revisionId)],
)
