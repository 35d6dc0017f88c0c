import { describe, expect, it } from 'vitest'
import type { Revision } from '@/lib/contract/model'
import { PROBLEMS, type ProblemCode } from '@/lib/errors'
import { importModel, postRevision, postTransition } from './import-model'
import { expectProblem, pointersOf } from './expect-problem'
import { makeKey } from './make-key'
import { get, send } from './send'
import { asKey, asPerson, type Person } from './support/callers'
import { snake } from './urdf'

type Status = Revision['status']

/** How a fresh draft, imported by ines, is led to each status. A release of revision 1 is superseded by one of revision 2. */
const WAYS: Record<Status, readonly (readonly [to: string, by: Person])[]> = {
  draft: [],
  'in-review': [['in-review', 'ines']],
  released: [['in-review', 'ines'], ['released', 'tomas']],
  superseded: [['in-review', 'ines'], ['released', 'tomas']],
  withdrawn: [['withdrawn', 'ines']],
}

let counter = 0

/** A model whose revision 1 has this status. */
async function modelAt(status: Status): Promise<string> {
  const { model } = await importModel(`Led to ${status} ${++counter}`, 'trainer-3r.urdf')
  for (const [to, by] of WAYS[status]) expect((await postTransition(model.slug, 1, to, by)).status).toBe(200)
  if (status === 'superseded') {
    await postRevision(model.slug, 'gannet-4.urdf')
    await postTransition(model.slug, 2, 'in-review', 'ines')
    await postTransition(model.slug, 2, 'released', 'tomas')
  }
  return model.slug
}

const modelOf = async (slug: string) => (await get(`/teams/tarnholm/models/${slug}`, await asPerson('kofi'))).body as { released?: number; latest: { status: Status } }

/** API.md section 2, row by row: what an engineer (ines) and an approver (tomas) get for each change of status. */
const TABLE: readonly (readonly [from: Status, to: Status, engineer: ProblemCode | 200, approver: ProblemCode | 200])[] = [
  ['draft', 'draft', 'transition-refused', 'transition-refused'],
  ['draft', 'in-review', 200, 200],
  // The team demands a review.
  ['draft', 'released', 'role-missing', 'transition-refused'],
  ['draft', 'withdrawn', 200, 200],
  ['in-review', 'draft', 200, 200],
  ['in-review', 'in-review', 'transition-refused', 'transition-refused'],
  ['in-review', 'released', 'role-missing', 200],
  ['in-review', 'withdrawn', 200, 200],
  ['released', 'draft', 'transition-refused', 'transition-refused'],
  ['released', 'in-review', 'transition-refused', 'transition-refused'],
  ['released', 'released', 'role-missing', 'transition-refused'],
  ['released', 'withdrawn', 'role-missing', 200],
  ['superseded', 'draft', 'transition-refused', 'transition-refused'],
  ['superseded', 'in-review', 'transition-refused', 'transition-refused'],
  ['superseded', 'released', 'role-missing', 'transition-refused'],
  ['superseded', 'withdrawn', 'role-missing', 200],
  ['withdrawn', 'draft', 'transition-refused', 'transition-refused'],
  ['withdrawn', 'in-review', 'transition-refused', 'transition-refused'],
  ['withdrawn', 'released', 'role-missing', 'transition-refused'],
  ['withdrawn', 'withdrawn', 'transition-refused', 'transition-refused'],
]

describe.each(['ines', 'tomas'] as const)('the changes of status that %s asks for', (person) => {
  it.each(TABLE)('from %s to %s', async (from, to, engineer, approver) => {
    const expected = person === 'ines' ? engineer : approver
    const slug = await modelAt(from)
    const response = await postTransition(slug, 1, to, person, 'As the table says.')
    const after = (await get(`/teams/tarnholm/models/${slug}/revisions/1`, await asPerson('kofi'))).body as Revision
    if (expected !== 200) {
      expectProblem(response, expected)
      expect(after.status).toBe(from)
      return
    }
    expect(response.status, response.text).toBe(200)
    expect(response.body).toEqual(after)
    expect(after.history.at(-1)).toMatchObject({ status: to, by: person === 'ines' ? 'Ines Okafor' : 'Tomas Aasen', comment: 'As the table says.' })
  })
})

