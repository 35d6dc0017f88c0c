import { inject } from 'vitest'
import { asKey } from '../support/callers'

export const JSON_TYPE = 'application/json'
export const CSV_TYPE = 'text/csv'
export const BINARY_TYPE = 'application/octet-stream'

export interface RecordsAsked {
  readonly question: string
  /** "slug", which is its revision 1, or "slug/revision". */
  readonly model?: string
  /** A JSON body. */
  readonly json?: object
  /** A body of binary64 records, or of bytes as they are. */
  readonly records?: readonly number[] | Uint8Array
  /** What stands beside the records; text is sent as it is. */
  readonly beside?: object | string
  readonly accept?: string
  readonly headers?: Readonly<Record<string, string>>
}

/** Numbers as little-endian binary64. */
export function bytesOf(numbers: readonly number[]): Uint8Array {
  const bytes = new Uint8Array(8 * numbers.length)
  const view = new DataView(bytes.buffer)
  numbers.forEach((value, i) => view.setFloat64(8 * i, value, true))
  return bytes
}

/** Little-endian binary64 as numbers. */
export const numbersOf = (bytes: ArrayBuffer): number[] => {
  const view = new DataView(bytes)
  return Array.from({ length: bytes.byteLength / 8 }, (_, i) => view.getFloat64(8 * i, true))
}

/** Sends a question in either format and takes the answer as bytes. */
export async function askRecords({ question, model = 'skerry-7', json, records, beside, accept, headers }: RecordsAsked) {
  const [slug, revision = '1'] = model.split('/')
  const query = beside === undefined ? '' : `?question=${encodeURIComponent(typeof beside === 'string' ? beside : JSON.stringify(beside))}`
  const body = records === undefined ? JSON.stringify(json) : records instanceof Uint8Array ? records : bytesOf(records)
  const response = await fetch(`${inject('served').url}/api/v1/teams/tarnholm/models/${slug}/revisions/${revision}/${question}${query}`, {
    method: 'POST',
    headers: { ...asKey(), 'content-type': records === undefined ? JSON_TYPE : BINARY_TYPE, ...(accept === undefined ? {} : { accept }), ...headers },
    body: body as BodyInit,
  })
  const bytes = await response.arrayBuffer()
  const text = () => new TextDecoder().decode(bytes)
  return { status: response.status, headers: response.headers, bytes, text: text(), json: () => JSON.parse(text()) as unknown }
}

export type Answered = Awaited<ReturnType<typeof askRecords>>

/** The problem's code, its detail and the places it points at. */
export function problemOf({ status, headers, json }: Answered) {
  const { type, detail, errors = [] } = json() as { type: string; detail: string; errors?: { pointer: string }[] }
  return { status, media: headers.get('content-type'), code: type.replace('/docs/problems/', ''), detail, pointers: errors.map(({ pointer }) => pointer) }
}

/** A column of Record-Layout and what it holds. */
export interface LaidOut {
  readonly path: string
  readonly count: number
  readonly parameters: Readonly<Record<string, string>>
}

/** Reads Record-Layout as a planner's program would. */
export function readLayout(field: string): LaidOut[] {
  return field.split(', ').map((item) => {
    const [path = '', ...given] = item.split(';')
    const parameters = Object.fromEntries(given.map((parameter) => [parameter.split('=')[0]!, (parameter.split('=')[1] ?? '').replaceAll('"', '')]))
    const count = ['length', 'planes', 'rows', 'columns'].reduce((product, name) => product * Number(parameters[name] ?? 1), 1)
    return { path, count, parameters }
  })
}

/** Every result of a binary reply as a map from path to its numbers. */
export function readRecords({ headers, bytes }: Answered): Map<string, number[]>[] {
  const layout = readLayout(headers.get('record-layout')!)
  const width = layout.reduce((sum, { count }) => sum + count, 0)
  const numbers = numbersOf(bytes)
  return Array.from({ length: numbers.length / width }, (_, record) => {
    let at = record * width
    return new Map(layout.map(({ path, count }) => [path, numbers.slice(at, (at += count))]))
  })
}

/** CSV as rows of cells, by RFC 4180 and nothing else. */
export function readCsv(text: string): string[][] {
  const rows: string[][] = []
  let row: string[] = []
  for (let at = 0; at < text.length; ) {
    let cell = ''
    if (text[at] === '"') {
      for (at++; text[at] !== '"' || text[at + 1] === '"'; at += text[at] === '"' ? 2 : 1) cell += text[at]
      at++
    } else {
      const end = text.slice(at).search(/,|\r\n|$/)
      cell = text.slice(at, at + end)
      at += end
    }
    row.push(cell)
    if (text[at] === ',') at++
    else if (text.startsWith('\r\n', at)) {
      at += 2
      rows.push(row)
      row = []
    } else throw new Error(`neither a comma nor a line's end at ${at}: ${text.slice(at, at + 20)}`)
  }
  return rows
}

/** What stands at a path of a result, undefined where nothing does; of a list at *, what stands there in each entry. */
export function atPath(result: unknown, path: string): unknown {
  if (result === null || result === undefined || path === '') return result
  const [part = '', ...rest] = path.split('.')
  if (part === '*') return (result as unknown[]).map((entry) => atPath(entry, rest.join('.')))
  return atPath((result as Record<string, unknown>)[part], rest.join('.'))
}
