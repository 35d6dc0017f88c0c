import { sql } from 'drizzle-orm'
import { customType, index, integer, jsonb, pgTable, primaryKey, text, unique, uuid } from 'drizzle-orm/pg-core'
import type { Description, Finding } from '@/lib/urdf/description'
import { instant, teams, users } from './people'

const bytes = customType<{ data: Uint8Array; driverData: Uint8Array }>({
  dataType: () => 'bytea',
  toDriver: (value) => (Buffer.isBuffer(value) ? value : Buffer.from(value.buffer, value.byteOffset, value.byteLength)),
  fromDriver: (value) => new Uint8Array(value),
})

/** Text in code point order, so that lists and cursors read the same on every PostgreSQL, whatever its locale. */
export const plainText = customType<{ data: string; driverData: string }>({ dataType: () => 'text collate "C"' })

export const geometryEnum = ['nominal', 'calibrated'] as const

export const statusEnum = ['draft', 'in-review', 'released', 'superseded', 'withdrawn'] as const

/** A robot description under a name, with numbered revisions. latest and released repeat what `revisions` says, so that
 *  the register is one join; both are changed in the transaction that changes the revision. What else the register is asked
 *  for stands in `register_entries`. */
export const models = pgTable(
  'models',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    teamId: uuid('team_id').notNull().references(() => teams.id),
    slug: plainText('slug').notNull(),
    name: text('name').notNull(),
    note: text('note'),
    /** Number of the newest revision, which is how many there are. */
    latest: integer('latest').notNull(),
    /** Number of the revision in force. */
    released: integer('released'),
    createdAt: instant('created_at').notNull().defaultNow(),
    changedAt: instant('changed_at').notNull().defaultNow(),
    archivedAt: instant('archived_at'),
    /** Counts edits, for the ETag. */
    version: integer('version').notNull().default(1),
  },
  (table) => [unique('models_team_slug').on(table.teamId, table.slug)],
)

/** One immutable imported description; only its status moves. */
export const revisions = pgTable(
  'revisions',
  {
    id: uuid('id').primaryKey().defaultRandom(),
    modelId: uuid('model_id').notNull().references(() => models.id),
    number: integer('number').notNull(),
    status: text('status', { enum: statusEnum }).notNull(),
    fingerprint: text('fingerprint').notNull(),
    sourceDigest: text('source_digest').notNull(),
    fileName: text('file_name').notNull(),
    /** Path of the description in the archive that was uploaded; null when it was sent alone. */
    entry: text('entry'),
    robotName: text('robot_name').notNull(),
    note: text('note'),
    /** What was said of where the file comes from. */
    serialNumber: text('serial_number'),
    geometry: text('geometry', { enum: geometryEnum }),
    supplierNote: text('supplier_note'),
    independent: integer('independent').notNull(),
    description: jsonb('description').$type<Description>().notNull(),
    findings: jsonb('findings').$type<readonly Finding[]>().notNull(),
    importedBy: uuid('imported_by').references(() => users.id),
    /** Set when a key imported the file. */
    importedByKey: text('imported_by_key'),
    importedAt: instant('imported_at').notNull().defaultNow(),
  },
  (table) => [
    unique('revisions_model_number').on(table.modelId, table.number),
    index('revisions_model_fingerprint').on(table.modelId, table.fingerprint),
    index('revisions_in_review').on(table.modelId).where(sql`${table.status} = 'in-review'`),
    // A person's own drafts, on the desk.
    index('revisions_drafts').on(table.importedBy, table.importedAt).where(sql`${table.status} = 'draft'`),
  ],
)

/** The description byte for byte, apart from the rows that lists read. An archive that it came in is in the file storage under
 *  the revision's source digest. */
export const sources = pgTable('sources', {
  revisionId: uuid('revision_id').primaryKey().references(() => revisions.id),
  bytes: bytes('bytes').notNull(),
})

/** Every status a revision has had, the first included. */
export const transitions = pgTable(
  'transitions',
  {
    revisionId: uuid('revision_id').notNull().references(() => revisions.id),
    /** The team of the revision's model, so that its latest changes are one stretch of an index. */
    teamId: uuid('team_id').notNull().references(() => teams.id),
    ordinal: integer('ordinal').notNull(),
    status: text('status', { enum: statusEnum }).notNull(),
    /** Name at the time of the act, kept as it was. */
    byName: text('by_name').notNull(),
    byUser: uuid('by_user').references(() => users.id),
    at: instant('at').notNull().defaultNow(),
    comment: text('comment'),
  },
  (table) => [
    primaryKey({ columns: [table.revisionId, table.ordinal] }),
    index('transitions_latest').on(table.teamId, table.at, table.ordinal),
  ],
)
