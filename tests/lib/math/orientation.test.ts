import { describe, expect, it } from 'vitest'
import { transformOfRotationVector, transformOfTurns } from '@/lib/math/orientation'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import { rotationVectorOf } from '@/lib/math/rotation-vector'

const NOWHERE = [0, 0, 0]
const expectClose = (ours: ArrayLike<number>, theirs: ArrayLike<number>, tolerance = 1e-15) => {
  for (let i = 0; i < 12; i++) expect(Math.abs(ours[i]! - theirs[i]!), `entry ${i}`).toBeLessThanOrEqual(tolerance)
}

describe('transformOfTurns', () => {
  it("makes intrinsic z-y'-x'' of yaw, pitch, roll the fixed-axis rpy of URDF", () => {
    expectClose(transformOfTurns([1, 2, 3], ['z', 'y', 'x'], [0.3, 0.2, 0.1]), transformOfRollPitchYaw([1, 2, 3], [0.1, 0.2, 0.3]))
  })

  // METHODS check value FK1, computed there by a second route.
  it('gives the check value for rpy 0.1 0.2 0.3', () => {
    const rows = [[0.9362933636, -0.2750958473, 0.2183506631], [0.2896294776, 0.9564250858, -0.0369570135], [-0.1986693308, 0.097843395, 0.9751703272]]
    expectClose(transformOfTurns(NOWHERE, ['z', 'y', 'x'], [0.3, 0.2, 0.1]), rows.flatMap((row) => [...row, 0]), 5e-11)
  })

  it('turns each time about the axis that is reached, not about the fixed one', () => {
    // A quarter about x, then one about the new y, which then points along the old z.
    const r = transformOfTurns(NOWHERE, ['x', 'y'], [Math.PI / 2, Math.PI / 2])
    // The x axis of the result: R·e_x = Rx·Ry·e_x = Rx·(−e_z) = e_y.
    const image = [0, 1, 0]
    image.forEach((entry, row) => expect(r[4 * row]).toBeCloseTo(entry, 15))
  })

  it('adds up the outer turns of z-y-z where the middle one is none', () => {
    expectClose(transformOfTurns(NOWHERE, ['z', 'y', 'z'], [0.4, 0, 0.5]), transformOfRollPitchYaw(NOWHERE, [0, 0, 0.9]))
  })
})

describe('transformOfRotationVector', () => {
  it.each([[[0.3, -0.2, 0.5]], [[1e-11, 0, -2e-11]], [[0, 0, 3.1]], [[0, 0, 0]]])('is undone by rotationVectorOf: %j', (vector) => {
    const back = rotationVectorOf(transformOfRotationVector([7, 8, 9], vector))
    vector.forEach((part, i) => expect(Math.abs(back[i]! - part)).toBeLessThanOrEqual(1e-15))
  })

  it('turns about the axis by the angle', () => expectClose(transformOfRotationVector([1, 2, 3], [0, 0.7, 0]), transformOfTurns([1, 2, 3], ['y'], [0.7])))
})
