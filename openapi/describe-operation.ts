import type { RouteConfig } from '@asteasolutions/zod-to-openapi'
import { z } from 'zod'
import { PERMISSIONS } from '@/lib/access/permissions'
import type { Operation } from '@/lib/contract/operation'
import type { OperationName } from '@/lib/contract/operations'
import { PROBLEMS } from '@/lib/errors'
import { problemsOf } from './common-problems'
import { ProblemSchema } from './problem-schema'

const PARAMETERS: Readonly<Record<string, { description: string; example: string }>> = {
  team: { description: 'Slug of the team.', example: 'tarnholm' },
  model: { description: 'Slug of the model.', example: 'skerry-7' },
  revision: { description: 'Number of the revision, or "released" for the one in force.', example: 'released' },
  key: { description: 'Id of the key.', example: '4fXk02MzQ8aT' },
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
  form.extend({ file: z.string().meta({ format: 'binary', description: 'A URDF (.urdf or .xml), at most 8 MiB.' }) })

function requestOf(operation: Operation): NonNullable<RouteConfig['request']> {
  const { body, form, query } = operation
  const example = operation.example === undefined ? {} : { example: operation.example }
  return {
    params: parametersOf(operation.path),
    ...(query && { query }),
    ...(body && { body: { required: true, content: { 'application/json': { schema: body, ...example } } } }),
    ...(form && { body: { required: true, content: { 'multipart/form-data': { schema: uploadOf(form) } } } }),
  }
}

const SUCCESS = { 200: 'The answer.', 201: 'Made. Location names it.', 204: 'Done; nothing to say.' }

function successOf({ answer }: Operation): RouteConfig['responses'][string] {
  if (answer.mediaType !== undefined) {
    return { description: 'The bytes, as an attachment.', content: { [answer.mediaType]: { schema: z.string().meta({ format: 'binary' }) } } }
  }
  return { description: SUCCESS[answer.status], ...(answer.schema && { content: { 'application/json': { schema: answer.schema } } }) }
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
