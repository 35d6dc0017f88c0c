import { createHash, randomUUID } from 'node:crypto'
import type { Db } from '@/db/client'
import { insertModels, type WholeModel } from '@/db/queries/insert-models'
import { countIndependent } from '@/lib/catalog/present-structure'
import { compileChain } from '@/lib/urdf/compile-chain'
import { fingerprint } from '@/lib/urdf/fingerprint'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { drawnArm } from './drawn-arm'

interface Filling {
  readonly teamId: string
  /** Who imported everything. */
  readonly importer: { readonly id: string; readonly name: string }
  readonly models: number
  /** How many models have files of their own, a multiple of 6; the others repeat them. All when left out. */
  readonly files?: number
  /** Called after each batch with the number of models there are. */
  readonly progress?: (models: number) => void
}

const REVISIONS = 5
const BATCH = 100
const START = Date.UTC(2026, 0, 1)
const BIRDS = ['Tern', 'Dunlin', 'Knot', 'Plover', 'Curlew', 'Störche', 'Ærfugl', 'Sandpiper', 'Gannet', 'زرزور', 'חסידה', 'Skua']
const PLACES = ['Hallen', 'Ørevik', 'Quay', 'Łęki', 'North hall', 'Paint shop', 'Dock', 'Café', 'Press line', 'Test bay', 'Loft']
const DUTIES = ['palletising', 'gluing', 'deburring', 'inspection', 'door assembly', 'welding', 'kitting']

const REMARKS = [
  'Calibrated with the laser tracker after the move to the new foundation; the base frame is the plate and not the pedestal.',
  'The supplier sent the file twice; the second one has the flange turned by ninety degrees, which is how it is mounted here.',
  'Runs two shifts; the cable guide keeps joint one from using the last fifteen degrees on either side.',
  'Spare arm from the store, put into service while the other one was at the maker for new gears.',
  'Tool changer between flange and gripper; its height is in the last link, so that the numbers hold at the gripper.',
  'Limits of the wrist are those of the hose package and narrower than in the data sheet.',
  'Measured cold; when warm the arm is about two tenths longer, which nobody has complained about so far.',
]

/** A paragraph, as people write them: two to four remarks, different from model to model. */
const remarksOf = (index: number): string =>
  Array.from({ length: 2 + (index % 3) }, (_, i) => REMARKS[(index * 3 + i * 5 + Math.floor(index / 7)) % REMARKS.length]).join(' ')

/** Status of each revision, oldest first, by the kind of model: most are in force, some wait, few are withdrawn. */
function statusesOf(index: number): readonly ('draft' | 'in-review' | 'released' | 'superseded' | 'withdrawn')[] {
  if (index % 500 === 7) return ['superseded', 'superseded', 'superseded', 'released', 'in-review']
  if (index % 50 === 3) return ['superseded', 'superseded', 'superseded', 'released', 'draft']
  if (index % 200 === 11) return ['superseded', 'superseded', 'superseded', 'superseded', 'withdrawn']
  if (index % 10 === 4) return ['draft', 'draft', 'draft', 'draft', 'draft']
  return ['superseded', 'superseded', 'superseded', 'superseded', 'released']
}

/** A file and what an import reads out of it. */
function readArm(index: number, step: number) {
  const joints = 3 + (index % 6)
  const source = new TextEncoder().encode(drawnArm(`arm_${index}`, joints, 0.2 + index * 1e-5 + step * 1e-6))
  const { description, findings } = parseUrdf(source)
  if (description === null) throw new Error(`arm ${index} does not parse: ${JSON.stringify(findings)}`)
  if (compileChain(description).joints.length !== joints) throw new Error(`arm ${index} does not compile to its ${joints} joints`)
  const sourceDigest = createHash('sha256').update(source).digest('hex')
  return { source, description, findings, sourceDigest, fingerprint: fingerprint(description), independent: countIndependent(description) }
}

type Read = (index: number, step: number) => ReturnType<typeof readArm>

/** Reads each file once. */
function readerOf(files: number): Read {
  const known = new Map<string, ReturnType<typeof readArm>>()
  return (index, step) => {

    const key = `${index % files} ${step}`
    const read = known.get(key) ?? readArm(index % files, step)
    known.set(key, read)
    return read
  }
}

function wholeModel({ teamId, importer }: Filling, read: Read, index: number): WholeModel {
  const id = randomUUID()
  const bird = BIRDS[index % BIRDS.length]!
  const statuses = statusesOf(index)
  const at = (step: number) => new Date(START + index * 60_000 + step * 3_600_000)
  const imported = statuses.map((status, step) => {
    const robotName = `arm_${index}`
    const { source, ...fields } = read(index, step)
    const revision = {
      id: randomUUID(),
      modelId: id,
      number: step + 1,
      status,
      ...fields,
      fileName: `${robotName}.urdf`,
      robotName,
      note: `Calibration ${step + 1}.`,
      importedBy: importer.id,
      importedByKey: null,
      importedAt: at(step),
    }
    return { revision, source }
  })
  const act = { teamId, byName: importer.name, byUser: importer.id }
  const released = statuses.indexOf('released')
  return {
    model: {
      id,
      teamId,
      slug: `arm-${String(index).padStart(5, '0')}`,
      name: `${bird} ${index}`,
      note: `Arm for ${DUTIES[index % DUTIES.length]} in ${PLACES[index % PLACES.length]}, serial number LR-${String(index * 7919).padStart(9, '0')}. ${remarksOf(index)}`,
      latest: REVISIONS,
      released: released === -1 ? null : released + 1,
      createdAt: at(0),
      changedAt: at(REVISIONS),
      archivedAt: null,
      version: REVISIONS,
    },
    revisions: imported.map(({ revision }) => revision).toReversed(),
    bytes: Object.fromEntries(imported.map(({ revision, source }) => [revision.id, source])),
    transitions: imported.flatMap(({ revision }) => [
      { ...act, revisionId: revision.id, ordinal: 1, status: 'draft' as const, at: revision.importedAt, comment: null },
      ...(revision.status === 'draft' ? [] : [{ ...act, revisionId: revision.id, ordinal: 2, status: revision.status, at: at(revision.number), comment: null }]),
    ]),
  }
}

/** Fills a team with models of five revisions each, from files that were read as an import reads them. */
export async function fillRegisterOf(db: Db, filling: Filling): Promise<void> {
  const read = filling.files === undefined ? readArm : readerOf(filling.files)
  for (let from = 0; from < filling.models; from += BATCH) {
    const size = Math.min(BATCH, filling.models - from)
    await insertModels(db, Array.from({ length: size }, (_, i) => wholeModel(filling, read, from + i)))
    filling.progress?.(from + size)
  }
}
