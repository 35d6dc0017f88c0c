import { drawKey } from '@/lib/access/key-text'
import { SCOPES } from '@/lib/contract/key-operations'
import type { Operation } from '@/lib/contract/operation'
import type { OperationName } from '@/lib/contract/operations'
import type { ProblemCode } from '@/lib/errors'
import { endedSession } from './ended-session'
import { exampleRequest, PLACES, sample } from './example-request'
import { importModel, importReleased, postTransition } from './import-model'
import { makeExpiredKey, makeKey, makeRevokedKey, mistype } from './make-key'
import type { Fields, Headers, Sent } from './send'
import { asKey, asPerson } from './support/callers'
import { importLost } from './upload-archive'
import { floatingCart, snake } from './urdf'

type Provoke = (operation: Operation, name: OperationName) => Promise<Sent>

/** Made once, when first asked for. */
function once<T>(make: () => Promise<T>): () => Promise<T> {
  let made: Promise<T> | undefined
  return () => (made ??= make())
}

const everyScope = once(() => makeKey(SCOPES))
const revoked = once(() => makeRevokedKey(SCOPES))
const expired = once(() => makeExpiredKey(SCOPES))
const ended = once(() => endedSession('mira'))
const aKey = once(async () => (await makeKey(['gateway'])).id)
const lost = once(importLost)
const longArm = once(async () => (await importModel('A very long arm', snake(100))).model.slug)
const longestArm = once(async () => (await importModel('A longer arm still', snake(300, 0.02))).model.slug)
/** So many joints that their check vectors would not fit into an answer. */
const longestReleased = once(() => importReleased('An arm beyond measure', snake(16_500, 0.001)))
const cartReleased = once(() => importReleased('A released cart', floatingCart()))
const cart = once(async () => (await importModel('A cart', floatingCart())).model.slug)

/** The declared example as an administrator, who may do everything, with changes. */
async function asAdministrator(operation: Operation, more: Partial<Sent> = {}, places: Fields = {}): Promise<Sent> {
  const headers: Headers = { ...(await asPerson('mira')), ...more.headers }
  return { ...exampleRequest(operation, headers, { ...PLACES, key: await aKey(), ...places }), ...more, headers }
}

const withHeaders = (make: () => Promise<Headers>): Provoke => async (operation) => exampleRequest(operation, await make(), { ...PLACES, key: await aKey() })

/** The request with a query. */
const withQuery = (query: Fields, places: Fields = {}): Provoke => async (operation) => {
  const sent = await asAdministrator(operation, {}, places)
  return { ...sent, path: `${sent.path}?${new URLSearchParams({ ...query })}` }
}

/** The JSON example with other fields. */
const withFields = (fields: object, places: Fields = {}): Provoke => async (operation) =>
  asAdministrator(operation, { json: { ...(operation.example as object), ...fields } }, places)

const rows = (count: number, joints: number) => Array.from({ length: count }, () => new Array<number>(joints).fill(0))

const outOfReach = (count: number) => new Array<object>(count).fill({ position: [1e6, 0, 0], quaternion: [0, 0, 0, 1] })

const MEBIBYTE = 1024 * 1024

/** A body that carries nothing but its content type. */
async function withRaw(operation: Operation, raw: string): Promise<Sent> {
  const type = operation.form === undefined ? 'application/json' : 'multipart/form-data; boundary=edge'
  const { json: _json, form: _form, ...bare } = await asAdministrator(operation, { headers: { 'content-type': type } })
  return { ...bare, raw }
}

