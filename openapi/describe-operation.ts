import type { RouteConfig } from '@asteasolutions/zod-to-openapi'
import { z } from 'zod'
import { PERMISSIONS } from '@/lib/access/permissions'
import type { Operation } from '@/lib/contract/operation'
import type { OperationName } from '@/lib/contract/operations'
import { MOST_QUESTION_BYTES, MOST_RECORDS, type RecordForm } from '@/lib/contract/record-form'
import { PROBLEMS } from '@/lib/errors'
import { problemsOf } from './common-problems'
import { ProblemSchema } from './problem-schema'

const PARAMETERS: Readonly<Record<string, { description: string; example: string }>> = {
  team: { description: 'Slug of the team.', example: 'tarnholm' },
  model: { description: 'Slug of the model.', example: 'skerry-7' },
  revision: { description: 'Number of the revision, or "released" for the one in force.', example: 'released' },
  key: { description: 'Id of the key.', example: '4fXk02MzQ8aT' },
  path: { description: 'Path of the mesh in the archive, each part encoded by itself.', example: 'meshes/base.stl' },
  set: { description: 'Number of the reference poses within the revision.', example: '1' },
}

const parametersOf = (path: string) =>
  z.object(
    Object.fromEntries([...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => [name!, z.string().meta(PARAMETERS[name!]!)])),
  )

const headersOf = (operation: Operation) => [
  ...(operation.edits ? [{ name: 'If-Match', description: 'ETag of the state that is changed.', required: true }] : []),
  ...(operation.pinned ? [{ name: 'If-Match', description: 'The fingerprint in double quotes: compute from this model only.', required: false }] : []),
  ...(operation.conditional ? [{ name: 'If-None-Match', description: 'ETag that is already held.', required: false }] : []),
]

const whoMayCall = (name: OperationName) => {
  const { role, scope } = PERMISSIONS[name]
  return `Session: ${role} or above. Key: ${scope === null ? 'never' : `scope \`${scope}\``}.`
}

/** The multipart body of an import: the text fields and the file. */
const uploadOf = (form: z.ZodObject) =>
  form.extend({ file: z.string().meta({ format: 'binary', description: 'A URDF (.urdf or .xml, at most 8 MiB), or an archive of one with its meshes (.zip, at most 64 MiB).' }) })

const BYTES = z.string().meta({ format: 'binary' })

const RECORDS_IN = (form: RecordForm) =>
  `Little-endian binary64 numbers, at most ${MOST_RECORDS} records. A record holds, by "record" in the question: ` +
  Object.entries(form.records).map(([name, parts], i) => `${name}${i === 0 ? ' (when left out)' : ''}: ${parts.join(', ')}`).join('; ') +
  '. See /docs/formats.'

const questionField = ({ question }: RecordForm) =>
  z.object({
    question: z.string().optional().meta({
      maxLength: MOST_QUESTION_BYTES,
      contentMediaType: 'application/json',
      description: `Only with a body of records: what stands beside them, as JSON. Fields: ${Object.keys(question.shape).join(', ')}.`,
      example: '{"units":{"length":"mm"}}',
    }),
  })

function requestOf(operation: Operation): NonNullable<RouteConfig['request']> {
  const { body, form, query, records } = operation
  const example = operation.example === undefined ? {} : { example: operation.example }
  return {
    params: parametersOf(operation.path),
    ...(query && { query }),
    ...(records && { query: questionField(records) }),
    ...(body && {
      body: {
        required: true,
        content: {
          'application/json': { schema: body, ...example },
          ...(records && { 'application/octet-stream': { schema: BYTES.meta({ format: 'binary', description: RECORDS_IN(records) }) } }),
        },
      },
    }),
    ...(form && { body: { required: true, content: { 'multipart/form-data': { schema: uploadOf(form) } } } }),
  }
}

const SUCCESS = { 200: 'The answer.', 201: 'Made. Location names it.', 204: 'Done; nothing to say.' }

const FIELD = (description: string) => ({ description, schema: { type: 'string' as const } })

/** Fields of a reply of records: what the JSON answer says of the model beside its results. */
const RECORD_FIELDS = {
  'Model-Revision': FIELD('CSV and binary: number of the revision, with team, model, status, and how many warnings the JSON answer has.'),
  'Record-Chain': FIELD('CSV and binary: base, tip and number of joints.'),
  'Record-Units': FIELD('CSV and binary: length and angle.'),
  'Record-Layout': FIELD('Binary: the columns of a record, in order.'),
}

const RECORDS_OUT = {
  'text/csv': { schema: z.string().meta({ description: 'RFC 4180: a header of JSON paths, then one record a result.' }) },
  'application/octet-stream': { schema: BYTES.meta({ format: 'binary', description: 'Little-endian binary64 records, laid out as Record-Layout says.' }) },
}

const TABLE_OUT = (field: string) => ({ 'text/csv': { schema: z.string().meta({ description: `RFC 4180: a header of JSON paths, then one record an entry of "${field}".` }) } })

function successOf({ answer, pinned, records, table }: Operation): RouteConfig['responses'][string] {
  if (answer.mediaType !== undefined) {
    return { description: 'The bytes, as an attachment.', content: Object.fromEntries([answer.mediaType, ...(answer.alsoMediaTypes ?? [])].map((type) => [type, { schema: BYTES }])) }
  }
  const headers = { ...(pinned && { 'Model-Fingerprint': FIELD('The fingerprint of the model that the answer was computed from.') }), ...(records && RECORD_FIELDS) }
  return {
    description: SUCCESS[answer.status],
    ...(Object.keys(headers).length > 0 && { headers }),
    ...(answer.schema && { content: { 'application/json': { schema: answer.schema }, ...(records && RECORDS_OUT), ...(table && TABLE_OUT(table.field)) } }),
  }
}

/** One response a status, listing the problem types behind it. */
function problemResponses(name: OperationName, operation: Operation): RouteConfig['responses'] {
  const byStatus = new Map<number, string[]>()
  for (const code of problemsOf(name, operation)) {
    const { status, title } = PROBLEMS[code]
    byStatus.set(status, [...(byStatus.get(status) ?? []), `- [\`${code}\`](/docs/problems/${code}) ${title}.`])
  }
  return Object.fromEntries(
    [...byStatus].map(([status, lines]) => [
      status,
      { description: lines.join('\n'), content: { 'application/problem+json': { schema: ProblemSchema } } },
    ]),
  )
}

/** One operation of the contract as a path of the OpenAPI document. */
export function describeOperation(name: OperationName, operation: Operation): RouteConfig {
  return {
    method: operation.method.toLowerCase() as RouteConfig['method'],
    path: operation.path,
    operationId: name,
    tags: [operation.tag],
    summary: operation.summary,
    description: [operation.description, whoMayCall(name)].filter((line) => line !== undefined).join('\n\n'),
    security: PERMISSIONS[name].scope === null ? [{ session: [] }] : [{ key: [] }, { session: [] }],
    parameters: headersOf(operation).map(({ required, ...header }) => ({ ...header, required, in: 'header' as const, schema: { type: 'string' as const } })),
    request: requestOf(operation),
    responses: { [operation.answer.status]: successOf(operation), ...problemResponses(name, operation) },
  }
}
