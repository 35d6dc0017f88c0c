import { describe, expect, it } from 'vitest'
import type { CheckVectors } from '@/lib/contract/check-vectors'
import { expectProblem, pointersOf } from './expect-problem'
import { importReleased, postTransition } from './import-model'
import { get, send } from './send'
import { asPerson } from './support/callers'

const PATH = '/teams/tarnholm/models/skerry-7/revisions'
const ask = async (path: string, headers = {}) => get(path, { ...(await asPerson('kofi')), ...headers })

describe('the check vectors of a released revision', () => {
  it('are 24 configurations with what the compute endpoints answer there', async () => {
    const { body } = await ask(`${PATH}/2/check-vectors`)
    const { model, chain, vectors } = body as CheckVectors
    expect(model).toMatchObject({ team: 'tarnholm', model: 'skerry-7', revision: 2, fingerprint: expect.stringMatching(/^[0-9a-f]{64}$/) })
    expect(chain.joints).toHaveLength(7)
    expect(vectors).toHaveLength(24)
    const configurations = vectors.map(({ configuration }) => configuration)
    const results = async (question: string) => {
      const answer = await send({ method: 'POST', path: `${PATH}/2/${question}`, headers: await asPerson('kofi'), json: { configurations } })
      return (answer.body as { results: object[] }).results
    }
    const poses = await results('forward-kinematics')
    const jacobians = await results('jacobian')
    vectors.forEach(({ pose, jacobian, singularValues }, i) => {
      expect(poses[i]).toMatchObject({ pose, withinLimits: true })
      expect(jacobians[i]).toMatchObject({ jacobian, singularValues })
    })
  })

  it('are the same bytes whenever they are asked for, and may be kept for ever', async () => {
    const [first, second] = [await ask(`${PATH}/2/check-vectors`), await ask(`${PATH}/2/check-vectors`)]
    expect(first.text).toBe(second.text)
    expect(first.headers['cache-control']).toBe('private, max-age=31536000, immutable')
    expect(first.headers.etag).toBe(second.headers.etag)
    expect((await ask(`${PATH}/2/check-vectors`, { 'if-none-match': first.headers.etag })).status).toBe(304)
    // "released" may be another revision tomorrow.
    expect((await ask(`${PATH}/released/check-vectors`)).headers['cache-control']).toBe('private, no-cache')
  })

  it('come as CSV by Accept or by the address, one record a configuration', async () => {
    const json = (await ask(`${PATH}/2/check-vectors`)).body as CheckVectors
    const byAccept = await ask(`${PATH}/2/check-vectors`, { accept: 'text/csv' })
    const byAddress = await ask(`${PATH}/2/check-vectors?format=csv`)
    expect(byAccept.headers['content-type']).toBe('text/csv; charset=utf-8; header=present')
    expect(byAccept.headers.vary).toMatch(/\bAccept\b/i)
    expect(byAddress.text).toBe(byAccept.text)
    expect(byAddress.headers['content-disposition']).toContain('filename="skerry-7-revision-2-check-vectors.csv"')
    const [head, ...records] = byAccept.text.trimEnd().split('\r\n').map((line) => line.split(','))
    expect(head!.slice(6, 15)).toEqual(['configuration.6', 'pose.position.0', 'pose.position.1', 'pose.position.2', 'pose.quaternion.0', 'pose.quaternion.1', 'pose.quaternion.2', 'pose.quaternion.3', 'jacobian.0.0'])
    expect(records).toHaveLength(24)
    const { configuration, pose, jacobian, singularValues } = json.vectors[5]!
    expect(records[5]!.map(Number)).toEqual([...configuration, ...pose.position, ...pose.quaternion, ...jacobian.flat(), ...singularValues])
    expect((await ask(`${PATH}/2/check-vectors?format=json`, { accept: 'text/csv' })).headers['content-type']).toBe('application/json')
  })

  it('belong to the chain asked for', async () => {
    const { chain, vectors } = (await ask(`${PATH}/2/check-vectors?base=link_3&tip=link_5`)).body as CheckVectors
    expect(chain).toEqual({ base: 'link_3', tip: 'link_5', joints: ['elbow', 'fore_roll'], types: ['revolute', 'revolute'] })
    expect(vectors[0]!.jacobian.map((row) => row.length)).toEqual(new Array(6).fill(2))
  })

  it('stay when the revision is superseded or withdrawn', async () => {
    const before = await ask(`${PATH}/1/check-vectors`)
    expect(before.status).toBe(200)
    const slug = await importReleased('Withdrawn with its vectors', 'trainer-3r.urdf')
    const path = `/teams/tarnholm/models/${slug}/revisions/1/check-vectors`
    const released = await ask(path)
    expect((await postTransition(slug, 1, 'withdrawn', 'tomas')).status).toBe(200)
    expect((await ask(path)).text).toBe(released.text)
  })

  it('are refused to a revision that never was released, with its status', async () => {
    const response = await ask('/teams/tarnholm/models/fulmar-6/revisions/1/check-vectors')
    expectProblem(response, 'not-released')
    expect((response.body as { detail: string }).detail).toContain('in-review')
  })

  it('are refused in a format that is none of the two', async () => {
    const response = await ask(`${PATH}/2/check-vectors?format=xml`)
    expectProblem(response, 'invalid-request')
    expect(pointersOf(response)).toEqual(['/query/format'])
  })
})
