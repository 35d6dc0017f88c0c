import { type Db, schema } from '../client'
import { entryOf, insertEntries } from './register'

const { models, revisions, sources, transitions } = schema

/** A model with its whole history, ids included. revisions: newest first. */
export interface WholeModel {
  readonly model: typeof models.$inferSelect
  readonly revisions: readonly (typeof revisions.$inferInsert & { readonly id: string })[]
  readonly bytes: Readonly<Record<string, Uint8Array>>
  readonly transitions: readonly (typeof transitions.$inferInsert)[]
}

/** Inserts models as they stand, many at a time and without a check: for filling a database from what is known to be whole. */
export const insertModels = (db: Db, whole: readonly WholeModel[]): Promise<void> =>
  db.transaction(async (inside) => {
    await inside.insert(models).values(whole.map(({ model }) => model))
    await inside.insert(revisions).values(whole.flatMap((one) => one.revisions))
    await inside.insert(sources).values(whole.flatMap(({ bytes }) => Object.entries(bytes).map(([revisionId, content]) => ({ revisionId, bytes: content }))))
    await inside.insert(transitions).values(whole.flatMap((one) => one.transitions))
    await insertEntries(inside, whole.flatMap(({ model, revisions: all }) => entryOf(model, all) ?? []))
  })
