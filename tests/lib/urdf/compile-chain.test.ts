import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Problem } from '@/lib/errors'
import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { compileChain } from '@/lib/urdf/compile-chain'
import { baseFromTip, type Matrix } from './pose-by-walking'
import { AXIS, described, joint, LIMIT, links, robot } from './urdf-text'

const TOLERANCE = 1e-12

function poseOf(chain: Chain, q: readonly number[]): Matrix {
  const work = createWorkspace(chain)
  forwardKinematics(chain, q, work)
  const rows = [0, 4, 8].map((at) => [...work.baseFromTip.slice(at, at + 4)])
  return [...rows, [0, 0, 0, 1]]
}
const distance = (a: Matrix, b: Matrix): number => Math.max(...a.flatMap((row, i) => row.map((part, j) => Math.abs(part - b[i]![j]!))))
const failure = (act: () => unknown): Pick<Problem, 'code' | 'detail'> => {
  try {
    act()
  } catch (problem) {
    return problem as Problem
  }
  throw new Error('nothing failed')
}

const limit = (lower: number, upper: number, velocity: number) => `<limit lower="${lower}" upper="${upper}" effort="1" velocity="${velocity}"/>`
const mimic = (leader: string, multiplier: number, offset: number) => `<mimic joint="${leader}" multiplier="${multiplier}" offset="${offset}"/>`
const turn = (name: string, parent: string, child: string, body: string, type = 'revolute') =>
  joint(name, parent, child, `<origin xyz="1 0 0"/>${AXIS}${body}`, type)

/** Planar 3R with l = 1 whose first joint sits at the origin; tool 1 m beyond the third. */
const planar3R = (q3: string) =>
  described(
    robot(
      links('base', 'l1', 'l2', 'l3', 'tool') +
        joint('q1', 'base', 'l1', AXIS + LIMIT, 'revolute') +
        turn('q2', 'l1', 'l2', LIMIT) +
        turn('q3', 'l2', 'l3', LIMIT + q3) +
        joint('end', 'l3', 'tool', '<origin xyz="1 0 0"/>'),
    ),
  )

