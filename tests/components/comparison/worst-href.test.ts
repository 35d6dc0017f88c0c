import { describe, expect, it } from 'vitest'
import { sidesOf, worstHref } from '@/components/comparison/worst-href'
import type { Comparison } from '@/lib/contract/comparison'
import { arm } from '@/tests/lib/kinematics/arms'

const named = (...joints: readonly (readonly [name: string, type: 'revolute' | 'prismatic'])[]) => {
  const chain = arm(joints.map(([, type]) => ({ type })))
  return { ...chain, joints: chain.joints.map((joint, i) => ({ ...joint, name: joints[i]![0] })) }
}

const side = (revision: number) => ({ revision, status: 'draft' as const, fingerprint: '0'.repeat(64) })
const still = { max: 0, mean: 0, p95: 0 }
const comparison: Comparison = {
  from: side(1),
  to: side(2),
  sameKinematics: false,
  chain: {
    base: 'stand',
    tip: 'flange',
    joints: ['turn', 'slide'],
    types: ['revolute', 'prismatic'],
    former: { base: 'stand', tip: 'old flange', joints: ['old turn', 'slide'] },
    held: [{ joint: 'rail', in: 'to', quantity: 'length', value: 0.25 }],
  },
  effect: { samples: 2000, seed: 1, translation: still, rotation: still },
  limits: [],
  changes: [],
}

describe('worstHref', () => {
  const sides = sidesOf(comparison, { from: named(['old turn', 'revolute'], ['slide', 'prismatic']), to: named(['rail', 'prismatic'], ['slide', 'prismatic'], ['turn', 'revolute']) })
  const open = (which: 'from' | 'to') => new URL(worstHref('t', 'm', sides[which], [Math.PI / 2, 0.1], comparison.chain.held), 'http://host')

  it('opens the earlier sheet under its own names, in the order of its own chain', () => {
    expect(open('from').pathname).toBe('/teams/t/models/m/revisions/1')
    expect(Object.fromEntries(open('from').searchParams)).toEqual({ base: 'stand', tip: 'old flange', q: '90,100' })
  })

  it('opens the later one with what was held at its value', () => {
    expect(open('to').pathname).toBe('/teams/t/models/m/revisions/2')
    expect(Object.fromEntries(open('to').searchParams)).toEqual({ base: 'stand', tip: 'flange', q: '250,100,90' })
  })
})
