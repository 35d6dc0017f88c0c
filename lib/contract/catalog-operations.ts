import { z } from 'zod'
import { CheckedImport, Finding } from './description'
import { ArchiveEntryField } from './mesh'
import { MESH_MEDIA_TYPES } from './mesh-media-types'
import { Model, ModelEdit, NewModelForm, NewRevisionForm, Revision, RevisionSummary, TransitionQuestion } from './model'
import { operation } from './operation'
import { listOf, Paging, Status, wholeNumber } from './scalars'
import { KeyUse } from './used-by'

const MODELS = '/teams/{team}/models'
const MODEL = `${MODELS}/{model}` as const
const REVISIONS = `${MODEL}/revisions` as const
const REVISION = `${REVISIONS}/{revision}` as const

export const CATALOG_OPERATIONS = {
  listModels: operation({
    method: 'GET',
    path: MODELS,
    tag: 'Catalog',
    summary: 'The register',
    description: 'The models of the team by name. Archived models are left out.',
    query: z.strictObject({
      query: z.string().max(200).refine((text) => /^\P{Cc}*$/u.test(text), 'control characters are not allowed').optional().meta({ description: 'Part of the name, the slug, the note or the robot name of the newest revision; case and accents do not matter.' }),
      status: Status.optional().meta({ description: 'Models with a revision of this status.' }),
      joints: wholeNumber(0, 10_000).optional().meta({ description: 'Independent joints of the newest revision.' }),
      ...Paging,
    }),
    answer: { status: 200, schema: listOf(Model) },
    errors: [],
  }),
  createModel: operation({
    method: 'POST',
    path: MODELS,
    tag: 'Catalog',
    summary: 'Import a file as a new model',
    description: 'Stores the file as revision 1, a draft. Location names the revision. Meshes come with their URDF in a .zip: see /docs/archives.',
    form: NewModelForm,
    answer: { status: 201, schema: z.strictObject({ model: Model, revision: Revision }) },
    errors: ['import-refused', 'slug-taken'],
  }),
  checkImport: operation({
    method: 'POST',
    path: '/teams/{team}/imports/check',
    tag: 'Catalog',
    summary: 'Read a file without storing it',
    description: 'Answers what the importer has to say, whatever the file holds.',
    form: z.strictObject({ entry: ArchiveEntryField }),
    answer: { status: 200, schema: CheckedImport },
    errors: [],
  }),
  getModel: operation({
    method: 'GET',
    path: MODEL,
    tag: 'Catalog',
    summary: 'A model',
    answer: { status: 200, schema: Model },
    errors: [],
    conditional: true,
  }),
  editModel: operation({
    method: 'PATCH',
    path: MODEL,
    tag: 'Catalog',
    summary: 'Change name or note',
    description: 'The slug stays, because gateways call it.',
    body: ModelEdit,
    answer: { status: 200, schema: Model },
    errors: [],
    edits: true,
    example: { note: 'Seven-axis arm, spherical shoulder and wrist.' },
  }),
  archiveModel: operation({
    method: 'DELETE',
    path: MODEL,
    tag: 'Catalog',
    summary: 'Archive a model',
    description: 'It leaves the register. Its revisions stay, can be read and still compute.',
    answer: { status: 204 },
    errors: [],
    edits: true,
  }),
  listRevisions: operation({
    method: 'GET',
    path: REVISIONS,
    tag: 'Catalog',
    summary: 'The revisions of a model, newest first',
    query: z.strictObject(Paging),
    answer: { status: 200, schema: listOf(RevisionSummary) },
    errors: [],
  }),
  createRevision: operation({
    method: 'POST',
    path: REVISIONS,
    tag: 'Catalog',
    summary: 'Import a file as a further revision',
    form: NewRevisionForm,
    answer: { status: 201, schema: Revision },
    errors: ['import-refused', 'same-content'],
  }),
  getRevision: operation({
    method: 'GET',
    path: REVISION,
    tag: 'Catalog',
    summary: 'A revision with its structure',
    answer: { status: 200, schema: Revision },
    errors: [],
    conditional: true,
  }),
  getSource: operation({
    method: 'GET',
    path: `${REVISION}/source`,
    tag: 'Catalog',
    summary: 'The file as uploaded, byte for byte',
    description: 'Of an archive the archive, as application/zip; with `part=description` the URDF out of it.',
    query: z.strictObject({ part: z.enum(['upload', 'description']).optional().meta({ description: 'description: the URDF alone. The same where it was sent alone.' }) }),
    answer: { status: 200, mediaType: 'application/xml', alsoMediaTypes: ['application/zip'] },
    errors: ['file-unavailable'],
    conditional: true,
    immutable: true,
  }),
  getMesh: operation({
    method: 'GET',
    path: `${REVISION}/meshes/{path}`,
    tag: 'Catalog',
    summary: 'A mesh that came with the description',
    description: 'The path is that of the file in the archive, its parts encoded one by one. Only what came in the archive is answered.',
    answer: { status: 200, mediaType: 'application/octet-stream', alsoMediaTypes: [...new Set(Object.values(MESH_MEDIA_TYPES))].filter((type) => type !== 'application/octet-stream') },
    errors: ['file-unavailable'],
    conditional: true,
    immutable: true,
  }),
  getFindings: operation({
    method: 'GET',
    path: `${REVISION}/findings`,
    tag: 'Catalog',
    summary: 'What the importer had to say',
    answer: { status: 200, schema: z.strictObject({ items: z.array(Finding) }) },
    errors: [],
    conditional: true,
  }),
  exportModel: operation({
    method: 'GET',
    path: `${MODEL}/export`,
    tag: 'Catalog',
    summary: 'Everything of a model as one archive',
    description:
      'A zip of all revisions: files as uploaded, findings, history, the canonical JSON behind each fingerprint, meshes, reference poses, check vectors, and a ' +
      'manifest with the SHA-256 of every file. The same model gives the same bytes.',
    answer: { status: 200, mediaType: 'application/zip' },
    errors: ['file-unavailable'],
  }),
  listUses: operation({
    method: 'GET',
    path: `${MODEL}/used-by`,
    tag: 'Catalog',
    summary: 'Which keys call the model',
    description: 'Each key with the revision it called and when it last did, the latest first.',
    query: z.strictObject(Paging),
    answer: { status: 200, schema: listOf(KeyUse) },
    errors: [],
  }),
  transitionRevision: operation({
    method: 'POST',
    path: `${REVISION}/transitions`,
    tag: 'Catalog',
    summary: 'Submit, send back, release or withdraw',
    description: 'Releasing supersedes the revision that was in force. Withdrawing revives nothing.',
    body: TransitionQuestion,
    answer: { status: 200, schema: Revision },
    errors: ['transition-refused', 'evidence-missing', 'four-eyes'],
    example: { to: 'in-review', comment: 'Checked against the drawing.' },
  }),
} as const