describe('compileChain', () => {
  it('folds a mimic joint into the joint it follows (METHODS.md section 2: q3 = 2·q2 + 0.1)', () => {
    const chain = compileChain(planar3R(mimic('q2', 2, 0.1)))
    expect(chain.joints.map(({ name }) => name)).toEqual(['q1', 'q2'])
    expect(chain.motions.map(({ name, joint: place, multiplier, offset }) => [name, place, multiplier, offset])).toEqual([
      ['q1', 0, 1, 0], ['q2', 1, 1, 0], ['q3', 1, 2, 0.1],
    ])
    const pose = poseOf(chain, [0.3, 0.4])
    expect(pose[0]![3]).toBeCloseTo(1.6909791541, 9)
    expect(pose[1]![3]).toBeCloseTo(1.9393114969, 9)
  })

  it('composes mimics of mimics: 2·(−3·q + 0.1) − 0.5 = −6·q − 0.3', () => {
    const description = described(
      robot(links('a', 'b', 'c', 'd') + turn('lead', 'a', 'b', LIMIT) + turn('last', 'c', 'd', LIMIT + mimic('middle', 2, -0.5)) + turn('middle', 'b', 'c', LIMIT + mimic('lead', -3, 0.1))),
    )
    const { joints, motions } = compileChain(description)
    expect(joints.map(({ name }) => name)).toEqual(['lead'])
    expect(motions.map(({ name, multiplier }) => [name, multiplier])).toEqual([['lead', 1], ['middle', -3], ['last', -6]])
    expect(motions[2]!.offset).toBeCloseTo(-0.3, 15)
  })

  it('cuts the limits of a joint with the mapped ranges of all that follow it, wherever they are, and exchanges the ends where the multiplier is negative', () => {
    const description = described(
      robot(
        links('base', 'arm', 'left', 'right', 'far') +
          turn('grip', 'base', 'arm', limit(-2, 2, 4)) +
          turn('follow', 'arm', 'left', limit(-1, 3, 1) + mimic('grip', -2, 0.5)) +
          turn('still', 'arm', 'right', limit(-0.1, 0.1, 0.001) + mimic('grip', 0, 0)) +
          turn('far', 'base', 'far', limit(-9, 0.75, 9) + mimic('grip', 0.5, 0)),
      ),
    )
    // follow: -1 <= -2 q + 0.5 <= 3 means -1.25 <= q <= 0.75, and |-2|·rate <= 1; far: 0.5 q <= 0.75 means q <= 1.5.
    const expected = [{ name: 'grip', type: 'revolute', lower: -1.25, upper: 0.75, rate: 0.5 }]
    expect(compileChain(description, 'base', 'arm').joints).toEqual(expected)
    expect(compileChain(description, 'base', 'far').joints).toEqual(expected)
  })

  it('keeps unknown rates and missing bounds apart from known ones', () => {
    const description = described(
      robot(links('a', 'b', 'c') + turn('lead', 'a', 'b', '<limit effort="1" velocity="0"/>', 'continuous') + turn('follow', 'b', 'c', limit(-1, 2, 3) + mimic('lead', 2, 0))),
    )
    expect(compileChain(description).joints).toEqual([{ name: 'lead', type: 'revolute', lower: -0.5, upper: 1, rate: 1.5 }])
    const free = described(robot(links('a', 'b') + turn('lead', 'a', 'b', '<limit effort="1" velocity="0"/>', 'continuous')))
    expect(compileChain(free).joints).toEqual([{ name: 'lead', type: 'continuous', lower: null, upper: null, rate: null }])
  })

  it('lists a leader outside the path at the place of the first joint that it moves', () => {
    const description = described(
      robot(links('base', 'arm', 'hand', 'motor') + turn('arm', 'base', 'arm', LIMIT) + turn('hand', 'arm', 'hand', LIMIT + mimic('motor', -1, 0)) + turn('motor', 'base', 'motor', limit(-0.5, 9, 1))),
    )
    const chain = compileChain(description, 'base', 'hand')
    expect(chain.joints.map(({ name, lower, upper, rate }) => [name, lower, upper, rate])).toEqual([['arm', -1, 1, 2], ['motor', -0.5, 1, 1]])
    expect(chain.motions.map(({ name, joint: place, multiplier }) => [name, place, multiplier])).toEqual([['arm', 0, 1], ['hand', 1, -1]])
  })

  it('holds at its offset a joint that follows a fixed one, or follows with multiplier 0', () => {
    const quarter = Math.PI / 2
    for (const [leader, multiplier] of [['bolt', 5], ['lead', 0]] as const) {
      const description = described(
        robot(
          links('base', 'x', 'l', 'a', 'tool') + joint('bolt', 'base', 'x') + turn('lead', 'base', 'l', LIMIT) +
            turn('held', 'base', 'a', `<limit lower="-2" upper="2" velocity="1"/>${mimic(leader, multiplier, quarter)}`) + joint('end', 'a', 'tool', '<origin xyz="1 0 0"/>'),
        ),
      )
      const chain = compileChain(description, 'base', 'tool')
      expect([chain.joints, chain.motions]).toEqual([[], []])
      expect(distance(poseOf(chain, []), [[0, -1, 0, 1], [1, 0, 0, 1], [0, 0, 1, 0], [0, 0, 0, 1]])).toBeLessThan(TOLERANCE)
    }
  })

  it('negates the motion of a joint that is passed from child to parent, so that the reversed chain is the inverse', () => {
    const description = planar3R(mimic('q2', 2, 0.1))
    const down = compileChain(description, 'base', 'tool')
    const up = compileChain(description, 'tool', 'base')
    expect(up.joints.map(({ name }) => name)).toEqual(['q2', 'q1'])
    expect(up.motions.map(({ name, link, axis }) => [name, link, axis])).toEqual([
      ['q3', 'l2', [0, 0, -1]], ['q2', 'l1', [0, 0, -1]], ['q1', 'base', [0, 0, -1]],
    ])
    const [r1, r2, r3] = poseOf(down, [0.3, 0.4])
    const [s1, s2, s3] = poseOf(up, [0.4, 0.3])
    for (const [i, row] of [s1!, s2!, s3!].entries()) {
      expect(row.slice(0, 3)).toEqual([r1![i], r2![i], r3![i]].map((part) => expect.closeTo(part!, 12)))
      expect(row[3]).toBeCloseTo(-(r1![i]! * r1![3]! + r2![i]! * r2![3]! + r3![i]! * r3![3]!), 12)
    }
  })

  it('gives a chain without joints between equal links', () => {
    const chain = compileChain(planar3R(''), 'l2', 'l2')
    expect(chain).toEqual({ base: 'l2', tip: 'l2', joints: [], motions: [], constants: [[1, 0, 0, 0, 0, 1, 0, 0, 0, 0, 1, 0]] })
  })

  it('takes the root and the tip of the default chain where they are left out', () => {
    const chain = compileChain(planar3R(''))
    expect([chain.base, chain.tip]).toEqual(['base', 'tool'])
    expect(compileChain(planar3R(''), 'l1').base).toBe('l1')
  })

  it('is frozen through and through', () => {
    const chain = compileChain(planar3R(''))
    const parts = [chain, chain.joints, chain.joints[0], chain.motions, chain.motions[0], chain.motions[0]!.axis, chain.constants, chain.constants[0]]
    expect(parts.every(Object.isFrozen)).toBe(true)
  })

  it('fails with chain-not-found for a link that does not exist', () => {
    for (const [base, tip] of [['base', 'hand'], ['__proto__', 'tool']] as const) {
      expect(failure(() => compileChain(planar3R(''), base, tip))).toMatchObject({ code: 'chain-not-found' })
    }
    expect(failure(() => compileChain(planar3R(''), 'base', 'hand')).detail).toContain("'hand'")
  })

  it.each(['floating', 'planar'])('fails with chain-not-computable where the path passes a %s joint, and computes beyond it', (type) => {
    const description = described(
      robot(links('world', 'base', 'arm', 'hand') + joint('free', 'world', 'base', '', type) + turn('q', 'base', 'arm', LIMIT) + turn('p', 'arm', 'hand', LIMIT + mimic('free', 1, 0))),
    )
    expect(failure(() => compileChain(description, 'world', 'arm'))).toMatchObject({ code: 'chain-not-computable', detail: expect.stringContaining(`'free', which is ${type}`) })
    expect(failure(() => compileChain(description, 'base', 'hand'))).toMatchObject({ code: 'chain-not-computable', detail: expect.stringContaining("'p'") })
    expect(failure(() => compileChain(description))).toMatchObject({ code: 'chain-not-computable' })
    expect(compileChain(description, 'base', 'arm').joints).toHaveLength(1)
  })

  it('agrees with walking the tree link by link, for any two links of any tree', () => {
    const coordinate = fc.double({ min: -1, max: 1, noNaN: true })
    const piece = fc.record({
      parent: fc.nat(), type: fc.constantFrom('revolute', 'prismatic', 'continuous', 'fixed'), xyz: fc.tuple(coordinate, coordinate, coordinate),
      rpy: fc.tuple(coordinate, coordinate, coordinate), byQuaternion: fc.boolean(), axis: fc.constantFrom('1 0 0', '0 -1 0', '0 0 1', '0.6 0 0.8', '1 1 1'),
      leader: fc.option(fc.nat()), multiplier: fc.constantFrom(1, -1, 0.5, -2, 0), offset: coordinate, q: coordinate,
    })
    fc.assert(
      fc.property(fc.array(piece, { minLength: 1, maxLength: 12 }), fc.nat(), fc.nat(), (pieces, from, to) => {
        const text = pieces.map(({ parent, type, xyz, rpy, byQuaternion, axis, leader, multiplier, offset }, i) => {
          const w = Math.sqrt(1 - (rpy[0] ** 2 + rpy[1] ** 2 + rpy[2] ** 2) / 3)
          const turned = byQuaternion ? `quat_xyzw="${rpy.map((part) => part / Math.sqrt(3)).join(' ')} ${w}"` : `rpy="${rpy.join(' ')}"`
          const follows = leader !== null && i > 0 ? mimic(`j${leader % i}`, multiplier, offset) : ''
          return joint(`j${i}`, `l${parent % (i + 1)}`, `l${i + 1}`, `<origin xyz="${xyz.join(' ')}" ${turned}/><axis xyz="${axis}"/>${LIMIT}${follows}`, type)
        })
        const names = ['l0', ...pieces.map((_, i) => `l${i + 1}`)]
        const description = described(robot(links(...names) + text.join(''), ' version="1.1"'))
        const [base, tip] = [names[from % names.length]!, names[to % names.length]!]
        const chain = compileChain(description, base, tip)
        const q = new Map(pieces.map((each, i) => [`j${i}`, each.q]))
        const pose = poseOf(chain, chain.joints.map(({ name }) => q.get(name)!))
        expect(distance(pose, baseFromTip(description, base, tip, q))).toBeLessThan(1e-10)
      }),
      { seed: 7, numRuns: 300 },
    )
  })
})
