import { eq } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { schema } from '@/db/client'
import { findModel, listModelRows, updateModel } from '@/db/queries/models'
import { insertTeam, insertUser } from '@/db/queries/people'
import { fillRegister, type RegisterFilter } from '@/db/queries/register'
import { listDrafts, listLatestTransitions, listReviews } from '@/db/queries/revisions'
import { foldText, searchTextOf } from '@/db/queries/search-text'
import { fillRegisterOf } from '@/tests/bench/large-register'
import { BOTH, type TestDatabase } from './support/both-databases'

const MODELS = 10_000
const WHOLE = /Seq Scan on (\w+)/g

describe('foldText', () => {
  it.each([
    ['Störche', 'storche'],
    ['ÆRFUGL ved Ørevik', 'aerfugl ved orevik'],
    ['Łęki', 'leki'],
    ['Straße', 'strasse'],
    ['ΟΔΟΣ', 'οδοσ'],
    ['ﬁne ＡＢＣ', 'fine abc'],
    ['a\u200bb\u202ec', 'abc'],
    ['  two\n\tlines ', 'two lines'],
    ['שָׁלוֹם', 'שלום'],
    ['مُحَرِّك', 'محرك'],
  ])('reads %j as %j', (text, folded) => expect(foldText(text)).toBe(folded))

  it('keeps the parts of a model apart, so that nothing is found across two of them', () => {
    expect(searchTextOf(['One', null, 'Two\nlines'])).toBe('one\ntwo lines')
  })
})

