import { createHash } from 'node:crypto'
import type { z } from 'zod'
import type { Answer } from '@/lib/access/use-case'
import type { Located } from '@/lib/access/locate'
import type { Operation } from '@/lib/contract/operation'
import { inSlices } from '@/lib/in-slices'
import type { RequestMark } from './problem-response'

/** Link of every reply of a computing operation. */
export const CAUTIONS = '</docs/cautions>; rel="help"'

const quoted = (tag: string) => `"${tag}"`

/** The answer as JSON text, in pieces. It is parsed by the declared schema first, so that a field nobody declared never
 *  leaves; long lists of results are parsed and written in slices. */
async function writeJson(operation: Operation, body: unknown): Promise<string[]> {
  const { schema } = operation.answer
  if (schema === undefined) return []
  const item = operation.item
  if (item === undefined) return [JSON.stringify(schema.parse(body))]
  const { results, ...envelope } = body as { results: readonly unknown[] }
  const head = JSON.stringify(schema.parse({ ...envelope, results: [] }))
  const pieces = [head.slice(0, head.lastIndexOf('[]')), '[']
  await inSlices(results.length, (index) => {
    pieces.push((index === 0 ? '' : ',') + JSON.stringify((item as z.ZodType).parse(results[index])))
  })
  return [...pieces, ']}']
}

/** Joined to pieces of about this many characters, so that a stream of many small results has few chunks. */
const CHUNK_CHARACTERS = 64 * 1024

function streamOf(pieces: readonly string[]): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder()
  let next = 0
  return new ReadableStream({
    pull(controller) {
      let chunk = ''
      while (next < pieces.length && chunk.length < CHUNK_CHARACTERS) chunk += pieces[next++]
      if (chunk !== '') controller.enqueue(encoder.encode(chunk))
      if (next >= pieces.length) controller.close()
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
  readonly search: string
  readonly ifNoneMatch: string | null
  readonly at: Partial<Located>
  /** The path names the revision by its number, so what stands there stays. */
  readonly isFixed: boolean
}

/** What a use-case gave back, as a response by the operation's declaration. */
export async function answerResponse(operation: Operation, answer: Answer<unknown>, context: AnswerContext): Promise<Response> {
  const headers = new Headers({ 'x-request-id': context.request.id, 'x-content-type-options': 'nosniff', 'cache-control': 'no-store' })
  const { mediaType, status } = operation.answer
  const isBytes = mediaType !== undefined
  const pieces = isBytes ? [] : await writeJson(operation, answer.body)

  let etag = answer.etag
  if (operation.conditional) {
    etag ??= createHash('sha256').update(isBytes ? (answer.body as Uint8Array) : pieces.join('')).digest('hex').slice(0, 32)
    headers.set('cache-control', operation.immutable && context.isFixed ? 'private, max-age=31536000, immutable' : 'private, no-cache')
  }
  if (etag !== undefined) headers.set('etag', quoted(etag))
  if (answer.location !== undefined) headers.set('location', `/api/v1${answer.location}`)
  if (operation.pinned) {
    headers.set('model-fingerprint', context.at.revision!.fingerprint)
    headers.append('link', CAUTIONS)
  }
  const cursor = (answer.body as { nextCursor?: string } | undefined)?.nextCursor
  if (cursor !== undefined) headers.append('link', nextLink(context.request.path, context.search, cursor))
  if (operation.conditional && isKnown(etag!, context.ifNoneMatch)) return new Response(null, { status: 304, headers })
  if (status === 204) return new Response(null, { status, headers })
  headers.set('content-type', mediaType ?? 'application/json')
  if (!isBytes) return new Response(streamOf(pieces), { status, headers })
  headers.set('content-disposition', attachment(answer.fileName ?? 'file'))
  headers.set('content-security-policy', "sandbox; default-src 'none'")
  return new Response(answer.body as BodyInit, { status, headers })
}
