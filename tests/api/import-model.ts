import type { Revision, Model } from '@/lib/contract/model'
import { sample } from './example-request'
import { send, type Fields } from './send'
import { asPerson, type Person } from './support/callers'

export interface Imported {
  readonly model: Model
  readonly revision: Revision
}

/** A file of samples/ by its name, or the text of a URDF. */
const bytesOf = (source: string): Buffer => (source.endsWith('.urdf') ? sample(source) : Buffer.from(source))

/** Sends a file as a new model and answers the response. */
export const postModel = async (fields: Fields, source: string, by: Person = 'ines', team = 'tarnholm') =>
  send({ method: 'POST', path: `/teams/${team}/models`, headers: await asPerson(by), form: { fields, file: { name: 'robot.urdf', bytes: bytesOf(source) } } })

/** Stores a file as a new model. */
export async function importModel(name: string, source: string, by: Person = 'ines', team = 'tarnholm'): Promise<Imported> {
  const made = await postModel({ name }, source, by, team)
  if (made.status !== 201) throw new Error(`the file was not imported: ${made.status} ${made.text}`)
  return made.body as Imported
}

/** Sends a file as a further revision and answers the response. */
export const postRevision = async (slug: string, source: string, fields: Fields = {}, by: Person = 'ines') =>
  send({
    method: 'POST',
    path: `/teams/tarnholm/models/${slug}/revisions`,
    headers: await asPerson(by),
    form: { fields, file: { name: 'robot.urdf', bytes: bytesOf(source) } },
  })

/** Asks for a change of status and answers the response. */
export const postTransition = async (slug: string, revision: number | string, to: string, by: Person, comment?: string, team = 'tarnholm') =>
  send({
    method: 'POST',
    path: `/teams/${team}/models/${slug}/revisions/${revision}/transitions`,
    headers: await asPerson(by),
    json: { to, ...(comment === undefined ? {} : { comment }) },
  })

/** Leads a revision through its review to its release. */
export async function release(slug: string, revision = 1): Promise<void> {
  for (const [to, by] of [['in-review', 'ines'], ['released', 'tomas']] as const) {
    const moved = await postTransition(slug, revision, to, by)
    if (moved.status !== 200) throw new Error(`the revision did not become ${to}: ${moved.status} ${moved.text}`)
  }
}

/** Stores a file as a new model, releases it, and answers its slug. */
export async function importReleased(name: string, source: string): Promise<string> {
  const { model } = await importModel(name, source)
  await release(model.slug)
  return model.slug
}
