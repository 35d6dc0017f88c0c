import request, { type Response, type Test } from 'supertest'
import { inject } from 'vitest'
import type { Method } from '@/lib/contract/operation'
import type { SessionFields } from './support/sign-in'

export type Fields = Readonly<Record<string, string>>
export type Headers = Fields | SessionFields

/** A request to the served scenario. */
export interface Sent {
  readonly method: Method | 'HEAD' | 'OPTIONS'
  /** Under /api/v1. */
  readonly path: string
  readonly headers?: Headers
  /** A JSON body. */
  readonly json?: unknown
  /** A body as it stands; its content-type is among the headers. */
  readonly raw?: string
  /** A multipart body. */
  readonly form?: { readonly fields: Fields; readonly file?: { readonly name: string; readonly bytes: Buffer } }
}

const VERBS = { GET: 'get', POST: 'post', PUT: 'put', PATCH: 'patch', DELETE: 'delete', HEAD: 'head', OPTIONS: 'options' } as const

function withBody(test: Test, { json, raw, form }: Sent): Test {
  if (raw !== undefined) return test.send(raw)
  if (json !== undefined) return test.type('application/json').send(JSON.stringify(json))
  if (form === undefined) return test
  for (const [name, value] of Object.entries(form.fields)) void test.field(name, value)
  return form.file === undefined ? test : test.attach('file', form.file.bytes, form.file.name)
}

/** Sends a request and answers whatever came back, whatever its status. */
export async function send(sent: Sent): Promise<Response> {
  const test = request(inject('served').url)[VERBS[sent.method]](`/api/v1${sent.path}`).set({ ...sent.headers })
  return withBody(test, sent)
}

export const get = (path: string, headers: Headers): Promise<Response> => send({ method: 'GET', path, headers })

/** A path of the contract with its {parameters} filled in. Fails when one is missing, which a new kind of thing has to be given. */
export const fill = (path: string, places: Fields): string =>
  path.replace(/\{(\w+)\}/g, (_, name: string) => {
    const place = places[name]
    if (place === undefined) throw new Error(`no example of {${name}} is known to these tests`)
    return place
  })
