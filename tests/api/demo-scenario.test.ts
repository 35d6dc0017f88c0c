import { describe, expect, inject, it } from 'vitest'
import { asKey, asPerson, type Person } from './support/callers'
import { PEOPLE } from './support/people'

const { url, tarnholmKey, kestrelKey } = inject('served')

async function read<T>(person: Person, at: string): Promise<T> {
  const answer = await fetch(`${url}/api/v1/teams/${at}`, { headers: { ...(await asPerson(person)) } })
  expect(answer.status).toBe(200)
  return (await answer.json()) as T
}

interface ListedModel {
  readonly slug: string
  readonly revisions: number
  readonly released?: number
  readonly latest: { readonly status: string }
}

describe('the demo scenario', () => {
  it.each(Object.keys(PEOPLE) as Person[])('lets %s sign in', async (person) => {
    await expect(asPerson(person)).resolves.toHaveProperty('cookie')
  })

  it('has a revision of every status but withdrawn in the register of tarnholm', async () => {
    const scenario = ['dunlin-2', 'fulmar-6', 'gannet-4', 'skerry-7', 'skerry-7-rail', 'trainer-3r']
    const found = await Promise.all(scenario.map((slug) => read<ListedModel>('kofi', `tarnholm/models/${slug}`)))
    expect(found.map(({ slug, latest, released }) => [slug, latest.status, released])).toEqual([
      ['dunlin-2', 'draft', undefined],
      ['fulmar-6', 'in-review', undefined],
      ['gannet-4', 'released', 1],
      ['skerry-7', 'released', 2],
      ['skerry-7-rail', 'draft', undefined],
      ['trainer-3r', 'released', 1],
    ])
  })

  it('has a history with the names of those who acted', async () => {
    const { history } = await read<{ history: { status: string; by: string }[] }>('kofi', 'tarnholm/models/skerry-7/revisions/1')
    expect(history.map(({ status, by }) => [status, by])).toEqual([
      ['draft', 'Ines Okafor'],
      ['in-review', 'Ines Okafor'],
      ['released', 'Tomas Aasen'],
      ['superseded', 'Tomas Aasen'],
    ])
  })

  it('gives each team a key that computes its own models and knows nothing of the other\'s', async () => {
    const ask = async (team: string, key: string) => {
      const answer = await fetch(`${url}/api/v1/teams/${team}/models/fulmar-6/revisions/1/forward-kinematics`, {
        method: 'POST',
        headers: { ...asKey(key), 'content-type': 'application/json' },
        body: JSON.stringify({ configurations: [[0, 0, 0, 0, 0, 0]] }),
      })
      return answer.status
    }
    expect(await ask('tarnholm', tarnholmKey)).toBe(200)
    expect(await ask('kestrel', kestrelKey)).toBe(200)
    expect(await ask('kestrel', tarnholmKey)).toBe(404)
    expect(await ask('tarnholm', kestrelKey)).toBe(404)
  })
})
