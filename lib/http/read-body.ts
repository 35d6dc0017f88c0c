import { fail } from '@/lib/errors'
import type { UploadedFile } from '@/lib/access/use-case'
import { finishInSlices, inSlices } from '@/lib/in-slices'
import { pointerOf } from './faults'
import { parseJsonInSteps } from './parse-json'

const MEBIBYTE = 1024 * 1024
const MOST_JSON_BYTES = 8 * MEBIBYTE
const MOST_RECORD_BYTES = 64 * MEBIBYTE
const MOST_URDF_BYTES = 8 * MEBIBYTE
const MOST_ARCHIVE_BYTES = 64 * MEBIBYTE
/** What the text fields and the boundaries of a multipart body may take beside the file. */
const MULTIPART_ROOM = 64 * 1024

/** So much of a refused body is still taken and thrown away, because many clients read the answer only when they have sent all. */
const MOST_DISCARDED = 80 * MEBIBYTE

/** Takes what still comes of a refused body. */
async function discard(reader: ReadableStreamDefaultReader<Uint8Array>): Promise<void> {
  try {
    for (let length = 0; length <= MOST_DISCARDED; ) {
      const { done, value } = await reader.read()
      if (done) return
      length += value.length
    }
    await reader.cancel()
  } catch {
    // The client has gone away, which is its right.
  }
}

/** Takes the body of a request that is refused before it was read, where it says its length: the connection is closed behind the
 *  answer, and a client that still sends would lose it. */
export async function discardBody(request: Request): Promise<void> {
  if (request.body === null || request.body.locked || request.bodyUsed) return
  const discarded = discard(request.body.getReader())
  if (Number(request.headers.get('content-length') ?? Infinity) <= MOST_DISCARDED) await discarded
}

/** The pieces in one, copied in slices. */
async function joined(pieces: readonly Uint8Array[], length: number): Promise<Uint8Array> {
  const bytes = new Uint8Array(length)
  let at = 0
  await inSlices(pieces.length, (i) => {
    bytes.set(pieces[i]!, at)
    at += pieces[i]!.length
  })
  return bytes
}

/** Reads the body up to `most` bytes: fails with too-large. A body that says its length is taken to its end first, so that a
 *  client that closes the connection behind it gets its answer; one that does not is answered while it still sends. mayGoOn: whether
 *  what has come so far may be as long as it is. */
async function readBytes(request: Request, most: number, what: string, mayGoOn: (pieces: readonly Uint8Array[], length: number) => boolean = () => true): Promise<Uint8Array> {
  if (request.body === null) return new Uint8Array()
  const reader = request.body.getReader()
  const tooLarge = () => fail('too-large', `${what} may have at most ${most} bytes. Nothing was stored.`)
  const declared = Number(request.headers.get('content-length') ?? 0)
  if (declared > most) {
    const discarded = discard(reader)
    if (declared <= MOST_DISCARDED) await discarded
    tooLarge()
  }
  const pieces: Uint8Array[] = []
  for (let length = 0; ; ) {
    const { done, value } = await reader.read()
    if (done) return joined(pieces, length)
    length += value.length
    pieces.push(value)
    if (length > most || !mayGoOn(pieces, length)) {
      const discarded = discard(reader)
      if (declared > 0 && declared <= MOST_DISCARDED) await discarded
      tooLarge()
    }
  }
}

/** The type of the body, one of those that are read. Fails with unsupported-media-type unless it is, uncompressed, and UTF-8 where it says
 *  a charset. */
export function readContentType<M extends string>(headers: Headers, read: readonly M[]): M {
  const encoding = headers.get('content-encoding')
  if (encoding !== null && encoding.toLowerCase() !== 'identity') fail('unsupported-media-type', 'Send the body without a content encoding.')
  const [name = '', ...parameters] = (headers.get('content-type') ?? '').split(';').map((part) => part.trim().toLowerCase())
  const mediaType = read.find((type) => type === name) ?? fail('unsupported-media-type', `Send the body as ${read.join(' or ')}.`)
  const charset = parameters.find((parameter) => parameter.startsWith('charset='))?.slice(8).replaceAll('"', '')
  if (charset !== undefined && charset !== 'utf-8' && charset !== 'utf8') fail('unsupported-media-type', 'Send the body in UTF-8.')
  return mediaType
}

