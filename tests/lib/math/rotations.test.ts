import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { axisFrame } from '@/lib/math/axis-frame'
import { turnAboutZ } from '@/lib/math/move-along-z'
import { quaternionOf, transformOfPose } from '@/lib/math/quaternion'
import { identityTransform, invertTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import { transformOfRollPitchYaw } from '@/lib/math/roll-pitch-yaw'
import { rotationVectorOf } from '@/lib/math/rotation-vector'

const origin = [0, 0, 0]
const rotation = (t: ArrayLike<number>) => [0, 1, 2, 4, 5, 6, 8, 9, 10].map((i) => t[i]!)
const rpy = (roll: number, pitch: number, yaw: number) => transformOfRollPitchYaw(origin, [roll, pitch, yaw])

function expectClose(actual: readonly number[], expected: readonly number[], digits: number) {
  actual.forEach((value, i) => expect(value).toBeCloseTo(expected[i]!, digits))
}

/** Rodrigues' formula, I + sin·K + (1 − cos)·K², as the witness of every rotation about an axis. */
function rodrigues([x, y, z]: readonly number[], angle: number): number[] {
  const k = [0, -z!, y!, z!, 0, -x!, -y!, x!, 0]
  return k.map((part, at) => {
    const [row, column] = [Math.floor(at / 3), at % 3]
    const squared = [0, 1, 2].reduce((sum, i) => sum + k[3 * row + i]! * k[3 * i + column]!, 0)
    return (row === column ? 1 : 0) + Math.sin(angle) * part + (1 - Math.cos(angle)) * squared
  })
}

function asTransform(r: readonly number[]): number[] {
  return [r[0]!, r[1]!, r[2]!, 0, r[3]!, r[4]!, r[5]!, 0, r[6]!, r[7]!, r[8]!, 0]
}

const unit = fc
  .tuple(...[0, 1, 2].map(() => fc.double({ min: -1, max: 1, noNaN: true })))
  .filter((v) => Math.sqrt(v.reduce((s, x) => s + x * x, 0)) > 0.1)
  .map((v) => v.map((x) => x / Math.sqrt(v.reduce((s, y) => s + y * y, 0))))

describe('transformOfRollPitchYaw', () => {
  it('FK1 turns about fixed axes: roll, then pitch, then yaw', () => {
    const t = rpy(0.1, 0.2, 0.3)
    expectClose(
      rotation(t),
      [0.9362933636, -0.2750958473, 0.2183506631, 0.2896294776, 0.9564250858, -0.0369570135, -0.1986693308, 0.097843395, 0.9751703272],
      10,
    )
    expectClose(quaternionOf(t), [0.0342707986, 0.1060205111, 0.143572175, 0.9833474433], 10)
  })

  it('FK2 is not fooled by the other order', () => {
    const r = rotation(rpy(Math.PI / 2, 0, Math.PI / 2))
    expectClose(r, [0, 0, 1, 1, 0, 0, 0, 1, 0], 15)
    expect(Math.abs(r[1]! - -1)).toBeGreaterThan(0.5)
  })
})

describe('quaternionOf', () => {
  it('is undone by transformOfPose, for every rotation and either sign', () => {
    fc.assert(
      fc.property(unit, fc.double({ min: -7, max: 7, noNaN: true }), (axis, angle) => {
        const r = rodrigues(axis, angle)
        const q = quaternionOf(asTransform(r))
        expect(Math.sqrt(q.reduce((s, x) => s + x * x, 0))).toBeCloseTo(1, 15)
        expectClose(rotation(transformOfPose(origin, q)), r, 14)
        expectClose(
          rotation(
            transformOfPose(
              origin,
              q.map((x) => -2 * x),
            ),
          ),
          r,
          14,
        )
        const first = [q[3], q[0], q[1], q[2]].find((x) => Math.abs(x) > 1e-9)
        expect(first).toBeGreaterThan(0)
      }),
      { seed: 3, numRuns: 500 },
    )
  })

  it.each([
    [
      [Math.PI, 0, 0],
      [1, 0, 0, 0],
    ],
    [
      [0, Math.PI, 0],
      [0, 1, 0, 0],
    ],
    [
      [0, 0, Math.PI],
      [0, 0, 1, 0],
    ],
    [
      [-Math.PI, 0, 0],
      [1, 0, 0, 0],
    ],
    [
      [0, -Math.PI, 0],
      [0, 1, 0, 0],
    ],
    [
      [0, 0, -Math.PI],
      [0, 0, 1, 0],
    ],
  ] as const)('gives half a turn (rpy %j) one sign from both sides', (angles, expected) => {
    expectClose(quaternionOf(transformOfRollPitchYaw(origin, angles)), expected, 15)
  })
})

describe('rotationVectorOf', () => {
  it('gives axis times angle, the short way round, accurate at every angle', () => {
    fc.assert(
      fc.property(
        unit,
        fc.oneof(
          fc.double({ min: 0, max: Math.PI - 1e-6, noNaN: true }),
          fc.double({ min: 0, max: 1e-7, noNaN: true }),
          fc.double({ min: Math.PI - 1e-5, max: Math.PI - 1e-8, noNaN: true }),
        ),
        (axis, angle) => {
          expectClose(
            rotationVectorOf(asTransform(rodrigues(axis, angle))),
            axis.map((x) => x * angle),
            13,
          )
        },
      ),
      { seed: 4, numRuns: 500 },
    )
  })

  it('comes back the other way beyond half a turn', () => {
    expectClose(rotationVectorOf(rpy(0, 0, 3.2)), [0, 0, 3.2 - 2 * Math.PI], 14)
  })

  it('keeps the digits of a tiny angle', () => {
    const t = identityTransform()
    t[1] = -3e-12
    t[4] = 3e-12
    expect(rotationVectorOf(t)[2] / 3e-12).toBeCloseTo(1, 12)
    expect(rotationVectorOf(identityTransform())).toEqual([0, 0, 0])
  })
})

describe('axisFrame', () => {
  it('turns z into the axis, so that turning about the axis is turning about z in between', () => {
    fc.assert(
      fc.property(unit, fc.double({ min: -4, max: 4, noNaN: true }), (axis, angle) => {
        const frame = identityTransform()
        axisFrame(axis, frame)
        const back = identityTransform()
        invertTransform(frame, back)
        const turned = Float64Array.from(frame)
        turnAboutZ(turned, 0, angle)
        const about = identityTransform()
        multiplyTransforms(turned, 0, back, 0, about, 0)
        expectClose(rotation(about), rodrigues(axis, angle), 14)
      }),
      { seed: 5, numRuns: 300 },
    )
  })

  it.each([
    [1, 0, 0],
    [0, 1, 0],
    [0, 0, 1],
    [-1, 0, 0],
    [0, -1, 0],
    [0, 0, -1],
  ])('adds no rounding along the coordinate axis %d %d %d', (x, y, z) => {
    const frame = identityTransform()
    axisFrame([x, y, z], frame)
    expect(rotation(frame).every((part) => part === 0 || Math.abs(part) === 1)).toBe(true)
    expect(rotation(frame).filter((part) => part !== 0)).toHaveLength(3)
  })
})

describe('invertTransform', () => {
  it('undoes a transform', () => {
    const t = transformOfRollPitchYaw([1, -2, 3], [0.4, 0.5, 0.6])
    const inverse = identityTransform()
    invertTransform(t, inverse)
    const nothing = identityTransform()
    multiplyTransforms(t, 0, inverse, 0, nothing, 0)
    expectClose(Array.from(nothing), Array.from(identityTransform()), 15)
  })
})

describe('roll, pitch and yaw', () => {
  it('turn at the angular velocity that the analytic Jacobian gives for their rates (METHODS 3)', () => {
    const at = (t: number) => transformOfRollPitchYaw(origin, [0.1 + 0.4 * t, 0.2 - 0.5 * t, 0.3 + 0.6 * t])
    const back = identityTransform()
    const turned = identityTransform()
    const step = 1e-6
    invertTransform(at(-step), back)
    multiplyTransforms(at(step), 0, back, 0, turned, 0)
    const [cp, cy, sp, sy] = [Math.cos(0.2), Math.cos(0.3), Math.sin(0.2), Math.sin(0.3)]
    const closed = [cy * cp * 0.4 - sy * -0.5, sy * cp * 0.4 + cy * -0.5, -sp * 0.4 + 0.6]
    expectClose(closed, [0.5222774488, -0.3618164535, 0.5205322677], 9)
    expectClose(rotationVectorOf(turned).map((part) => part / (2 * step)), closed, 8)
  })
})