/** One request for each problem that provokes it and nothing else. An operation that declares a new code fails until it has a row. */
export const PROVOCATIONS: Partial<Record<ProblemCode, Provoke>> = {
  'sign-in-required': withHeaders(async () => ({})),
  'session-ended': withHeaders(ended),
  'key-mistyped': withHeaders(async () => asKey(mistype((await everyScope()).key))),
  'key-unknown': withHeaders(async () => asKey(drawKey().key)),
  'key-expired': withHeaders(async () => asKey((await expired()).key)),
  'key-revoked': withHeaders(async () => asKey((await revoked()).key)),
  'scope-missing': withHeaders(async () => asKey((await makeKey(['gateway'])).key)),
  'session-only': withHeaders(async () => asKey((await everyScope()).key)),
  'role-missing': withHeaders(() => asPerson('kofi')),
  'origin-refused': withHeaders(async () => ({ ...(await asPerson('mira')), origin: 'https://elsewhere.example' })),
  'team-not-found': (operation) => asAdministrator(operation, {}, { team: 'never-was' }),
  'model-not-found': (operation) => asAdministrator(operation, {}, { model: 'never-was' }),
  'revision-not-found': (operation, name) =>
    name === 'compareRevisions' ? withQuery({ from: '4000000' })(operation, name) : asAdministrator(operation, {}, { revision: '4000000' }),
  'nothing-released': (operation, name) =>
    name === 'compareRevisions'
      ? withQuery({ from: 'released' }, { model: 'skerry-7-rail' })(operation, name)
      : asAdministrator(operation, {}, { model: 'skerry-7-rail', revision: 'released' }),
  'reference-poses-not-found': (operation) => asAdministrator(operation, {}, { set: '4000000' }),
  'key-not-found': (operation) => asAdministrator(operation, {}, { key: 'neverWas0000' }),
  'not-acceptable': (operation) => asAdministrator(operation, { headers: { accept: 'image/png' } }),
  'unsupported-media-type': async (operation) => ({
    ...(await withRaw(operation, '<robot/>')),
    headers: { ...(await asPerson('mira')), 'content-type': 'text/plain' },
  }),
  'too-large': (operation) => withRaw(operation, ' '.repeat(9 * MEBIBYTE)),
  'malformed-body': (operation) => withRaw(operation, '{"to": "rele'),
  'invalid-request': async (operation) => {
    const sent = await asAdministrator(operation)
    return { ...sent, path: `${sent.path}?nobodyDeclaredThis=1` }
  },
  'if-match-required': (operation) => asAdministrator(operation),
  stale: (operation) => asAdministrator(operation, { headers: { 'if-match': '"of another state"' } }),
  'fingerprint-mismatch': (operation) => asAdministrator(operation, { headers: { 'if-match': `"${'0'.repeat(64)}"` } }),
  'length-mismatch': (operation, name) =>
    withFields({ [name === 'inverseKinematics' ? 'seeds' : 'configurations']: [[0, 0, 0, 0, 0, 0]] })(operation, name),
  'chain-not-found': (operation, name) => (operation.body === undefined ? withQuery({ tip: 'never_was' }) : withFields({ chain: { tip: 'never_was' } }))(operation, name),
  'chain-not-computable': async (operation, name) => {
    if (name === 'compareRevisions') return withQuery({ base: 'ground', tip: 'arm' }, { model: await cart() })(operation, name)
    if (name === 'getCheckVectors') return withQuery({ base: 'ground', tip: 'arm' }, { model: await cartReleased() })(operation, name)
    if (operation.tag === 'Evidence') return withFields({ chain: { base: 'ground', tip: 'arm' } }, { model: await cart() })(operation, name)
    return withFields(
      { ...(name === 'inverseKinematics' ? { seeds: [[0]] } : { configurations: [[0]] }), chain: { base: 'ground', tip: 'arm' } },
      { model: await cart() },
    )(operation, name)
  },
  'answer-too-large': async (operation, name) => {
    if (name === 'getCheckVectors') return asAdministrator(operation, {}, { model: await longestReleased() })
    if (name === 'inverseKinematics') return withFields({ targets: outOfReach(10_000), seeds: undefined }, { model: await longestArm() })(operation, name)
    return withFields(
      { configurations: rows(10_000, 100), ...(name === 'jointRates' ? { secondary: [] } : {}), ...(name === 'forwardKinematics' ? { links: new Array(50).fill('l1') } : {}) },
      { model: await longArm() },
    )(operation, name)
  },
  // More than half a million searches by an arm of a hundred joints: no machine does them in ten seconds.
  'budget-exceeded': async (operation, name) =>
    withFields({ targets: outOfReach(10_000), seeds: undefined, attempts: 64, include: ['converged'] }, { model: await longArm() })(operation, name),
  'link-not-determined': withFields({ chain: { tip: 'link_3' }, configurations: [[0, 0, 0]], links: ['link_1', 'tool_flange'] }),
  'mesh-not-found': (operation) => asAdministrator(operation, {}, { path: 'never/was.stl' }),
  'file-unavailable': async (operation) => asAdministrator(operation, {}, { model: await lost() }),
  'import-refused': (operation) => asAdministrator(operation),
  'slug-taken': (operation) =>
    asAdministrator(operation, { form: { fields: { name: 'Skerry', slug: 'skerry-7' }, file: { name: 'skerry-7.urdf', bytes: sample('skerry-7.urdf') } } }),
  'same-content': (operation) => asAdministrator(operation, { form: { fields: {}, file: { name: 'again.urdf', bytes: sample('skerry-7.urdf') } } }),
  'transition-refused': (operation) => asAdministrator(operation, { json: { to: 'in-review' } }),
  'not-released': (operation) => asAdministrator(operation, {}, { model: 'fulmar-6' }),
  'evidence-missing': async (operation) => {
    const { model } = await importModel('Never measured', 'trainer-3r.urdf', 'runa', 'kestrel')
    await postTransition(model.slug, 1, 'in-review', 'runa', undefined, 'kestrel')
    return { ...exampleRequest(operation, await asPerson('runa'), { ...PLACES, team: 'kestrel', model: model.slug }), json: { to: 'released' } }
  },
  'four-eyes': async (operation) => {
    const { model } = await importModel('Imported and released by one', 'trainer-3r.urdf', 'mira')
    await postTransition(model.slug, 1, 'in-review', 'ines')
    return asAdministrator(operation, { json: { to: 'released' } }, { model: model.slug })
  },
}
