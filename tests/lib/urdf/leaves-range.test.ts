import { describe, expect, it } from 'vitest'
import { leavesRange } from '@/lib/urdf/leaves-range'
import { AXIS, joint, links, parse, robot } from './urdf-text'

const range = (lower: number | null, upper: number | null) => ({ lower, upper })

describe('a follower', () => {
  it.each([
    ['that reaches its ends together with its leader', range(-1, 1), range(-0.5, 0.5), 0.5, 0],
    ['that turns the other way', range(0, 2), range(-4, 1), -2, 0],
    ['whose bounds were rounded', range(0, 0.785398), range(0, 1.570796), 2, 3e-7],
    ['without bounds', range(null, null), range(null, null), 3, 1],
    ['that stands still within its range', range(null, null), range(-1, 1), 0, 0.5],
    ['of a leader that is bounded on the one side that counts', range(null, 1), range(null, 1), 1, 0],
  ])('%s does not leave its range', (_what, leader, follower, multiplier, offset) => {
    expect(leavesRange(leader, follower, multiplier, offset)).toBeNull()
  })

  it.each([
    ['at the upper end', range(-1, 1), range(-2, 1.5), 2, 0, '2, and its upper limit is 1.5'],
    ['at the lower end', range(-1, 1), range(-0.5, 2), 1, 0.1, '-0.9, and its lower limit is -0.5'],
    ['at the end that a negative multiplier leads to', range(0, 3), range(-1, 1), -1, 0, '-3, and its lower limit is -1'],
    ['by following a leader without end', range(null, null), range(-1, 1), 1, 0, 'no end, and its upper limit is 1'],
    ['by standing still outside of it', range(-1, 1), range(-1, 1), 0, -2, '-2, and its lower limit is -1'],
  ])('leaves its range %s', (_what, leader, follower, multiplier, offset, words) => {
    expect(leavesRange(leader, follower, multiplier, offset)).toBe(words)
  })

  it('is judged by the leader at the end of its line, with all mimics between folded in', () => {
    const limited = (reach: number) => `${AXIS}<limit lower="${-reach}" upper="${reach}" effort="1" velocity="1"/>`
    const text = robot(
      links('a', 'b', 'c', 'd') +
        joint('lead', 'a', 'b', limited(0.5), 'revolute') +
        joint('middle', 'a', 'c', `${limited(1.5)}<mimic joint="lead" multiplier="-3"/>`, 'revolute') +
        joint('last', 'a', 'd', `${limited(3)}<mimic joint="middle" multiplier="2" offset="0.5"/>`, 'revolute'),
    )
    const found = parse(text).findings
    expect(found.map(({ rule, element }) => [rule, element])).toEqual([['mimic-leaves-range', "joint 'last'"]])
    expect(found[0]!.message).toBe("Following 'lead' over its range, the joint would come to 3.5, and its upper limit is 3.")
  })
})
