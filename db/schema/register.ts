import { sql } from 'drizzle-orm'
import { index, integer, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { models, plainText, statusEnum } from './catalog'
import { teams } from './people'

/** What the register searches, filters and sorts by: one row for each model that is not archived, derived from the model and its
 *  revisions in the transaction that changes them (db/queries/register.ts). An index for each filter gives the order of the slugs
 *  with it, so that a page costs the same at ten models and at ten thousand. */
export const registerEntries = pgTable(
  'register_entries',
  {
    modelId: uuid('model_id').primaryKey().references(() => models.id),
    teamId: uuid('team_id').notNull().references(() => teams.id),
    slug: plainText('slug').notNull(),
    /** Name, slug, note and robot name of the newest revision, folded, a line each. */
    searchText: text('search_text').notNull(),
    /** Independent joints of the newest revision. */
    independent: integer('independent').notNull(),
    /** Every status that one of its revisions has now. */
    statuses: text('statuses', { enum: statusEnum }).array().notNull(),
  },
  (table) => [
    index('register_by_slug').on(table.teamId, table.slug),
    index('register_by_joints').on(table.teamId, table.independent, table.slug),
    // What is new goes into the index at once: nobody sweeps its list of pending entries on the embedded database.
    index('register_by_text').using('gin', table.searchText.op('gin_trgm_ops')).with({ fastupdate: false }),
    ...statusEnum.map((status) => index(`register_${status.replace('-', '_')}`).on(table.teamId, table.slug).where(sql.raw(`'${status}' = any(statuses)`))),
  ],
)
