import { describe, expect, it } from 'vitest'
import { listChanges } from '@/lib/compute/comparison/list-changes'
import { matchElements } from '@/lib/compute/comparison/match-elements'
import { finishInSlices } from '@/lib/in-slices'
import type { Description } from '@/lib/urdf/description'
import { planarArm, robotOf } from './describe-robot'

const compare = async (from: Description, to: Description) => finishInSlices(listChanges(from, to, await finishInSlices(matchElements(from, to))))
const second = (change: object) => planarArm([1, 1], (joint) => (joint === 2 ? change : {}))
const arm = planarArm([1, 1])

describe('listChanges', () => {
  it('says nothing about two descriptions that are the same', async () => expect(await compare(arm, planarArm([1, 1]))).toEqual({ changes: [], limits: [] }))

  it('measures how far an origin moved', async () => {
    const { changes } = await compare(arm, planarArm([1.0005, 1]))
    expect(changes).toEqual([
      {
        element: "joint 'j2'",
        what: 'origin',
        from: { position: [1, 0, 0], quaternion: [0, 0, 0, 1] },
        to: { position: [1.0005, 0, 0], quaternion: [0, 0, 0, 1] },
        distance: expect.closeTo(0.0005, 15),
        angle: 0,
      },
    ])
  })

  it('measures how far an axis turned', async () => {
    const { changes } = await compare(arm, second({ axis: '0 1 0' }))
    expect(changes).toEqual([{ element: "joint 'j2'", what: 'axis', from: [0, 0, 1], to: [0, 1, 0], angle: expect.closeTo(Math.PI / 2, 15) }])
  })

  it.each([
    [{ lower: -1.9 }, [{ limit: 'lower', from: -2, to: -1.9, change: 'narrowed' }]],
    [{ lower: -2.1 }, [{ limit: 'lower', from: -2, to: -2.1, change: 'widened' }]],
    [{ upper: 1.9 }, [{ limit: 'upper', from: 2, to: 1.9, change: 'narrowed' }]],
    [{ upper: 2.1 }, [{ limit: 'upper', from: 2, to: 2.1, change: 'widened' }]],
  ])('calls the limits of %j what they are', async (change, expected) => {
    const { limits, changes } = await compare(arm, second(change))
    expect(limits).toEqual(expected.map((limit) => ({ joint: 'j2', quantity: 'angle', ...limit })))
    expect(changes).toEqual([])
  })

  it('knows that no bound is wider than any', async () => {
    const { limits } = await compare(arm, second({ type: 'continuous' }))
    expect(limits.map(({ to, change }) => [to, change])).toEqual([[null, 'widened'], [null, 'widened']])
    expect((await compare(second({ type: 'continuous' }), arm)).limits.map(({ change }) => change)).toEqual(['narrowed', 'narrowed'])
  })

  it.each([
    [{ velocity: 0.5 }, { what: 'rate', from: 1, to: 0.5, quantity: 'angle' }],
    [{ effort: 12 }, { what: 'effort', from: 10, to: 12, quantity: 'angle' }],
    [{ mimic: '<mimic joint="j1" multiplier="-1"/>' }, { what: 'mimic', from: null, to: { joint: 'j1', multiplier: -1, offset: 0 } }],
  ])('names the change %j', async (change, expected) => {
    expect((await compare(arm, second(change))).changes).toEqual([{ element: "joint 'j2'", ...expected }])
  })

  it('lists a renamed joint once, and not what follows from its name', async () => {
    const mimicking = (name: string) => robotOf([{ name, parent: 'base', child: 'one' }, { name: 'b', parent: 'one', child: 'two', mimic: `<mimic joint="${name}"/>` }])
    expect((await compare(mimicking('lead'), mimicking('leader'))).changes).toEqual([{ element: "joint 'leader'", what: 'renamed', from: 'lead', to: 'leader' }])
  })

  it('lists a renamed link once, and not at the joints around it', async () => {
    const through = (link: string) => robotOf([{ name: 'a', parent: 'base', child: link }, { name: 'b', parent: link, child: 'two' }])
    expect((await compare(through('one'), through('first'))).changes).toEqual([{ element: "link 'first'", what: 'renamed', from: 'one', to: 'first' }])
  })

  it('lists what was added, what was removed, and where a joint was hung instead', async () => {
    const from = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'b', parent: 'one', child: 'two' }])
    const to = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'c', parent: 'base', child: 'three', xyz: '1 0 0' }])
    expect((await compare(from, to)).changes).toEqual([
      { element: "joint 'c'", what: 'added', to: 'revolute' },
      { element: "link 'three'", what: 'added' },
      { element: "joint 'b'", what: 'removed', from: 'revolute' },
      { element: "link 'two'", what: 'removed' },
    ])
    const moved = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'b', parent: 'base', child: 'two' }])
    expect((await compare(from, moved)).changes).toEqual([{ element: "joint 'b'", what: 'parent', from: 'one', to: 'base' }])
  })

  it('names the robot when its name changed', async () => {
    const named = (name: string) => robotOf([{ name: 'a', parent: 'base', child: 'one' }], name)
    expect((await compare(named('old'), named('new'))).changes).toEqual([{ element: 'robot', what: 'name', from: 'old', to: 'new' }])
  })
})
