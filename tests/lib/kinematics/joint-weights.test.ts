import fc from 'fast-check'
import { all, create } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { jacobian } from '@/lib/kinematics/jacobian'
import { createTask } from '@/lib/kinematics/task'
import { at, golden, GOLDEN_POSE, planar, rad, randomPose } from './arms'
import { askRates, EXACT, flat, PLANE } from './ask-rates'
import { expectClose } from './expect-close'

const math = create(all ?? {})
const threeR = planar([1, 1, 1])
const bent = rad(30, 30, 30)
const weights = [1, 2, 4]

function weightedNorm(rates: readonly number[], by: readonly number[]): number {
  return Math.sqrt(rates.reduce((sum, rate, i) => sum + by[i]! * rate * rate, 0))
}

describe('joint weights', () => {
  it('give the least weighted rates of the planar 3R arm (METHODS 11)', () => {
    const { rates, residual } = askRates(threeR, bent, flat(0.1, 0), { task: PLANE, inverse: EXACT, jointWeights: weights })
    expectClose(rates, [0.0238687264, -0.0652105733, -0.0347894267], 1e-10)
    expectClose(residual, [0, 0, 0, 0, 0, 0], 1e-15)
    expect(weightedNorm(rates, weights)).toBeCloseTo(0.1179651, 7)
    expect(weightedNorm(askRates(threeR, bent, flat(0.1, 0), { task: PLANE, inverse: EXACT }).rates, weights)).toBeCloseTo(0.1264165, 7)
  })

  it('change nothing when they are all 1, nor when they are all the same', () => {
    const twist = [0.1, 0.2, 0.3, 0.1, 0.2, 0.3]
    const plain = askRates(golden(), GOLDEN_POSE, twist)
    for (const weight of [1, 7]) {
      expectClose(askRates(golden(), GOLDEN_POSE, twist, { jointWeights: new Array<number>(7).fill(weight) }).rates, plain.rates, 1e-14)
    }
  })

  it('make the projector I − J_W⁺J: idempotent, oblique, and silent in the task', () => {
    const project = (wish: readonly number[]) =>
      askRates(threeR, bent, flat(0, 0), {
        task: PLANE, inverse: EXACT, jointWeights: weights,
        secondary: [{ objective: 'posture', posture: bent.map((value, i) => value + wish[i]!), gain: 1 }],
      })
    const columns = [[1, 0, 0], [0, 1, 0], [0, 0, 1]].map((unit) => project(unit).secondaryRates)
    const again = columns.map((column) => project(column).secondaryRates)
    expectClose(again.flat(), columns.flat(), 1e-15)
    expect(Math.abs(columns[0]![1]! - columns[1]![0]!)).toBeGreaterThan(0.05)
    // W·N is symmetric.
    expect(weights[1]! * columns[0]![1]!).toBeCloseTo(weights[0]! * columns[1]![0]!, 15)
    expect(project([1, 2, 3]).leak).toBeLessThan(1e-15)
  })

  it('agree with W⁻¹Jᵀ(JW⁻¹Jᵀ + λ²I)⁻¹ as mathjs computes it, damped and not', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 9999 }), fc.array(fc.double({ min: 0.05, max: 20, noNaN: true }), { minLength: 7, maxLength: 7 }), fc.constantFrom(0, 0.05, 0.3), (seed, by, damping) => {
        const chain = golden()
        const q = randomPose(chain, seed)
        const twist = [0.1, -0.2, 0.3, 0.2, 0.1, -0.3]
        const { rates, singularValues } = askRates(chain, q, twist, { inverse: { method: 'damped', damping }, jointWeights: by })
        fc.pre(singularValues[5]! > 1e-3)
        const whole = Array.from(jacobian(chain, at(chain, q)))
        const j = math.matrix(Array.from({ length: 6 }, (_row, r) => whole.slice(7 * r, 7 * r + 7)))
        const back = math.multiply(math.diag(by.map((weight) => 1 / weight)), math.transpose(j))
        const inner = math.add(math.multiply(j, back), math.multiply(damping * damping, math.identity(6)))
        const witness = math.multiply(back, math.lusolve(inner as never, twist) as never) as unknown as { toArray(): number[][] }
        expectClose(rates, witness.toArray().flat(), (1e-11 * singularValues[0]! ** 2) / (singularValues[5]! ** 2 + damping ** 2))
      }),
      { seed: 4, numRuns: 120 },
    )
  })

  it('make a stiff joint do less, and never cost the task', () => {
    const share = (weight: number) => {
      const { rates, residual } = askRates(golden(), GOLDEN_POSE, [0.1, 0.1, 0, 0, 0, 0], { jointWeights: [1, weight, 1, 1, 1, 1, 1] })
      expectClose(residual, [0, 0, 0, 0, 0, 0], 1e-13)
      return Math.abs(rates[1]!)
    }
    expect(share(100)).toBeLessThan(share(1))
    expect(share(1e8)).toBeLessThan(1e-4)
  })

  it('count in what a damped answer delivers, so that a direction which only stiff joints reach is called lost', () => {
    const chain = planar([1, 1])
    const ask = (weight: number) =>
      askRates(chain, [0, 0.5], flat(1, 0), { task: PLANE, inverse: { method: 'damped', damping: 0.02 }, jointWeights: [weight, weight] }).diagnosis.map(({ code }) => code)
    expect(ask(1)).not.toContain('direction-lost')
    expect(ask(1e6)).toContain('direction-lost')
  })

  it('are finite at singular poses too, with every inverse', () => {
    const inverses = [EXACT, { method: 'damped', damping: 0.1 }, { method: 'filtered', threshold: 0.1, damping: 0.1 }, { method: 'adaptive-damped', threshold: 0.1, maxDamping: 0.1 }] as const
    for (const inverse of inverses) {
      const { rates, achievedTwist } = askRates(threeR, [0, 0, 0], flat(0.1, 0.2), { task: PLANE, inverse, jointWeights: [1e-6, 1, 1e6] })
      expect([...rates, ...achievedTwist].every(Number.isFinite)).toBe(true)
    }
    expectClose(askRates(threeR, [0, 0, 0], flat(0.1, 0.2), { task: PLANE, inverse: EXACT, jointWeights: weights }).achievedTwist.slice(0, 2), [0, 0.2], 1e-15)
  })

  it('are finite where the squares of singular value and damping lie below binary64', () => {
    const inverses = [{ method: 'damped', damping: 5e-324 }, { method: 'adaptive-damped', threshold: 1, maxDamping: 1e-200 }, { method: 'filtered', threshold: 1, damping: 1e-200 }] as const
    for (const inverse of inverses) {
      const wish = { task: createTask(['vx', 'wy']), inverse, jointWeights: [1, 1, 1] }
      expect(askRates(threeR, [0, -1e-200, 0], flat(-3, 0), wish).rates.every(Number.isFinite)).toBe(true)
    }
  })

  it.each([
    [[1, 1], '3 joint weights are needed, 2 were given'],
    [[1, 0, 1], 'positive'],
    [[1, Number.NaN, 1], 'positive'],
    [[1e-7, 1, 1e7], 'factor of 1e12'],
  ])('refuse %o', (jointWeights, message) => {
    expect(() => askRates(threeR, bent, flat(0, 0), { task: PLANE, jointWeights })).toThrow(message)
  })

  it('hold for tasks of fewer components as well', () => {
    const task = createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip')
    const by = [1, 2, 3, 4, 5, 6, 7]
    const { rates, residual } = askRates(golden(), GOLDEN_POSE, [0.1, 0, 0, 0.1, 0, 0], { task, jointWeights: by })
    expectClose(residual, [0, 0, 0, 0, 0, 0], 1e-14)
    const other = askRates(golden(), GOLDEN_POSE, [0.1, 0, 0, 0.1, 0, 0], { task })
    expect(weightedNorm(rates, by)).toBeLessThan(weightedNorm(other.rates, by))
  })
})
