import { createHash } from 'node:crypto'
import type { z } from 'zod'
import type { Answer, Series } from '@/lib/access/use-case'
import type { Located } from '@/lib/access/locate'
import type { Operation } from '@/lib/contract/operation'
import { finishInSlices, passTurn } from '@/lib/in-slices'
import { checkAnswerSize } from './answer-size'
import { CSV_TYPE, JSON_TYPE, type RecordMediaType } from './media-types'
import type { RequestMark } from './problem-response'
import { type Envelope, envelopeFields } from './record-fields'
import type { ResultWriter, Written } from './result-writer'
import { binaryWriter } from './write-binary'
import { csvWriter } from './write-csv'
import { jsonWriter } from './write-json'

/** Link of every reply of a computing operation. */
export const CAUTIONS = '</docs/cautions>; rel="help"'

const quoted = (tag: string) => `"${tag}"`

const WRITERS: Readonly<Record<RecordMediaType, (series: Series<unknown>, envelope: Envelope, item: z.ZodObject) => ResultWriter>> = {
  'application/json': (_series, envelope) => jsonWriter(envelope),
  'text/csv': (series, _envelope, item) => csvWriter(series.fields, item),
  'application/octet-stream': (series, { chain }) => binaryWriter(series, chain.joints),
}

/** The list of an answer that is offered as a table, parsed by the declared schema first. */
function* writeTable({ answer, table }: Operation, body: unknown): Generator<void, Written> {
  const parsed = answer.schema!.parse(body) as Readonly<Record<string, readonly Readonly<Record<string, unknown>>[]>>
  const writer = csvWriter([], table!.entry)
  for (const entry of parsed[table!.field]!) {
    writer.take(entry)
    yield
  }
  return yield* writer.finish()
}

/** Has the results worked out and writes each of them, parsed by its schema first, so that a field nobody declared never leaves. All is
 *  written before the first byte is sent, because a failure on the way is a problem and not half an answer. */
function* writeResults(operation: Operation, item: z.ZodObject, body: object, mediaType: RecordMediaType): Generator<void, Written> {
  const { results: series, ...rest } = body as { results: Series<unknown> }
  checkAnswerSize(series, mediaType)
  const { results: _none, ...envelope } = operation.answer.schema!.parse({ ...rest, results: [] }) as Envelope & { results: [] }
  const writer = WRITERS[mediaType](series, envelope, item)
  for (const result of series.steps()) {
    if (result !== undefined) writer.take(item.parse(result))
    yield
  }
  const { headers, chunks } = yield* writer.finish()
  return { headers: mediaType === JSON_TYPE ? headers : { ...envelopeFields(envelope), ...headers }, chunks }
}

/** The answer in the format asked for. */
async function write(operation: Operation, body: unknown, mediaType: string): Promise<Written> {
  const { answer, item, table } = operation
  if (table !== undefined && mediaType === CSV_TYPE) return finishInSlices(writeTable(operation, body))
  if (item !== undefined) return finishInSlices(writeResults(operation, item, body as object, mediaType as RecordMediaType))
  if (answer.schema === undefined) return { headers: {}, chunks: body === undefined ? [] : [body as Uint8Array] }
  return { headers: {}, chunks: [JSON.stringify(answer.schema.parse(body))] }
}

/** Joined to pieces of about this size, so that a stream of many small results has few chunks. */
const CHUNK_BYTES = 64 * 1024

function streamOf(chunks: Written['chunks']): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder()
  let next = 0
  return new ReadableStream({
    async pull(controller) {
      // A fast reader would have all of it in one turn.
      await passTurn()
      let text = ''
      for (let chunk = chunks[next]; typeof chunk === 'string' && text.length < CHUNK_BYTES; chunk = chunks[++next]) text += chunk
      if (text !== '') controller.enqueue(encoder.encode(text))
      else if (next < chunks.length) controller.enqueue(chunks[next++] as Uint8Array)
      if (next >= chunks.length) controller.close()
    },
  })
}

const attachment = (name: string) => {
  // Cut between characters: half of a surrogate pair cannot be encoded.
  const short = [...name].slice(0, 120).join('')
  const plain = short.replace(/[^\w.-]/gu, '_')
  return `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(short).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16)}`)}`
}

function isKnown(etag: string, ifNoneMatch: string | null): boolean {
  if (ifNoneMatch === null) return false
  return ifNoneMatch.trim() === '*' || ifNoneMatch.split(',').some((tag) => tag.trim().replace(/^W\//, '') === quoted(etag))
}

/** Link to the next page of a list (RFC 8288): the same question with the new cursor. */
function nextLink(path: string, search: string, cursor: string): string {
  const query = new URLSearchParams(search)
  query.set('cursor', cursor)
  return `<${path}?${query}>; rel="next"`
}

export interface AnswerContext {
  readonly request: RequestMark
  /** What the caller takes of what the operation offers. */
  readonly mediaType: string
  readonly search: string
  readonly ifNoneMatch: string | null
  readonly at: Partial<Located>
  /** The path names the revision by its number, so what stands there stays. */
  readonly isFixed: boolean
}

function digestOf(chunks: Written['chunks']): string {
  const hash = createHash('sha256')
  for (const chunk of chunks) hash.update(chunk)
  return hash.digest('hex').slice(0, 32)
}

/** What a use-case gave back, as a response by the operation's declaration. */
export async function answerResponse(operation: Operation, answer: Answer<unknown>, context: AnswerContext): Promise<Response> {
  const headers = new Headers({ 'x-request-id': context.request.id, 'x-content-type-options': 'nosniff', 'cache-control': 'no-store' })
  const { status } = operation.answer
  const written = answer.written === undefined ? await write(operation, answer.body, context.mediaType) : { headers: {}, chunks: [answer.written] }

  let etag = answer.etag
  if (operation.conditional) {
    etag ??= digestOf(written.chunks)
    headers.set('cache-control', operation.immutable && context.isFixed ? 'private, max-age=31536000, immutable' : 'private, no-cache')
  }
  if (etag !== undefined) headers.set('etag', quoted(etag))
  if (answer.location !== undefined) headers.set('location', `/api/v1${answer.location}`)
  if (operation.records !== undefined || operation.table !== undefined) headers.set('vary', 'Accept')
  if (operation.pinned) {
    headers.set('model-fingerprint', context.at.revision!.fingerprint)
    headers.append('link', CAUTIONS)
  }
  const cursor = (answer.body as { nextCursor?: string } | undefined)?.nextCursor
  if (cursor !== undefined) headers.append('link', nextLink(context.request.path, context.search, cursor))
  if (operation.conditional && isKnown(etag!, context.ifNoneMatch)) return new Response(null, { status: 304, headers })
  if (status === 204) return new Response(null, { status, headers })
  headers.set('content-type', context.mediaType === CSV_TYPE ? `${CSV_TYPE}; charset=utf-8; header=present` : context.mediaType)
  for (const [name, value] of Object.entries(written.headers)) headers.set(name, value)
  if (operation.answer.mediaType === undefined) {
    if (answer.fileName !== undefined) headers.set('content-disposition', attachment(`${answer.fileName}.${context.mediaType === CSV_TYPE ? 'csv' : 'json'}`))
    return new Response(streamOf(written.chunks), { status, headers })
  }
  // Bytes have the type that they have, whichever of those on offer was asked for.
  headers.set('content-type', answer.mediaType ?? operation.answer.mediaType)
  headers.set('content-disposition', attachment(answer.fileName ?? 'file'))
  headers.set('content-security-policy', "sandbox; default-src 'none'")
  return new Response(answer.body as BodyInit, { status, headers })
}
