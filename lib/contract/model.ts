import { z } from 'zod'
import { structureFields } from './description'
import { ArchiveEntryField, MeshFile, MeshReference } from './mesh'
import { Provenance, provenanceFields } from './provenance'
import { Digest, Instant, Name, Note, Slug, Status } from './scalars'

export const Model = z
  .strictObject({
    slug: z.string(),
    name: z.string(),
    note: z.string().optional(),
    createdAt: Instant,
    changedAt: Instant,
    archivedAt: Instant.optional(),
    revisions: z.int().min(1),
    latest: z.strictObject({ revision: z.int(), status: Status, fingerprint: Digest, independent: z.int() }),
    released: z.int().optional().meta({ description: 'The revision in force; left out when none is.' }),
  })
  .meta({ id: 'Model' })
export type Model = z.infer<typeof Model>

const HistoryEntry = z.strictObject({
  status: Status,
  by: z.string(),
  at: Instant,
  comment: z.string().optional(),
})

const summaryFields = {
  model: z.strictObject({ slug: z.string(), name: z.string() }),
  revision: z.int().min(1),
  status: Status,
  importedBy: z.string(),
  importedAt: Instant,
  fileName: z.string(),
  note: z.string().optional(),
  provenance: Provenance.optional().meta({ description: 'Where the file comes from; left out when nothing was said.' }),
  history: z.array(HistoryEntry),
  findings: z.strictObject({ error: z.int(), warning: z.int(), note: z.int() }),
}

/** What came with a description. */
const meshFields = {
  meshes: z.array(MeshReference).optional().meta({ description: 'Where each mesh that the description refers to is found; left out when there are none.' }),
  archive: z
    .strictObject({ entry: z.string().meta({ description: 'Path of the description in it.' }), files: z.array(MeshFile) })
    .optional()
    .meta({ description: 'Left out when the description was sent alone.' }),
}

/** A whole revision, structure included. */
export const Revision = z.strictObject({ ...summaryFields, ...structureFields, ...meshFields }).meta({ id: 'Revision' })
export type Revision = z.infer<typeof Revision>

/** A revision in a list: without its structure. */
export const RevisionSummary = z
  .strictObject({
    ...summaryFields,
    robotName: structureFields.robotName,
    fingerprint: structureFields.fingerprint,
    sourceDigest: structureFields.sourceDigest,
    independent: structureFields.counts.shape.independent,
  })
  .meta({ id: 'RevisionSummary' })
export type RevisionSummary = z.infer<typeof RevisionSummary>

/** The text fields that come with the file of a new model. */
export const NewModelForm = z.strictObject({
  name: Name,
  slug: Slug.optional().meta({ description: 'Derived from the name when left out.' }),
  note: Note.optional(),
  ...provenanceFields,
  entry: ArchiveEntryField,
})

/** The text fields that come with the file of a further revision. */
export const NewRevisionForm = z.strictObject({
  note: Note.optional(),
  ...provenanceFields,
  entry: ArchiveEntryField,
  allowSame: z.enum(['true', 'false']).optional().meta({ description: 'true: store even though a revision has the same fingerprint.' }),
})

export const ModelEdit = z.strictObject({
  name: Name.optional(),
  note: Note.nullable().optional().meta({ description: 'null removes the note.' }),
})

export const TransitionQuestion = z.strictObject({
  to: z.enum(['draft', 'in-review', 'released', 'withdrawn']),
  comment: Note.optional(),
})
