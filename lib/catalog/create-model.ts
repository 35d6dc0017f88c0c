import { type Db, getDb } from '@/db/client'
import { findModel, insertModel, listTakenSlugs, lockSlugs } from '@/db/queries/models'
import { findRevision } from '@/db/queries/revisions'
import type { UseCase } from '@/lib/access/use-case'
import { fail } from '@/lib/errors'
import { commonStart, deriveSlug, freeSlug } from './derive-slug'
import { presentModel } from './present-model'
import { presentRevision } from './present-revision'
import { keepFiles } from './keep-files'
import { acceptUpload } from './read-upload'
import { storeRevision } from './store-revision'

/** How often a derived slug is tried again when another request, which gives it by name, takes it in between. */
const MOST_TRIES = 5

async function insertUnderSlug(db: Db, teamId: string, name: string, slug: string | undefined, note: string | undefined, now: Date) {
  const model = { teamId, name, note: note || null, latest: 1, createdAt: now, changedAt: now }
  if (slug !== undefined) {
    return (await insertModel(db, { ...model, slug })) ?? fail('slug-taken', `Another model of this team has the slug "${slug}".`)
  }
  const stem = deriveSlug(name)
  await lockSlugs(db, teamId)
  for (let tries = 0; tries < MOST_TRIES; tries++) {
    const row = await insertModel(db, { ...model, slug: freeSlug(stem, await listTakenSlugs(db, teamId, commonStart(stem))) })
    if (row !== null) return row
  }
  fail('slug-taken', `Other models took the slugs derived from "${stem}" meanwhile. Try again, or send a slug.`)
}

/** Imports a file as revision 1 of a new model. */
export const createModel: UseCase<'createModel'> = async (caller, { form, file }) => {
  const upload = await acceptUpload(file, form.entry)
  await keepFiles(upload)
  const db = await getDb()
  const now = new Date()
  const { slug } = await db.transaction(async (inside) => {
    const model = await insertUnderSlug(inside, caller.team.id, form.name, form.slug, form.note, now)
    await storeRevision(inside, caller, { modelId: model.id, number: 1, upload, note: undefined, provenance: form, now })
    return model
  })
  const model = (await findModel(db, caller.team.id, slug))!
  const revision = (await findRevision(db, model.model.id, 1))!
  return {
    body: { model: presentModel(model), revision: await presentRevision(db, model.model, revision) },
    location: `/teams/${caller.team.slug}/models/${slug}/revisions/1`,
  }
}
