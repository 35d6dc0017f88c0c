import { describe, expect, it } from 'vitest'
import type { KeyUse } from '@/lib/contract/used-by'
import { setTimeout as pause } from 'node:timers/promises'
import { importModel, postRevision } from './import-model'
import { makeKey } from './make-key'
import { get, send } from './send'
import { asKey, asPerson } from './support/callers'

interface Listed {
  readonly items: readonly KeyUse[]
  readonly nextCursor?: string
}

const listUses = async (slug: string, query = '') => (await get(`/teams/tarnholm/models/${slug}/used-by${query}`, await asPerson('kofi'))).body as Listed

/** Uses are noted beside the call and not before its answer. */
async function untilListed(slug: string, count: number): Promise<Listed> {
  for (let i = 0; i < 100; i++) {
    const listed = await listUses(slug)
    if (listed.items.length >= count) return listed
    await pause(50)
  }
  return listUses(slug)
}

const compute = (slug: string, revision: number, key: string) =>
  send({ method: 'POST', path: `/teams/tarnholm/models/${slug}/revisions/${revision}/forward-kinematics`, headers: asKey(key), json: { configurations: [[0, 0, 0]] } })

describe('who uses a model', () => {
  it('is nobody before a key has called it, whatever people look at', async () => {
    const { model } = await importModel('Used by nobody', 'trainer-3r.urdf')
    await get(`/teams/tarnholm/models/${model.slug}/revisions/1`, await asPerson('kofi'))
    expect(await listUses(model.slug)).toEqual({ items: [] })
  })

  it('is each key with the revision that it called, the latest first', async () => {
    const { model } = await importModel('Used by two', 'trainer-3r.urdf')
    await postRevision(model.slug, 'gannet-4.urdf')
    const [first, second] = [await makeKey(['compute', 'catalog:read']), await makeKey(['compute'])]
    const before = Date.now()
    expect((await compute(model.slug, 1, first.key)).status).toBe(200)
    await untilListed(model.slug, 1)
    expect((await compute(model.slug, 1, second.key)).status).toBe(200)
    await untilListed(model.slug, 2)
    expect((await get(`/teams/tarnholm/models/${model.slug}/revisions/2`, asKey(first.key))).status).toBe(200)
    const { items } = await untilListed(model.slug, 3)
    expect(items.map(({ key, revision }) => [key.prefix, revision, key.state])).toEqual([
      [`elb_${first.id}`, 2, 'active'],
      [`elb_${second.id}`, 1, 'active'],
      [`elb_${first.id}`, 1, 'active'],
    ])
    for (const { lastUsedAt } of items) expect(Date.parse(lastUsedAt)).toBeGreaterThanOrEqual(before)
    expect(JSON.stringify(items)).not.toContain(first.key)
  })

  it('comes in pages', async () => {
    const { model } = await importModel('Used in pages', 'trainer-3r.urdf')
    const keys = [await makeKey(['compute']), await makeKey(['compute']), await makeKey(['compute'])]
    for (const [i, { key }] of keys.entries()) {
      await compute(model.slug, 1, key)
      await untilListed(model.slug, i + 1)
    }
    const first = await listUses(model.slug, '?limit=2')
    const rest = await listUses(model.slug, `?limit=2&cursor=${first.nextCursor}`)
    expect([...first.items, ...rest.items].map(({ key }) => key.prefix)).toEqual(keys.map(({ id }) => `elb_${id}`).reverse())
    expect(rest).not.toHaveProperty('nextCursor')
  })

  it('does not list a call that was not allowed', async () => {
    const { model } = await importModel('Used without leave', 'trainer-3r.urdf')
    const { key } = await makeKey(['gateway'])
    expect((await compute(model.slug, 1, key)).status).toBe(403)
    const allowed = await makeKey(['compute'])
    await compute(model.slug, 1, allowed.key)
    expect((await untilListed(model.slug, 1)).items.map((use) => use.key.prefix)).toEqual([`elb_${allowed.id}`])
  })
})