describe.each(BOTH)('the register on the $kind database', ({ open }) => {
  let base: TestDatabase
  let teamId: string
  let otherTeamId: string
  let userId: string
  beforeAll(async () => {
    base = await open()
    const user = await insertUser(base.db, { email: 'a@tarnholm.example', name: 'Asta', passwordHash: '-' })
    userId = user.id
    teamId = (await insertTeam(base.db, { slug: 'large', name: 'Large' })).id
    otherTeamId = (await insertTeam(base.db, { slug: 'other', name: 'Other' })).id
    for (const [team, models] of [[teamId, MODELS], [otherTeamId, 20]] as const) await fillRegisterOf(base.db, { teamId: team, importer: user, models, files: 12 })
  }, 240_000)
  afterAll(() => base?.close())

  /** Lines of the plan. */
  const planOf = async (query: { toSQL(): { sql: string; params: unknown[] } }) => {
    const { sql, params } = query.toSQL()
    // As the drivers send them: times as text.
    const values = params.map((value) => (value instanceof Date ? value.toISOString() : value))
    return (await base.query(`explain ${sql}`, values)).map((row) => String(row['QUERY PLAN'])).join('\n')
  }
  const list = async (filter: RegisterFilter, limit = 200, after?: string) => (await listModelRows(base.db, teamId, filter, limit, after)).map(({ model }) => model)
  const scanned = (plan: string) => [...plan.matchAll(WHOLE)].map(([, table]) => table)

  const QUESTIONS: readonly [what: string, filter: RegisterFilter, index: RegExp, after?: string][] = [
    ['the list', {}, /register_by_slug/],
    ['a further page', {}, /register_by_slug/, 'arm-05000'],
    ['a filter by joints', { joints: 7 }, /register_by_joints/],
    ['a filter by a common status', { status: 'superseded' }, /register_superseded/],
    ['a filter by a rare status', { status: 'in-review' }, /register_in_review/],
    ['a search for what one model has', { query: 'storche 9989' }, /register_by_text/],
    ['a search for a serial number beside filters', { query: 'lr-000015838', status: 'released', joints: 5 }, /register_by_(text|joints)|register_released/],
    ['a search for what many have', { query: 'gluing' }, /register_by_(text|slug)/],
  ]

  // The embedded database has nobody who counts between two starts.
  it.each(QUESTIONS)('%s reads no whole table, before anything was counted', async (_what, filter, _index, after) => {
    expect(scanned(await planOf(listModelRows(base.db, teamId, filter, 51, after)))).toEqual([])
  })

  describe('with statistics', () => {
    beforeAll(() => base.query('analyze'))

    it.each(QUESTIONS)('%s reads the index that was made for it, and no whole table', async (_what, filter, index, after) => {
      const plan = await planOf(listModelRows(base.db, teamId, filter, 51, after))
      expect(plan).toMatch(index)
      expect(scanned(plan)).toEqual([])
    })

    it('the desk reads indexes, too', async () => {
      const latest = await planOf(listLatestTransitions(base.db, teamId, 20))
      expect(latest).toContain('transitions_latest')
      const reviews = await planOf(listReviews(base.db, teamId, 20))
      expect(reviews).toContain('revisions_in_review')
      const drafts = await planOf(listDrafts(base.db, teamId, userId, 20))
      expect(drafts).toContain('revisions_drafts')
      expect([latest, reviews, drafts].flatMap(scanned).filter((table) => table !== 'models')).toEqual([])
    })
  })

  it('finds without regard to case and accents, in name, slug, note and robot name, and of this team only', async () => {
    for (const query of ['störche 9989', 'STORCHE 9989', 'Sto\u0308rche 9989', 'arm-09989', 'ARM_9989', 'lr-079102891', ' Störche   9989 ']) {
      expect((await list({ query })).map(({ slug }) => slug), query).toEqual(['arm-09989'])
    }
    expect((await list({ query: 'حسيدة' }))).toEqual([])
    expect((await list({ query: 'חסידה 22' })).map(({ name }) => name)).toContain('חסידה 22')
    expect((await list({ query: 'leki' }))[0]!.note).toContain('Łęki')
    expect(await list({ query: '100%' })).toEqual([])
    expect(await list({ query: '\\' })).toEqual([])
    expect((await list({ query: 'a' })).length).toBe(200)
  })

  it('pages through everything that matches, each model once and in order', async () => {
    const seen: string[] = []
    for (let after: string | undefined; ; after = seen.at(-1)) {
      const page = await list({ status: 'draft' }, 37, after)
      if (page.length === 0) break
      seen.push(...page.map(({ slug }) => slug))
    }
    expect(seen).toEqual(seen.toSorted())
    expect(new Set(seen).size).toBe(seen.length)
    expect(seen.length).toBe(Array.from({ length: MODELS }, (_, i) => i).filter((i) => i % 500 !== 7 && (i % 50 === 3 || (i % 200 !== 11 && i % 10 === 4))).length)
  })

  it('follows an edit and forgets what is archived', async () => {
    const row = (await findModel(base.db, teamId, 'arm-00042'))!
    expect(await updateModel(base.db, row.model.id, row.model.version, { name: 'Wheatear' }, new Date())).toBe(true)
    expect((await list({ query: 'wheatear' })).map(({ slug }) => slug)).toEqual(['arm-00042'])
    expect(await updateModel(base.db, row.model.id, row.model.version, { name: 'Too late' }, new Date())).toBe(false)
    expect(await list({ query: 'too late' })).toEqual([])
    await updateModel(base.db, row.model.id, row.model.version + 1, { archivedAt: new Date() }, new Date())
    expect(await list({ query: 'wheatear' })).toEqual([])
  })

  it('is filled again from the models where entries are missing', async () => {
    const { registerEntries, models } = schema
    const before = await base.db.select().from(registerEntries).where(eq(registerEntries.teamId, otherTeamId)).orderBy(registerEntries.slug)
    await base.db.delete(registerEntries).where(eq(registerEntries.teamId, otherTeamId))
    await fillRegister(base.db)
    const after = await base.db.select().from(registerEntries).where(eq(registerEntries.teamId, otherTeamId)).orderBy(registerEntries.slug)
    expect(before.length).toBe(20)
    expect(after).toEqual(before)
    expect(await base.db.select().from(registerEntries).innerJoin(models, eq(models.id, registerEntries.modelId)).where(eq(models.slug, 'arm-00042'))).toEqual([])
  })
})
