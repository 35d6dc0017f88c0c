import { integer, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core'
import { revisions } from './catalog'

/** Meshes and what belongs to them that came with a revision, by their path in the archive. Their bytes are in the file storage
 *  under the digest, put there before the row. */
export const meshes = pgTable(
  'meshes',
  {
    revisionId: uuid('revision_id').notNull().references(() => revisions.id),
    path: text('path').notNull(),
    digest: text('digest').notNull(),
    /** bytes */
    size: integer('size').notNull(),
    mediaType: text('media_type').notNull(),
  },
  (table) => [primaryKey({ columns: [table.revisionId, table.path] })],
)
