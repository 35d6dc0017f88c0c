import { boolean, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { revisions } from './catalog'
import { instant, users } from './people'

/** Measured poses that were held against a revision, with what came out. Append-only: nothing here is ever changed or removed. */
export const referencePoses = pgTable(
  'reference_poses',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    revisionId: uuid('revision_id').notNull().references(() => revisions.id),
    /** Counts from 1 within the revision. */
    number: integer('number').notNull(),
    /** Name at the time of the act, kept as it was. */
    byName: text('by_name').notNull(),
    byUser: uuid('by_user').references(() => users.id),
    at: instant('at').notNull(),
    note: text('note'),
    passed: boolean('passed').notNull(),
    /** The outcome without its rows, as the contract shows it. */
    outcome: jsonb('outcome').$type<Readonly<Record<string, unknown>>>().notNull(),
    rows: jsonb('rows').$type<readonly unknown[]>().notNull(),
    /** The table as it was sent. */
    source: text('source').notNull(),
  },
  (table) => [unique('reference_poses_revision_number').on(table.revisionId, table.number)],
)
