import { describe, expect, it } from 'vitest'
import { matchElements } from '@/lib/compute/comparison/match-elements'
import { finishInSlices } from '@/lib/in-slices'
import type { Description } from '@/lib/urdf/description'
import { planarArm, robotOf } from './describe-robot'

const match = async (from: Description, to: Description) => {
  const { joints, links } = await finishInSlices(matchElements(from, to))
  return { joints: Object.fromEntries(joints), links: Object.fromEntries(links) }
}

const prefixed = (description: Description, prefix: string): Description => ({
  ...description,
  root: prefix + description.root,
  links: description.links.map((link) => ({ ...link, name: prefix + link.name })),
  joints: description.joints.map((joint) => ({ ...joint, name: prefix + joint.name, parent: prefix + joint.parent, child: prefix + joint.child })),
})

describe('matchElements', () => {
  it('matches by name wherever an element hangs', async () => {
    const from = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'b', parent: 'one', child: 'two' }])
    const to = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'b', parent: 'base', child: 'two' }])
    expect((await match(from, to)).joints).toEqual({ a: 'a', b: 'b' })
  })

  it('finds a joint that has another name and nothing else', async () => {
    const to = planarArm([1, 1], (joint) => (joint === 2 ? { name: 'elbow' } : {}))
    expect((await match(planarArm([1, 1]), to)).joints).toEqual({ j1: 'j1', j2: 'elbow', tip_joint: 'tip_joint' })
  })

  it('follows a prefix before every name through the whole tree', async () => {
    const arm = planarArm([1, 0.5, 0.2])
    const { joints, links } = await match(arm, prefixed(arm, 'left_'))
    expect(joints).toEqual(Object.fromEntries(arm.joints.map(({ name }) => [name, `left_${name}`])))
    expect(links).toEqual(Object.fromEntries(arm.links.map(({ name }) => [name, `left_${name}`])))
  })

  it('calls nothing renamed that moved, turned or changed its type meanwhile', async () => {
    for (const change of [{ xyz: '1 0 0.1' }, { axis: '0 1 0' }, { type: 'prismatic' }]) {
      const to = planarArm([1, 1], (joint) => (joint === 2 ? { name: 'elbow', ...change } : {}))
      expect((await match(planarArm([1, 1]), to)).joints, JSON.stringify(change)).toEqual({ j1: 'j1', tip_joint: 'tip_joint' })
    }
  })

  it('decides nothing where two joints look alike', async () => {
    const fingers = (names: readonly string[], links: readonly string[]) => robotOf(names.map((name, i) => ({ name, parent: 'palm', child: links[i]! })))
    const from = fingers(['left', 'right'], ['one', 'two'])
    expect((await match(from, fingers(['links', 'rechts'], ['eins', 'zwei']))).joints).toEqual({})
    // One of them kept its name, so the other is known.
    expect((await match(from, fingers(['left', 'rechts'], ['one', 'zwei']))).joints).toEqual({ left: 'left', right: 'rechts' })
  })

  it('does not take a link for renamed when its new name was there before', async () => {
    const from = robotOf([{ name: 'a', parent: 'base', child: 'one' }, { name: 'b', parent: 'base', child: 'two', xyz: '1 0 0' }])
    const to = robotOf([{ name: 'a', parent: 'base', child: 'two' }])
    expect((await match(from, to)).links).toEqual({ base: 'base', two: 'two' })
  })
})
