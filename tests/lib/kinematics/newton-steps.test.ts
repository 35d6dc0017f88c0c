import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createTask } from '@/lib/kinematics/task'
import { invertTransform, multiplyTransforms } from '@/lib/math/rigid-transform'
import { rotationVectorOf } from '@/lib/math/rotation-vector'
import { at, planar, rad, transform, turnSlideScrew } from './arms'
import { askRates, EXACT } from './ask-rates'
import { expectClose } from './expect-close'

type Triple = readonly [number, number, number]

const length = (v: readonly number[]) => Math.sqrt(v.reduce((sum, part) => sum + part * part, 0))
const cross = (a: Triple, b: Triple): Triple => [a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]]

/** The constant twist (v; w) in tip axes that brings the tip to the goal in unit time: the matrix logarithm, in closed form. */
function logarithm(chain: Chain, q: readonly number[], goal: readonly number[]): number[] {
  const back = new Float64Array(12)
  const left = new Float64Array(12)
  invertTransform(at(chain, q).baseFromTip, back)
  multiplyTransforms(back, 0, goal, 0, left, 0)
  const w = rotationVectorOf(left)
  const p: Triple = [left[3]!, left[7]!, left[11]!]
  const angle = length(w)
  const once = cross(w, p)
  const twice = cross(w, once)
  const factor = angle === 0 ? 0 : 1 / angle ** 2 - 1 / (angle * 2 * Math.tan(angle / 2))
  return [...p.map((part, i) => part - once[i]! / 2 + factor * twice[i]!), ...w]
}

/** Newton's iteration of Lynch & Park 2017, chapter 6: the way to the goal as a twist, and the rates of it for unit time. */
function* newton(chain: Chain, start: readonly number[], goal: readonly number[]) {
  let q = [...start]
  for (;;) {
    const twist = logarithm(chain, q, goal)
    yield { q, w: length(twist.slice(3)), v: length(twist.slice(0, 3)) }
    const { rates } = askRates(chain, q, twist, { task: createTask(undefined, 'tip'), inverse: EXACT, limits: { rates: 'report', derating: 1 } })
    q = q.map((value, i) => value + rates[i]!)
  }
}

describe('steps of Newton by the Jacobian in tip axes', () => {
  it('are those of example 6.1 of Lynch & Park 2017 (from memory; METHODS 17)', () => {
    const steps = newton(planar([1, 1]), rad(0, 30), transform([0.366, 1.366, 0], [0, 0, (2 * Math.PI) / 3]))
    const table: readonly (readonly [number, number, number, number])[] = [
      [0, 30, 1.571, 1.924],
      [34.23, 79.18, 0.115, 0.131],
      [29.98, 90.22, 0.0035, 0.0035],
      [30, 90, 1.8e-5, 1.7e-5],
    ]
    for (const [q1, q2, w, v] of table) {
      const step = steps.next().value as { q: number[]; w: number; v: number }
      expectClose(step.q.map((value) => (value * 180) / Math.PI), [q1, q2], 0.0051)
      expect(Math.abs(step.w - w)).toBeLessThanOrEqual(w < 1e-3 ? 1e-6 : 5.1e-4)
      expect(Math.abs(step.v - v)).toBeLessThanOrEqual(v < 1e-3 ? 1e-6 : 5.1e-4)
    }
  })

  it('end where the example of the code library of Lynch & Park 2017 prints that they end (METHODS 17, IKinBody)', () => {
    const goal = [0, 1, 0, -5, 1, 0, 0, 4, 0, 0, -1, 1.6858]
    for (const { q, w, v } of newton(turnSlideScrew(), [1.5, 2.5, 3], goal)) {
      if (w > 0.01 || v > 0.001) continue
      expectClose(q, [1.57073819, 2.999667, 3.14153913], 1e-8)
      break
    }
  })
})
