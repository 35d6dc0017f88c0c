import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { Db } from '@/db/client'
import { findModel } from '@/db/queries/models'
import { findTeamBySlug } from '@/db/queries/people'
import { createModel } from '@/lib/catalog/create-model'
import { createRevision } from '@/lib/catalog/create-revision'
import { addReferencePoses } from '@/lib/compute/add-reference-poses'
import { listReferencePoses } from '@/lib/compute/list-reference-poses'
import { getRevision } from '@/lib/catalog/get-revision'
import { transitionRevision } from '@/lib/catalog/transition-revision'
import { fail } from '@/lib/errors'
import { ask } from './ask'
import type { DemoEvidence, DemoModel } from './catalogue'

const sample = (file: string) => ({ name: file, bytes: new Uint8Array(readFileSync(path.join(import.meta.dirname, '..', file))) })

type Place = Parameters<typeof ask>[3]

/** Stores the measured poses with a revision that has none. */
async function seedEvidence(db: Db, place: Place, { by, file, ...question }: DemoEvidence): Promise<void> {
  const known = await ask(db, by, { name: 'listReferencePoses', useCase: listReferencePoses }, place, { query: {} })
  if (known.items.length > 0) return
  const table = new TextDecoder().decode(sample(file).bytes)
  await ask(db, by, { name: 'addReferencePoses', useCase: addReferencePoses }, place, { body: { ...question, table } })
}

/** Imports what is missing of a model and leads each revision on along its history, as the people of the scenario.
 *  A history that has left the scenario's path is somebody's own doing and stays as it is. */
export async function seedModel(db: Db, { team, slug, name, note, importer, revisions }: DemoModel): Promise<void> {
  const { id } = (await findTeamBySlug(db, team)) ?? fail('team-not-found')
  for (const [index, { file, note: revisionNote, provenance, evidence, history }] of revisions.entries()) {
    const number = index + 1
    const known = await findModel(db, id, slug)
    if (known === null) {
      await ask(db, importer, { name: 'createModel', useCase: createModel }, { team }, { form: { name, slug, note, ...provenance }, file: sample(file) })
    } else if (known.model.latest < number) {
      await ask(db, importer, { name: 'createRevision', useCase: createRevision }, { team, model: slug }, { form: { note: revisionNote, ...provenance }, file: sample(file) })
    }
    const place = { team, model: slug, revision: String(number) }
    if (evidence !== undefined) await seedEvidence(db, place, evidence)
    const found = await ask(db, importer, { name: 'getRevision', useCase: getRevision }, place, {})
    const path = ['draft', ...history.map(({ to }) => to)]
    const isOnPath = found.history.every(({ status }, step) => status === path[step])
    if (!isOnPath) continue
    for (const { by, to, comment } of history.slice(found.history.length - 1)) {
      await ask(db, by, { name: 'transitionRevision', useCase: transitionRevision }, place, { body: { to, comment } })
    }
  }
}
