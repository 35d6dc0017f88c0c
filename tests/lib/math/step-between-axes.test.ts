import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { turnAboutZ } from '@/lib/math/move-along-z'
import { multiplyTransforms } from '@/lib/math/rigid-transform'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import { stepBetweenAxes } from '@/lib/math/step-between-axes'
import { transform } from '../kinematics/arms'
import { expectClose } from '../kinematics/expect-close'

/** Rz(first) · Trans(p) · Rx(α) · Rz(last), put together again from what stepBetweenAxes gives. */
function rebuilt(of: ArrayLike<number>): { whole: number[]; step: number[]; first: number; last: number } {
  const step = new Float64Array(5)
  const { first, last } = stepBetweenAxes(of, step, 0)
  const [c, s, x, y, z] = step as unknown as [number, number, number, number, number]
  const out = Float64Array.from(transform())
  turnAboutZ(out, 0, first)
  multiplyTransforms(out, 0, [1, 0, 0, x, 0, c, -s, y, 0, s, c, z], 0, out, 0)
  turnAboutZ(out, 0, last)
  return { whole: Array.from(out), step: Array.from(step), first: first + 0, last: last + 0 }
}

describe('stepBetweenAxes', () => {
  it('takes any transform apart so that it can be put together again', () => {
    const angle = fc.oneof(fc.double({ min: -4, max: 4, noNaN: true }), fc.constantFrom(0, 1e-15, -1e-12, 1e-8, Math.PI, Math.PI / 2, Math.PI - 1e-9))
    fc.assert(
      fc.property(angle, angle, angle, (roll, pitch, yaw) => {
        const t = transformOfRollPitchYaw([0.3, -0.2, 0.5], [roll, pitch, yaw])
        expectClose(rebuilt(t).whole, t, 4e-15)
      }),
      { seed: 3, numRuns: 2000 },
    )
  })

  it('leaves exact zeros and ones between axes at right angles', () => {
    // From z up to the old y, as a permutation.
    const { step, first, last } = rebuilt([1, 0, 0, 0.1, 0, 0, -1, 0.2, 0, 1, 0, 0.3])
    expect([step, first, last]).toEqual([[0, 1, 0.1, 0.2, 0.3], 0, 0])
    expect(rebuilt(transform([1, 2, 3])).step).toEqual([1, 0, 1, 2, 3])
    expect(rebuilt([1, 0, 0, 0, 0, -1, 0, 0, 0, 0, -1, 0]).step.slice(0, 2)).toEqual([-1, 0])
  })
})
