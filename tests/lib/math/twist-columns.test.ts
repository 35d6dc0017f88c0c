import { describe, expect, it } from 'vitest'
import { addSliding, addTurning, turnIntoFrame } from '@/lib/math/twist-columns'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'

describe('twist columns', () => {
  // Along the base's x axis, through a point 1 m up.
  const axis = Float64Array.of(1, 0, 0, 0, 0, 1)
  const point = transformOfRollPitchYaw([0, 2, 1], [0, 0, 0])

  it('gives a turn z × (p − o) above z, added to what is there', () => {
    const out = new Float64Array(12)
    addTurning(axis, 0, point, 3, out, 2, 1)
    addTurning(axis, 0, point, -1, out, 2, 1)
    expect(Array.from(out).map((x) => Math.round(x * 1e12) / 1e12 + 0)).toEqual([0, 0, 0, 0, 0, 4, 0, 2, 0, 0, 0, 0])
  })

  it('gives a slide z above nothing', () => {
    const out = new Float64Array(6)
    addSliding(axis, 0, 0.5, out, 1, 0)
    expect(Array.from(out).map((x) => Math.round(x * 1e12) / 1e12 + 0)).toEqual([0.5, 0, 0, 0, 0, 0])
  })

  it('turns both blocks of a twist, in place too', () => {
    const twist = [1, 0, 0, 0, 0, 1]
    turnIntoFrame(transformOfRollPitchYaw([7, 7, 7], [0, 0, Math.PI / 2]), twist, 1, twist)
    expect(twist.map((x) => Math.round(x * 1e12) / 1e12 + 0)).toEqual([0, -1, 0, 0, 0, 1])
  })
})
