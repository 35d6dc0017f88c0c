import { describe, expect, it } from 'vitest'
import { poseDifference } from '@/lib/math/pose-difference'
import { transformOfTurns } from '@/lib/math/orientation'

const at = (x: number, y: number, z: number, angle = 0) => transformOfTurns([x, y, z], ['z'], [angle])

describe('poseDifference', () => {
  it('is exactly nothing between the same numbers', () => {
    const pose = transformOfTurns([0.1, 0.2, 0.3], ['x', 'y', 'z'], [0.3, -1.1, 2.2])
    expect(poseDifference(pose, pose.slice())).toEqual({ distance: 0, angle: 0 })
  })

  it('gives the distance of the origins and the angle of the turn, whichever comes first', () => {
    const a = at(1, 2, 3, 0.4)
    const b = at(1, 5, 7, -0.3)
    for (const { distance, angle } of [poseDifference(a, b), poseDifference(b, a)]) {
      expect(distance).toBe(5)
      expect(angle).toBeCloseTo(0.7, 15)
    }
  })

  it.each([1e-12, 1e-6, 1, Math.PI - 1e-9, Math.PI])('keeps its digits at an angle of %d rad', (angle) => {
    expect(Math.abs(poseDifference(at(0, 0, 0), at(0, 0, 0, angle)).angle - angle)).toBeLessThanOrEqual(4e-16 * Math.max(1, angle))
  })

  it('goes the short way round', () => expect(poseDifference(at(0, 0, 0), at(0, 0, 0, 2 * Math.PI - 0.2)).angle).toBeCloseTo(0.2, 14))
})
