import { describe, expect, it } from 'vitest'
import { defaultChain, LISTED_JOINTS, listChains } from '@/lib/urdf/default-chain'
import type { DescribedJoint, Description } from '@/lib/urdf/description'
import { AXIS, described, joint, LIMIT, links, robot } from './urdf-text'

const turn = (name: string, parent: string, child: string, more = '') => joint(name, parent, child, AXIS + LIMIT + more, 'revolute')

describe('defaultChain', () => {
  it('leads to the leaf with most independent joints, not with most links', () => {
    const text = robot(links('base', 'a', 'b', 'x', 'y', 'z') + turn('p', 'base', 'a') + turn('q', 'a', 'b') + joint('r', 'base', 'x') + turn('s', 'x', 'y') + joint('t', 'y', 'z'))
    expect(defaultChain(described(text))).toEqual({ base: 'base', tip: 'b' })
  })

  it('counts a joint that moves several times once', () => {
    const follow = '<mimic joint="p"/>'
    const text = robot(links('base', 'a', 'b', 'c', 'x', 'y') + turn('p', 'base', 'a') + turn('q', 'a', 'b', follow) + turn('r', 'b', 'c', follow) + turn('s', 'base', 'x') + turn('t', 'x', 'y'))
    expect(defaultChain(described(text))).toEqual({ base: 'base', tip: 'y' })
  })

  it('breaks a tie by UTF-16 code units of the name, whatever the order of the file', () => {
    // U+1F916 is D83E DD16 in UTF-16, which sorts before U+FF21 (full-width A), though its code point is greater.
    const names = ['Ａ', '🤖', 'é', 'a', 'Z']
    const text = (order: readonly string[]) => robot(links('base', ...order) + order.map((name) => turn(`to ${name}`, 'base', name)).join(''))
    expect(defaultChain(described(text(names)))!.tip).toBe('Z')
    expect(defaultChain(described(text([...names].reverse())))!.tip).toBe('Z')
    expect(listChains(described(text(names))).map(({ tip }) => tip)).toEqual(['Z', 'a', 'é', '🤖', 'Ａ'])
  })

  it('passes by leaves behind floating and planar joints, and is null when there is no other', () => {
    const free = joint('free', 'base', 'drone', '', 'floating') + turn('p', 'drone', 'arm') + turn('q', 'arm', 'hand')
    expect(defaultChain(described(robot(links('base', 'drone', 'arm', 'hand', 'post') + free + joint('r', 'base', 'post'))))).toEqual({ base: 'base', tip: 'post' })
    const description = described(robot(links('base', 'drone', 'arm', 'hand') + free))
    expect(defaultChain(description)).toBeNull()
    expect(listChains(description)).toEqual([])
  })
})

describe('listChains', () => {
  it('lists the default chain first, then the others by leaf, each with its independent joints from base to tip', () => {
    const text = robot(
      links('base', 'a', 'b', 'left', 'right') + turn('z', 'base', 'a') + turn('y', 'a', 'b') + turn('x', 'b', 'right') + turn('w', 'b', 'left', '<mimic joint="x" multiplier="-1"/>'),
    )
    expect(listChains(described(text))).toEqual([
      { base: 'base', tip: 'left', joints: ['z', 'y', 'x'], default: true },
      { base: 'base', tip: 'right', joints: ['z', 'y', 'x'], default: false },
    ])
    const uneven = robot(links('base', 'a', 'b') + turn('p', 'base', 'b') + joint('q', 'base', 'a'))
    expect(listChains(described(uneven))).toEqual([
      { base: 'base', tip: 'b', joints: ['p'], default: true },
      { base: 'base', tip: 'a', joints: [], default: false },
    ])
  })

  it('stops at its bound on a trunk of 4 000 joints with a leaf at each, and has the longest chain all the same', () => {
    const size = 4000
    const template = described(robot(links('base', 'a') + turn('p', 'base', 'a'))).joints[0]!
    const joints = Array.from({ length: size }, (_, i): DescribedJoint[] => [
      { ...template, name: `j${i}`, parent: `l${i}`, child: `l${i + 1}` },
      { ...template, name: `k${i}`, type: 'fixed', parent: `l${i}`, child: `leaf${i}` },
    ]).flat()
    const names = ['l0', ...joints.map(({ child }) => child)]
    const description: Description = { version: '1.0', robotName: 'comb', root: 'l0', links: names.map((name) => ({ name, meshes: [] })), joints }
    const chains = listChains(description)
    expect(chains[0]).toMatchObject({ tip: `l${size}`, default: true })
    expect(chains[0]!.joints).toHaveLength(size)
    const listed = chains.reduce((sum, chain) => sum + chain.joints.length, 0)
    expect(listed).toBeLessThanOrEqual(LISTED_JOINTS)
    expect(listed).toBeGreaterThan(LISTED_JOINTS - size)
  })
})
