import type { Db } from '@/db/client'
import { findKey, type KeyRow } from '@/db/queries/keys'
import { findMesh, type MeshRow } from '@/db/queries/meshes'
import { findModel, type ModelRow } from '@/db/queries/models'
import { findMembership } from '@/db/queries/people'
import { findReferencePoses, type ReferencePosesRow } from '@/db/queries/reference-poses'
import { findRevision, type RevisionRow } from '@/db/queries/revisions'
import { fail } from '@/lib/errors'
import { passTurn } from '@/lib/in-slices'
import type { Caller, Identity, Team } from './caller'

/** What stands behind each {parameter} of a path. */
export interface Located {
  team: Team
  model: ModelRow
  revision: RevisionRow
  set: ReferencePosesRow
  /** The mesh at a path in the archive that the revision came in. */
  path: MeshRow
  key: KeyRow
}
export type Parameter = keyof Located

/** A name that no slug or id can have is not looked up: the database would refuse some of them. */
const NAME = /^[0-9A-Za-z-]{1,64}$/

const LARGEST_NUMBER = 2 ** 31 - 1

const MESH_PATH = /^[^\p{Cc}\p{Cs}]{1,1024}$/u

/** The number in a path; 0 where it is none that the database can hold. */
function numberIn(name: string): number {
  const number = /^[1-9][0-9]*$/.test(name) ? Number(name) : 0
  return number > LARGEST_NUMBER ? 0 : number
}

/** The caller within the team of the path. A team that is not the caller's is a team that never was. */
async function enterTeam(db: Db, who: Identity, slug: string): Promise<Caller> {
  if (!NAME.test(slug)) fail('team-not-found')
  if (who.kind === 'key') return who.team.slug === slug ? who : fail('team-not-found')
  const membership = (await findMembership(db, who.userId, slug)) ?? fail('team-not-found')
  return { ...who, ...membership }
}

/** The revision that a number or the word "released" names. Fails with revision-not-found or nothing-released. */
export async function locateRevision(db: Db, { model }: ModelRow, name: string): Promise<RevisionRow> {
  if (name === 'released') {
    return model.released === null ? fail('nothing-released') : ((await findRevision(db, model.id, model.released)) ?? fail('revision-not-found'))
  }
  const number = numberIn(name)
  if (number === 0) fail('revision-not-found')
  return (await findRevision(db, model.id, number)) ?? fail('revision-not-found')
}

/** Finds what the parameters of a path name, in the caller's team only.
 *  Fails with team-, model-, revision-, reference-poses-, mesh- or key-not-found, or nothing-released. */
export async function locate(
  db: Db,
  who: Identity,
  parameters: Partial<Record<Parameter, string>>,
): Promise<{ caller: Caller; at: Partial<Located> }> {
  const caller = await enterTeam(db, who, parameters.team ?? '')
  const at: Partial<Located> = { team: caller.team }
  const { model, revision, set, path, key } = parameters
  if (model !== undefined) {
    if (!NAME.test(model)) fail('model-not-found')
    at.model = (await findModel(db, caller.team.id, model)) ?? fail('model-not-found')
    await passTurn()
    if (revision !== undefined) at.revision = await locateRevision(db, at.model, revision)
    if (at.revision !== undefined && set !== undefined) {
      at.set = (await findReferencePoses(db, at.revision.id, numberIn(set))) ?? fail('reference-poses-not-found')
    }
    if (at.revision !== undefined && path !== undefined) {
      // Only paths that are recorded are known, so that none can lead anywhere else.
      at.path = (MESH_PATH.test(path) ? await findMesh(db, at.revision.id, path) : null) ?? fail('mesh-not-found')
    }
  }
  if (key !== undefined) {
    if (!NAME.test(key)) fail('key-not-found')
    at.key = (await findKey(db, caller.team.id, key)) ?? fail('key-not-found')
  }
  return { caller, at }
}