/** The JSON body. Fails with too-large, malformed-body, or invalid-request where it is built to be a burden. */
export async function readJson(request: Request): Promise<unknown> {
  const bytes = await readBytes(request, MOST_JSON_BYTES, 'The body')
  return finishInSlices(parseJsonInSteps(await decodeUtf8(bytes)))
}

/** Of this many bytes, text beyond ASCII takes about a millisecond. */
const DECODED_AT_ONCE = 256 * 1024

/** UTF-8 as text, decoded in slices. Fails with malformed-body. */
async function decodeUtf8(bytes: Uint8Array): Promise<string> {
  const decoder = new TextDecoder('utf-8', { fatal: true })
  let text = ''
  try {
    await inSlices(Math.ceil(bytes.length / DECODED_AT_ONCE), (i) => {
      text += decoder.decode(bytes.subarray(i * DECODED_AT_ONCE, (i + 1) * DECODED_AT_ONCE), { stream: true })
    })
    return text + decoder.decode()
  } catch (error) {
    if (error instanceof TypeError) fail('malformed-body', 'The body is not UTF-8.')
    throw error
  }
}

/** The body as bytes. Fails with too-large. */
export const readRecordBytes = (request: Request): Promise<Uint8Array> => readBytes(request, MOST_RECORD_BYTES, 'A body of records')

const isArchiveName = (name: string): boolean => /\.zip$/i.test(name)

/** Only a body that announces an archive, by the name of its file at the head of the part, may be longer than a URDF is. */
function mayBeAsLong(pieces: readonly Uint8Array[], length: number): boolean {
  if (length <= MOST_URDF_BYTES + MULTIPART_ROOM) return true
  let head = ''
  for (let i = 0; i < pieces.length && head.length < MULTIPART_ROOM; i++) head += Buffer.from(pieces[i]!.subarray(0, MULTIPART_ROOM)).toString('latin1')
  return /\bfilename\*?=[^\r\n]*\.zip"?[\r\n;]/i.test(head.slice(0, MULTIPART_ROOM))
}

/** The multipart body: its one file and its text fields. Fails with too-large, malformed-body or invalid-request. */
export async function readForm(request: Request): Promise<{ fields: Record<string, string>; file: UploadedFile }> {
  const bytes = await readBytes(request, MOST_ARCHIVE_BYTES + MULTIPART_ROOM, 'The upload', mayBeAsLong)
  let data: FormData
  try {
    data = await new Response(bytes as BodyInit, { headers: { 'content-type': request.headers.get('content-type') ?? '' } }).formData()
  } catch {
    fail('malformed-body', 'The body is not multipart/form-data, or it ends before its closing boundary.')
  }
  const fields: Record<string, string> = Object.create(null)
  let file: UploadedFile | undefined
  for (const [name, value] of data) {
    const repeated = name === 'file' ? file !== undefined : name in fields
    if (repeated) fail('invalid-request', undefined, { errors: [{ pointer: pointerOf('/form', [name]), detail: 'is given more than once' }] })
    if (typeof value === 'string') {
      fields[name] = value
    } else if (name === 'file') {
      file = { name: value.name, bytes: new Uint8Array(await value.arrayBuffer()) }
    } else {
      fail('invalid-request', undefined, { errors: [{ pointer: pointerOf('/form', [name]), detail: 'is a file; the file goes into the part named "file"' }] })
    }
  }
  if (file === undefined) {
    fail('invalid-request', undefined, { errors: [{ pointer: '/form/file', detail: 'is missing: send the URDF as a file in the part named "file"' }] })
  }
  const [what, most] = isArchiveName(file.name) ? ['An archive', MOST_ARCHIVE_BYTES] : ['A URDF', MOST_URDF_BYTES]
  if (file.bytes.length > most) fail('too-large', `${what} may have at most ${most} bytes; this one has ${file.bytes.length}.`)
  return { fields, file }
}
