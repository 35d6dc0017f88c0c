import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { insertModels } from '@/db/queries/insert-models'
import { insertMember, insertTeam, insertUser } from '@/db/queries/people'
import type { Caller } from '@/lib/access/caller'
import { getReviewQueue } from '@/lib/teams/review-queue'
import { parseUrdf } from '@/lib/urdf/parse-urdf'
import { drawnArm } from '@/tests/bench/drawn-arm'
import { BOTH, type TestDatabase } from './support/both-databases'

const day = (n: number) => new Date(Date.UTC(2026, 10, n))
const { description } = parseUrdf(new TextEncoder().encode(drawnArm('arm', 3, 0.2)))

describe.each(BOTH)('the review queue on the $kind database', ({ open }) => {
  let base: TestDatabase
  let caller: (who: string, fourEyes?: boolean) => Caller & { kind: 'person' }
  beforeAll(async () => {
    base = await open()
    const { db } = base
    const team = await insertTeam(db, { slug: 'tarnholm', name: 'Tarnholm' })
    const other = await insertTeam(db, { slug: 'kestrel', name: 'Kestrel' })
    const ids = new Map<string, string>()
    for (const [name, role] of [['Ines', 'engineer'], ['Tomas', 'approver'], ['Mira', 'administrator'], ['Kofi', 'reader']] as const) {
      const { id } = await insertUser(db, { email: `${name}@tarnholm.example`, name, passwordHash: '-' })
      await insertMember(db, { teamId: team.id, userId: id, role })
      ids.set(name, id)
    }
    caller = (who, fourEyes = true) => ({
      kind: 'person', sessionId: 's', userId: ids.get(who)!, name: who, email: '-', role: 'approver', team: { ...team, fourEyes, reviewRequired: true, evidenceRequired: false },
    })

    let next = 0
    const uuid = () => `00000000-0000-4000-8000-${String(++next).padStart(12, '0')}`
    /** A model whose second revision is in review since a day, by whom and from whom, over a released first one or none. */
    const store = async (slug: string, since: number, importer: string, submitter: string, former: { fingerprint: string } | null, teamId = team.id, archived = false) => {
      const model = { id: uuid(), teamId, slug, name: slug, note: null, latest: 2, released: former === null ? null : 1, createdAt: day(1), changedAt: day(1), archivedAt: archived ? day(2) : null, version: 1 }
      const file = { modelId: model.id, sourceDigest: '-', fileName: 'f', robotName: 'r', description: description!, findings: [], importedBy: ids.get(importer)!, importedAt: day(1) }
      const newest = { ...file, id: uuid(), number: 2, status: 'in-review' as const, fingerprint: 'new', independent: 4 }
      const first = { ...file, id: uuid(), number: 1, status: former === null ? ('withdrawn' as const) : ('released' as const), fingerprint: former?.fingerprint ?? 'x', independent: 3 }
      const line = { revisionId: newest.id, teamId, byName: submitter, byUser: ids.get(submitter)!, comment: null }
      await insertModels(db, [
        {
          model,
          revisions: [newest, first],
          bytes: { [newest.id]: new Uint8Array([1]), [first.id]: new Uint8Array([2]) },
          transitions: [
            { ...line, ordinal: 1, status: 'draft', at: day(1) },
            // Submitted, taken back, and submitted again: the last time counts.
            { ...line, ordinal: 2, status: 'in-review', at: day(2) },
            { ...line, ordinal: 3, status: 'draft', at: day(3) },
            { ...line, ordinal: 4, status: 'in-review', at: day(since) },
          ],
        },
      ])
    }
    await store('third', 9, 'Ines', 'Ines', null)
    await store('first', 4, 'Ines', 'Tomas', { fingerprint: 'old' })
    await store('second', 6, 'Mira', 'Tomas', { fingerprint: 'new' })
    await store('elsewhere', 4, 'Ines', 'Ines', null, other.id)
    await store('archived', 4, 'Ines', 'Ines', null, team.id, true)
  }, 120_000)
  afterAll(() => base?.close())

  it('shows what is in review in this team, the longest waiting first, with its last submission', async () => {
    const { reviews, total } = await getReviewQueue(base.db, caller('Kofi'), 20)
    expect(reviews.map(({ model, at, submittedBy }) => [model, at, submittedBy])).toEqual([
      ['first', day(4).toISOString(), 'Tomas'],
      ['second', day(6).toISOString(), 'Tomas'],
      ['third', day(9).toISOString(), 'Ines'],
    ])
    expect(total).toBe(3)
  })

  it('says how many wait when it shows fewer', async () => {
    const { reviews, total } = await getReviewQueue(base.db, caller('Kofi'), 1)
    expect([reviews.map(({ model }) => model), total]).toEqual([['first'], 3])
  })

  it('names those who may release: under four eyes nobody who imported or submitted it', async () => {
    const names = async (fourEyes: boolean) => Object.fromEntries((await getReviewQueue(base.db, caller('Kofi', fourEyes), 20)).reviews.map(({ model, releasers }) => [model, releasers]))
    expect(await names(true)).toEqual({ first: ['Mira'], second: [], third: ['Mira', 'Tomas'] })
    expect(await names(false)).toEqual({ first: ['Mira', 'Tomas'], second: ['Mira', 'Tomas'], third: ['Mira', 'Tomas'] })
  })

  it('knows what the caller had to do with it', async () => {
    const own = async (who: string) => (await getReviewQueue(base.db, caller(who), 20)).reviews.map((review) => review.own)
    expect(await own('Ines')).toEqual([['imported'], [], ['imported', 'submitted']])
    expect(await own('Tomas')).toEqual([['submitted'], ['submitted'], []])
  })

  it('holds it against the revision in force', async () => {
    const { reviews } = await getReviewQueue(base.db, caller('Kofi'), 20)
    expect(reviews.map(({ inForce }) => inForce)).toEqual([{ revision: 1, independent: 3, sameNumbers: false }, { revision: 1, independent: 3, sameNumbers: true }, undefined])
  })
})
