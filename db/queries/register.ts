import { and, asc, desc, eq, gt, isNull, sql } from 'drizzle-orm'
import { type Db, schema } from '../client'
import { foldText, searchTextOf } from './search-text'

const { models, registerEntries, revisions } = schema

type Status = (typeof revisions.$inferSelect)['status']

/** Entries that one statement writes: far below the 65 535 parameters that PostgreSQL takes. */
const MOST_AT_ONCE = 500

/** What the register says of a model: null for one that is archived or has no revision yet. */
export function entryOf(
  model: Pick<typeof models.$inferSelect, 'id' | 'teamId' | 'slug' | 'name' | 'note' | 'archivedAt'>,
  newestFirst: readonly { readonly robotName: string; readonly independent: number; readonly status: Status }[],
): typeof registerEntries.$inferInsert | null {
  const newest = newestFirst[0]
  if (newest === undefined || model.archivedAt !== null) return null
  return {
    modelId: model.id,
    teamId: model.teamId,
    slug: model.slug,
    searchText: searchTextOf([model.name, model.slug, model.note, newest.robotName]),
    independent: newest.independent,
    statuses: [...new Set(newestFirst.map(({ status }) => status))],
  }
}

/** Brings the entry of a model up to date. To be called in the transaction that changed the model or a revision of it. */
export async function refreshEntry(db: Db, modelId: string): Promise<void> {
  const [model] = await db.select().from(models).where(eq(models.id, modelId))
  const newestFirst = await db
    .select({ robotName: revisions.robotName, independent: revisions.independent, status: revisions.status })
    .from(revisions)
    .where(eq(revisions.modelId, modelId))
    .orderBy(desc(revisions.number))
  const entry = entryOf(model!, newestFirst)
  if (entry === null) await db.delete(registerEntries).where(eq(registerEntries.modelId, modelId))
  else await db.insert(registerEntries).values(entry).onConflictDoUpdate({ target: registerEntries.modelId, set: entry })
}

export async function insertEntries(db: Db, entries: readonly (typeof registerEntries.$inferInsert)[]): Promise<void> {
  for (let from = 0; from < entries.length; from += MOST_AT_ONCE) await db.insert(registerEntries).values(entries.slice(from, from + MOST_AT_ONCE))
}

/** Makes the entries that are missing: those of models that were stored before there was a register. */
export async function fillRegister(db: Db): Promise<void> {
  const missing = await db
    .select({ id: models.id })
    .from(models)
    .leftJoin(registerEntries, eq(registerEntries.modelId, models.id))
    .where(and(isNull(models.archivedAt), isNull(registerEntries.modelId)))
  for (const { id } of missing) {
    await db.transaction(async (inside) => {
      // Under the lock of the model, so that a change of it by another process is not overwritten by what was before.
      await inside.select({ id: models.id }).from(models).where(eq(models.id, id)).for('update')
      await refreshEntry(inside, id)
    })
  }
}

export interface RegisterFilter {
  readonly query?: string
  readonly status?: Status
  readonly joints?: number
}

const containing = (text: string) => `%${text.replace(/[\\%_]/g, '\\$&')}%`

/** The slugs and models of a page of the register, in slug order. after: slug of the last row of the page before. */
export function registerPage(db: Db, teamId: string, { query, status, joints }: RegisterFilter, limit: number, after?: string) {
  const { independent, searchText, slug, teamId: team } = registerEntries
  const words = query === undefined ? '' : foldText(query)
  return db
    .select({ modelId: registerEntries.modelId, slug })
    .from(registerEntries)
    .where(
      and(
        eq(team, teamId),
        after === undefined ? undefined : gt(slug, after),
        words === '' ? undefined : sql`${searchText} like ${containing(words)}`,
        joints === undefined ? undefined : eq(independent, joints),
        // In the words of the index, which a parameter would hide from the planner. The statuses are ours.
        status === undefined ? undefined : sql.raw(`'${status}' = any("register_entries"."statuses")`),
      ),
    )
    .orderBy(asc(slug))
    .limit(limit)
}
