import { describe, it } from 'vitest'
import { multiplyTransforms } from '@/lib/math/rigid-transform'
import { rotationVectorOf } from '@/lib/math/rotation-vector'
import { turnErrorSlope } from '@/lib/math/turn-error'
import { invertTransform } from '@/lib/math/rigid-transform'
import { transform } from '../kinematics/arms'
import { expectClose } from '../kinematics/expect-close'

describe('turnErrorSlope', () => {
  it.each(['base', 'tip'] as const)('is how the rotation left to turn shrinks while the tool turns, in %s axes', (axes) => {
    const goal = transform([0, 0, 0], [0.3, -0.4, 0.5])
    for (const rpy of [[0.3, -0.4, 0.5 + 1e-5], [0.2, 0.1, -0.7], [-1.5, 0.6, 2], [2.9, 0.4, 0.1]] as const) {
      const left = (turn: readonly [number, number, number]) => {
        const tool = Float64Array.from(transform([0, 0, 0], rpy))
        const small = transform([0, 0, 0], turn)
        const turned = new Float64Array(12)
        if (axes === 'base') multiplyTransforms(small, 0, tool, 0, turned, 0)
        else multiplyTransforms(tool, 0, small, 0, turned, 0)
        const back = new Float64Array(12)
        invertTransform(turned, back)
        const error = new Float64Array(12)
        if (axes === 'base') multiplyTransforms(goal, 0, back, 0, error, 0)
        else multiplyTransforms(back, 0, goal, 0, error, 0)
        return rotationVectorOf(error)
      }
      const slope = new Float64Array(9)
      turnErrorSlope(left([0, 0, 0]), axes, slope)
      const step = 1e-6
      const differences = [0, 1, 2].map((k) => {
        const by = (sign: number) => left([0, 1, 2].map((i) => (i === k ? sign * step : 0)) as unknown as [number, number, number])
        return by(1).map((value, i) => -(value - by(-1)[i]!) / (2 * step))
      })
      expectClose(Array.from(slope), [0, 1, 2].flatMap((row) => [0, 1, 2].map((column) => differences[column]![row]!)), 1e-8)
    }
  })
})
