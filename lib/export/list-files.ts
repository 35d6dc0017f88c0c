import { getDb } from '@/db/client'
import { listMeshRows } from '@/db/queries/meshes'
import { listReferencePosesRows } from '@/db/queries/reference-poses'
import { findRevision, getDescription, getSourceBytes, type RevisionRow } from '@/db/queries/revisions'
import type { Caller } from '@/lib/access/caller'
import type { Located } from '@/lib/access/locate'
import { getFindings } from '@/lib/catalog/get-findings'
import { getModel } from '@/lib/catalog/get-model'
import { getRevision } from '@/lib/catalog/get-revision'
import { answerCheckVectors } from '@/lib/compute/answer-check-vectors'
import { getReferencePoses } from '@/lib/compute/get-reference-poses'
import { OPERATIONS } from '@/lib/contract/operations'
import { Problem } from '@/lib/errors'
import { getFile } from '@/lib/storage/kept-file'
import { canonicalContent } from '@/lib/urdf/canonical'
import { README } from './read-me'

/** One file of an export; its bytes are read when its turn comes, and undefined when it turns out that there is none. */
export interface ExportFile {
  readonly path: string
  readonly read: () => Promise<Uint8Array | undefined>
  /** SHA-256 in the file storage, where it comes from there. */
  readonly digest?: string
}

const encoder = new TextEncoder()
const text = (content: string): Uint8Array => encoder.encode(content)
const json = (value: unknown): Uint8Array => text(`${JSON.stringify(value, null, 2)}\n`)

/** What an operation would answer, parsed by its schema, so that a field nobody declared never leaves. */
const declared = (name: 'getModel' | 'getRevision' | 'getFindings' | 'getReferencePoses' | 'getCheckVectors', body: unknown): Uint8Array =>
  json(OPERATIONS[name].answer.schema.parse(body))

const asking = <At>(at: At) => ({ at, query: undefined, body: undefined, form: undefined, file: undefined })

/** More sets than this no export lists at a time; the rest follow. */
const MOST_SETS = 200

type At = Pick<Located, 'team' | 'model'>
type AtRevision = At & Pick<Located, 'revision'>

/** Check vectors where there are any: a revision that never was released, or whose default chain is not computable, has none. */
async function checkVectors(caller: Caller, at: AtRevision): Promise<Uint8Array | undefined> {
  try {
    return declared('getCheckVectors', (await answerCheckVectors(caller, { ...asking(at), query: {} })).body)
  } catch (error) {
    if (error instanceof Problem) return undefined
    throw error
  }
}

async function listPoseFiles(caller: Caller, at: AtRevision, folder: string): Promise<ExportFile[]> {
  const db = await getDb()
  const files: ExportFile[] = []
  for (let before: number | undefined; ; ) {
    const sets = await listReferencePosesRows(db, at.revision.id, MOST_SETS, before)
    for (const set of sets) {
      const read = async () => (await getReferencePoses(caller, asking({ ...at, set }))).body
      files.unshift(
        { path: `${folder}/${set.number}.csv`, read: async () => text((await read()).table) },
        { path: `${folder}/${set.number}.json`, read: async () => declared('getReferencePoses', await read()) },
      )
    }
    if (sets.length < MOST_SETS) return files
    before = sets.at(-1)!.number
  }
}

async function listRevisionFiles(caller: Caller, at: AtRevision): Promise<ExportFile[]> {
  const db = await getDb()
  const row: RevisionRow = at.revision
  const folder = `revisions/${row.number}`
  const revision = async () => (await getRevision(caller, asking(at))).body
  const source = () => getSourceBytes(db, row.id)
  const meshes = row.entry === null ? [] : await listMeshRows(db, row.id)
  return [
    { path: `${folder}/revision.json`, read: async () => declared('getRevision', await revision()) },
    { path: `${folder}/history.json`, read: async () => json((await revision()).history) },
    { path: `${folder}/findings.json`, read: async () => declared('getFindings', (await getFindings(caller, asking(at))).body) },
    ...(row.entry === null
      ? [{ path: `${folder}/source/${row.fileName}`, read: source }]
      : [
          { path: `${folder}/source/${row.fileName}`, digest: row.sourceDigest, read: () => getFile(row.sourceDigest) },
          { path: `${folder}/description.urdf`, read: source },
        ]),
    { path: `${folder}/canonical.json`, read: async () => text(canonicalContent(await getDescription(db, row.id))) },
    ...meshes.map(({ path, digest }) => ({ path: `${folder}/meshes/${path}`, digest, read: () => getFile(digest) })),
    ...(await listPoseFiles(caller, at, `${folder}/reference-poses`)),
    { path: `${folder}/check-vectors.json`, read: () => checkVectors(caller, at) },
  ]
}

/** All files of the export of a model but its manifest, in an order that depends on nothing but the model. */
export async function listFiles(caller: Caller, at: At): Promise<ExportFile[]> {
  const db = await getDb()
  const files: ExportFile[] = [
    { path: 'README.txt', read: async () => text(README) },
    { path: 'model.json', read: async () => declared('getModel', (await getModel(caller, asking(at))).body) },
  ]
  for (let number = 1; number <= at.model.model.latest; number++) {
    const revision = (await findRevision(db, at.model.model.id, number))!
    files.push(...(await listRevisionFiles(caller, { ...at, revision })))
  }
  return files
}
