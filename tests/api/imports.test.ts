import { request } from 'node:http'
import { describe, expect, inject, it } from 'vitest'
import type { CheckedImport } from '@/lib/contract/description'
import type { z } from 'zod'
import { WORST_FILES } from '../bench/worst-files'
import { expectProblem } from './expect-problem'
import { postModel } from './import-model'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'

const check = async (bytes: Buffer | string, name = 'robot.urdf') =>
  send({ method: 'POST', path: '/teams/tarnholm/imports/check', headers: await asPerson('ines'), form: { fields: {}, file: { name, bytes: Buffer.from(bytes) } } })
const robot = (body: string): string => `<robot name="r">${body}</robot>`
const utf16 = (text: string): Buffer => Buffer.from(text, 'utf16le').swap16()

const HOSTILE: readonly (readonly [string, string, () => Buffer | string])[] = [
  ['a bomb of entities', 'doctype-refused', () => '<!DOCTYPE r [<!ENTITY a "ha"><!ENTITY b "&a;&a;&a;&a;"><!ENTITY c "&b;&b;&b;&b;">]><robot name="&c;"/>'],
  ['a file of the server as an entity', 'doctype-refused', () => '<!DOCTYPE r [<!ENTITY a SYSTEM "file:///etc/hostname">]><robot name="&a;"/>'],
  ['100 000 levels', 'too-deep', () => '<a>'.repeat(100_000)],
  ['100 000 attributes', 'too-many-attributes', () => `<robot ${Array.from({ length: 100_000 }, (_, i) => `a${i}=""`).join(' ')}/>`],
  ['a PNG picture', 'not-xml', () => Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex')],
  ['a PDF document', 'not-xml', () => '%PDF-1.7\n%âãÏÓ'],
  ['a web page', 'not-xml', () => '<!doctype html><html><body>Not found</body></html>'],
  ['JSON', 'not-xml', () => '{"robot": {"name": "r"}}'],
  ['a zip archive', 'not-xml', () => Buffer.from('504b0304140000000800', 'hex')],
  ['SDF', 'not-urdf', () => '<sdf version="1.9"><model name="r"/></sdf>'],
  ['latin-1', 'encoding-unsupported', () => Buffer.from(robot('<link name="Gelenk-ä"/>'), 'latin1')],
  ['overlong UTF-8', 'encoding-unsupported', () => Buffer.concat([Buffer.from('<robot name="'), Buffer.from([0xc0, 0xaf]), Buffer.from('"/>')])],
  ['UTF-16 without a mark', 'encoding-unsupported', () => utf16(robot('<link name="a"/>'))],
  ['a NUL', 'xml-malformed', () => robot('<link name="a\0b"/>')],
  ['a control character', 'xml-malformed', () => robot('<link name="a\u0007"/>')],
  ['a name of a megabyte', 'name-too-long', () => robot(`<link name="${'x'.repeat(1_000_000)}"/>`)],
  ['nothing', 'not-xml', () => ''],
]

const ACCEPTED: readonly (readonly [string, Buffer | string, string])[] = [
  ['UTF-16 with a mark', utf16(`\uFEFF${robot('<link name="a"/>')}`), 'a'],
  ['the name __proto__', robot('<link name="__proto__"/>'), '__proto__'],
  ['the name constructor', robot('<link name="constructor"/>'), 'constructor'],
  ['a script as a name', robot('<link name="&lt;script&gt;alert(1)&lt;/script&gt;"/>'), '<script>alert(1)</script>'],
  ['a way up as a name', robot('<link name="../../etc"/>'), '../../etc'],
]

describe('the check of an import', () => {
  it.each(HOSTILE)('answers to %s what is wrong with it, and nothing is stored', async (_what, rule, make) => {
    const checked = await check(make())
    expect([checked.status, checked.body.structure]).toEqual([200, undefined])
    expect((checked.body as z.infer<typeof CheckedImport>).findings.filter(({ severity }) => severity === 'error').map((finding) => finding.rule)).toEqual([rule])
    const stored = await send({
      method: 'POST', path: '/teams/tarnholm/models', headers: await asPerson('ines'), form: { fields: { name: 'Hostile' }, file: { name: 'r.urdf', bytes: Buffer.from(make()) } },
    })
    expectProblem(stored, 'import-refused')
    expect((stored.body as { findings: unknown }).findings).toEqual(checked.body.findings)
  })

  it.each(ACCEPTED)('accepts %s and answers the name as it is', async (_what, bytes, name) => {
    const checked = await check(bytes)
    expect([checked.status, checked.body.structure?.links]).toEqual([200, [{ name }]])
    const stored = await send({
      method: 'POST', path: '/teams/tarnholm/models', headers: await asPerson('ines'), form: { fields: { name: 'Odd names' }, file: { name: '../../r<script>.urdf', bytes: Buffer.from(bytes) } },
    })
    expect([stored.status, stored.body.revision.links, stored.body.revision.fileName]).toEqual([201, [{ name }], 'r<script>.urdf'])
  })

  it('refuses a body beyond what is read before it looks into it', async () => {
    expectProblem(await check(robot(' '.repeat(20_000_000))), 'too-large')
  })

  it('delivers 3 000 findings', async () => {
    const { status, body } = await check(robot('<link/>'.repeat(3000)))
    expect([status, (body as z.infer<typeof CheckedImport>).findings.filter(({ rule }) => rule === 'name-missing').length]).toEqual([200, 3000])
  })

  it('answers JSON that says its type, however large the robot', async () => {
    const chain = robot(
      Array.from({ length: 5000 }, (_, i) => `<link name="l${i}"/>`).join('') +
        Array.from({ length: 4999 }, (_, i) => `<joint name="j${i}" type="fixed"><parent link="l${i}"/><child link="l${i + 1}"/></joint>`).join(''),
    )
    const { status, headers, body } = await check(chain)
    expect([status, headers['content-type'], body.structure.counts]).toEqual([200, 'application/json', { links: 5000, joints: 4999, independent: 0 }])
  })

  it('stores a chain of 5 000 links', async () => {
    const chain = Array.from({ length: 4999 }, (_, i) => `<joint name="j${i}" type="fixed"><parent link="l${i}"/><child link="l${i + 1}"/></joint>`).join('')
    const stored = await postModel({ name: 'A chain of 5 000 links' }, robot(Array.from({ length: 5000 }, (_, i) => `<link name="l${i}"/>`).join('') + chain))
    expect([stored.status, stored.body.revision.counts.links]).toEqual([201, 5000])
  })
})

/** Sends a file to be checked; `sent` settles when the last byte has left, `answered` with the status. */
async function checkSlowly(bytes: Buffer) {
  const { url } = inject('served')
  const boundary = 'worst-file'
  const head = Buffer.from(`--${boundary}\r\ncontent-disposition: form-data; name="file"; filename="worst.urdf"\r\ncontent-type: application/octet-stream\r\n\r\n`)
  const body = Buffer.concat([head, bytes, Buffer.from(`\r\n--${boundary}--\r\n`)])
  const headers = { ...(await asPerson('ines')), 'content-type': `multipart/form-data; boundary=${boundary}`, 'content-length': String(body.length) }
  const posted = request(`${url}/api/v1/teams/tarnholm/imports/check`, { method: 'POST', headers })
  const sent = new Promise<void>((resolve) => posted.once('finish', resolve))
  const answered = new Promise<number>((resolve, reject) => {
    posted.once('error', reject).once('response', (response) => response.resume().once('end', () => resolve(response.statusCode!)))
  })
  posted.end(body)
  return { sent, answered }
}

describe('while the worst file is read', () => {
  /** One request at a time; were the event loop held up by the reading, a few could come before it and the rest only behind. */
  const ENOUGH = 25

  it('health, the register and kinematics answer again and again before the file is done', async () => {
    const { url } = inject('served')
    const { sent, answered } = await checkSlowly(Buffer.from(WORST_FILES['a chain of 28 000 revolute joints']!()))
    await sent
    const events: string[] = []
    const done = answered.then((status) => events.push(`check ${status}`))
    const person = await asPerson('kofi')
    for (let i = 0; i < 3 * ENOUGH && !events.some((event) => event.startsWith('check')); i++) {
      const asked = [
        async () => (await fetch(`${url}/api/health/${i % 2 === 0 ? 'live' : 'ready'}`)).status,
        async () => (await get('/teams/tarnholm/models', person)).status,
        async () =>
          (await send({ method: 'POST', path: '/teams/tarnholm/models/trainer-3r/revisions/released/forward-kinematics', headers: asKey(), json: { configurations: [[0, 0, 0]] } })).status,
      ][i % 3]!
      events.push(`others ${await asked()}`)
    }
    await done
    expect(events.filter((event) => !['others 200', 'check 200'].includes(event))).toEqual([])
    expect(events.indexOf('check 200')).toBeGreaterThanOrEqual(ENOUGH)
  })

  it('a second file is answered, too', async () => {
    const first = await checkSlowly(Buffer.from(WORST_FILES['190 000 links that nothing joins']!()))
    const [status, small] = await Promise.all([first.answered, check(robot('<link name="a"/>'))])
    expect([status, small.status, small.body.findings]).toEqual([200, 200, []])
  })
})