describe('four eyes', () => {
  const release = async (importer: Person, submitter: Person, releaser: Person) => {
    const { model } = await importModel(`Eyes ${++counter}`, 'trainer-3r.urdf', importer)
    await postTransition(model.slug, 1, 'in-review', submitter)
    return postTransition(model.slug, 1, 'released', releaser)
  }

  it('keep importer and submitter from releasing', async () => {
    const imported = await release('tomas', 'ines', 'tomas')
    expectProblem(imported, 'four-eyes')
    expect(imported.body).toMatchObject({ detail: expect.stringContaining('imported') })
    const submitted = await release('ines', 'mira', 'mira')
    expectProblem(submitted, 'four-eyes')
    expect(submitted.body).toMatchObject({ detail: expect.stringContaining('submitted') })
  })

  it('let anybody else release', async () => {
    expect((await release('ines', 'tomas', 'mira')).status).toBe(200)
    expect((await release('tomas', 'ines', 'mira')).status).toBe(200)
  })

  it('look at the last submission', async () => {
    const { model } = await importModel(`Eyes ${++counter}`, 'trainer-3r.urdf')
    for (const [to, by] of [['in-review', 'tomas'], ['draft', 'ines'], ['in-review', 'ines']] as const) await postTransition(model.slug, 1, to, by)
    expect((await postTransition(model.slug, 1, 'released', 'tomas')).status).toBe(200)
  })

  it('see through a key to the person who made it', async () => {
    const { key } = await makeKey(['catalog:write'])
    const { model } = (
      await send({ method: 'POST', path: '/teams/tarnholm/models', headers: asKey(key), form: { fields: { name: `Eyes ${++counter}` }, file: { name: 'a.urdf', bytes: Buffer.from(snake(1)) } } })
    ).body as { model: { slug: string } }
    await postTransition(model.slug, 1, 'in-review', 'ines')
    expectProblem(await postTransition(model.slug, 1, 'released', 'mira'), 'four-eyes')
    expect((await postTransition(model.slug, 1, 'released', 'tomas')).status).toBe(200)
  })
})

describe('the revision in force', () => {
  it('is superseded by the next release and says why', async () => {
    const slug = await modelAt('superseded')
    expect((await modelOf(slug)).released).toBe(2)
    const { history } = (await get(`/teams/tarnholm/models/${slug}/revisions/1`, await asPerson('kofi'))).body as Revision
    expect(history.map(({ status }) => status)).toEqual(['draft', 'in-review', 'released', 'superseded'])
    expect(history.at(-1)).toMatchObject({ by: 'Tomas Aasen', comment: 'Revision 2 was released.' })
  })

  it('leaves none behind when it is withdrawn, and revives nothing', async () => {
    const slug = await modelAt('superseded')
    expect((await postTransition(slug, 'released', 'withdrawn', 'tomas')).status).toBe(200)
    expect(await modelOf(slug)).not.toHaveProperty('released')
    expectProblem(await get(`/teams/tarnholm/models/${slug}/revisions/released`, await asPerson('kofi')), 'nothing-released')
    const first = (await get(`/teams/tarnholm/models/${slug}/revisions/1`, await asPerson('kofi'))).body as Revision
    expect(first.status).toBe('superseded')
  })

  it('stays in force when an older revision is withdrawn', async () => {
    const slug = await modelAt('superseded')
    expect((await postTransition(slug, 1, 'withdrawn', 'tomas')).status).toBe(200)
    expect((await modelOf(slug)).released).toBe(2)
  })

  it('is one, whoever of two releases at the same moment comes first', async () => {
    const { model } = await importModel(`Raced ${++counter}`, 'trainer-3r.urdf')
    await postRevision(model.slug, 'gannet-4.urdf')
    for (const revision of [1, 2]) await postTransition(model.slug, revision, 'in-review', 'ines')
    const both = await Promise.all([postTransition(model.slug, 1, 'released', 'tomas'), postTransition(model.slug, 2, 'released', 'mira')])
    expect(both.map(({ status }) => status)).toEqual([200, 200])
    const statuses = await Promise.all([1, 2].map(async (revision) => ((await get(`/teams/tarnholm/models/${model.slug}/revisions/${revision}`, await asPerson('kofi'))).body as Revision).status))
    expect([...statuses].sort()).toEqual(['released', 'superseded'])
    expect((await modelOf(model.slug)).released).toBe(statuses.indexOf('released') + 1)
  })

  it('is released once when two people press at the same moment', async () => {
    const slug = await modelAt('in-review')
    const both = await Promise.all([postTransition(slug, 1, 'released', 'tomas'), postTransition(slug, 1, 'released', 'mira')])
    expect(both.map(({ status }) => status).sort()).toEqual([200, PROBLEMS['transition-refused'].status])
  })
})

describe('a request for a change of status', () => {
  it.each([
    [{ to: 'superseded' }, '/to'],
    [{ to: 'Released' }, '/to'],
    [{}, '/to'],
    [{ to: 'in-review', comment: 'x'.repeat(2001) }, '/comment'],
    [{ to: 'in-review', comment: '\u0007' }, '/comment'],
    [{ to: 'in-review', reason: 'x' }, '/reason'],
  ])('is refused with %j', async (json, pointer) => {
    const response = await send({ method: 'POST', path: '/teams/tarnholm/models/skerry-7-rail/revisions/1/transitions', headers: await asPerson('ines'), json })
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual([pointer])
  })
})
