import fc from 'fast-check'
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import type { Inverse } from '@/lib/kinematics/inverse'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import type { Objective } from '@/lib/kinematics/objectives'
import { createRateRecord } from '@/lib/kinematics/rate-record'
import { resolveRatesInto } from '@/lib/kinematics/resolve-rates'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import type { RateLimits } from '@/lib/kinematics/rate-bounds'
import { TWIST_COMPONENTS, createTask } from '@/lib/kinematics/task'
import { arm, at, golden, GOLDEN_POSE, planar, rad, randomArm, randomPose, sixAxis, transform } from './arms'
import { askRates, EXACT, flat, PLANE } from './ask-rates'
import { expectClose } from './expect-close'

const threeR = planar([1, 1, 1])
const bent = rad(30, 30, 30)

/** The rows of the Jacobian that a task has, as nested arrays. */
function jacobianRows(chain: Chain, q: ArrayLike<number>, rows: readonly number[]): number[][] {
  const whole = Array.from(jacobian(chain, at(chain, q)))
  const n = chain.joints.length
  return rows.map((row) => whole.slice(row * n, (row + 1) * n))
}

function length(v: readonly number[]): number {
  return Math.sqrt(v.reduce((sum, part) => sum + part * part, 0))
}

describe('resolveRates, primary', () => {
  it('gives the planar 2R rates of Whitney 1969 (from memory), by the inverse Jacobian', () => {
    const chain = planar([0.4, 0.3])
    expectClose(askRates(chain, rad(30, 60), flat(0.1, 0), { task: PLANE, inverse: EXACT }).rates, [0, -1 / 3], 1e-14)
    expectClose(askRates(chain, rad(30, 60), flat(0, 0.1), { task: PLANE, inverse: EXACT }).rates, [0.2886751346, -0.4811252243], 1e-10)
  })

  it('gives the least rates of the planar 3R arm, by the pseudo-inverse', () => {
    const { rates, residual, toolSpeed } = askRates(threeR, bent, flat(0.1, 0), { task: PLANE, inverse: EXACT })
    expectClose(rates, [0.017152285, -0.046860914, -0.053139086], 1e-10)
    expect(length(rates)).toBeCloseTo(0.072896561, 10)
    expectClose(residual, [0, 0, 0, 0, 0, 0], 1e-15)
    expect(toolSpeed).toBeCloseTo(0.1, 15)
    expectClose(
      askRates(threeR, bent, flat(1, 0), { task: PLANE, inverse: EXACT }).primaryRates,
      [0.1715228496, -0.4686091399, -0.5313908601],
      1e-10,
    )
    expectClose(
      askRates(threeR, bent, flat(0, 1), { task: PLANE, inverse: EXACT }).primaryRates,
      [0.9831776887, -0.6860913985, -1.045959409],
      1e-10,
    )
  })

  it('asks less of a six-axis arm with a slanted tool when the turn about the tool axis is free (dimensions from memory)', () => {
    const tool = transform([0, -0.1 * Math.SQRT1_2, 0.1 * Math.SQRT1_2], [Math.PI / 4, 0, 0])
    const chain = sixAxis()
    const q = rad(20, -70, 80, -50, 60, 30)
    const whole = askRates(chain, q, [0.05, 0, 0, 0, 0, 0], { tool, inverse: EXACT })
    expect(length(whole.rates)).toBeCloseTo(0.178472, 6)
    const r = at(chain, q, tool).baseFromTool
    const inTip = [0, 1, 2].map((k) => 0.05 * r[k]!)
    const free = createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip')
    const relaxed = askRates(chain, q, [...inTip, 0, 0, 0], { tool, task: free, inverse: EXACT })
    expect(length(relaxed.rates)).toBeCloseTo(0.177785, 6)
    expect(relaxed.residual[5]).toBe(0)
    expect(Math.abs(relaxed.achievedTwist[5]!)).toBeGreaterThan(1e-4)
  })

  it('ignores components outside the task, and says what they came to', () => {
    const all = askRates(threeR, bent, [0.1, 0, 9, 9, 9, 9], { task: PLANE, inverse: EXACT })
    expect(all.rates).toEqual(askRates(threeR, bent, flat(0.1, 0), { task: PLANE, inverse: EXACT }).rates)
    expect(all.residual.slice(2)).toEqual([0, 0, 0, 0])
    expect(all.achievedTwist[5]).toBeCloseTo(
      all.rates.reduce((sum, rate) => sum + rate, 0),
      15,
    )
  })

  it('gives the same rates for the same twist in base and in tip axes', () => {
    const chain = golden()
    const tool = transform([0.1, 0, 0.05], [0.3, 0.4, 0.5])
    const r = at(chain, GOLDEN_POSE, tool).baseFromTool
    const base = [0.1, -0.2, 0.3, 0.4, -0.5, 0.6]
    const tip = [0, 3].flatMap((block) => [0, 1, 2].map((k) => [0, 1, 2].reduce((sum, i) => sum + r[4 * i + k]! * base[block + i]!, 0)))
    const inBase = askRates(chain, GOLDEN_POSE, base, { tool, inverse: EXACT })
    const inTip = askRates(chain, GOLDEN_POSE, tip, { tool, inverse: EXACT, task: createTask(undefined, 'tip') })
    expectClose(inTip.rates, inBase.rates, 1e-12)
    expectClose(inTip.achievedTwist, tip, 1e-12)
    expect(inTip.toolSpeed).toBeCloseTo(inBase.toolSpeed, 14)
  })

  it('agrees with the pseudo-inverse that ml-matrix makes from its own decomposition', () => {
    for (let seed = 1; seed <= 30; seed++) {
      const chain = randomArm(seed)
      const n = chain.joints.length
      const task = createTask(TWIST_COMPONENTS.slice(0, Math.max(1, Math.min(6, n - 1))))
      const work = at(chain, randomPose(chain, seed))
      const twist = [0.1, -0.2, 0.3, 0.2, 0.1, -0.3]
      const { primaryRates, singularValues, rank } = askRates(chain, work.q, twist, { task, inverse: EXACT })
      if (rank < task.rows.length || singularValues.at(-1)! < 1e-3) continue
      const j = jacobianRows(chain, work.q, task.rows)
      const witness = new SingularValueDecomposition(j, { autoTranspose: true })
        .inverse()
        .mmul(Matrix.columnVector(task.rows.map((row) => twist[row]!)))
      expectClose(primaryRates, witness.to1DArray(), 1e-11 / singularValues.at(-1)!)
    }
  })

  it('solves an arm with fewer joints than components in the sense of least squares', () => {
    const chain = planar([1, 1])
    const { rates, rank, nullity, singularValues } = askRates(chain, [0.3, 0.8], [0.1, 0.2, 0.3, 0, 0, 0], { inverse: EXACT })
    expect([rank, nullity, singularValues.length]).toEqual([2, 0, 2])
    // Normal equations: the residual is orthogonal to every column.
    const j = jacobianRows(chain, [0.3, 0.8], [0, 1, 2, 3, 4, 5])
    for (const c of [0, 1]) {
      const left = j.reduce((sum, row, i) => sum + row[c]! * ([0.1, 0.2, 0.3, 0, 0, 0][i]! - row[0]! * rates[0]! - row[1]! * rates[1]!), 0)
      expect(left).toBeCloseTo(0, 14)
    }
  })
})

describe('resolveRates, damped', () => {
  it('gives the damped rates of the planar 3R arm, what they achieve and what is lost (Nakamura & Hanafusa 1986, from memory)', () => {
    const { rates, achievedTwist, damping, singularValues } = askRates(threeR, bent, flat(0.1, 0), {
      task: PLANE,
      inverse: { method: 'damped', damping: 0.1 },
    })
    expectClose(rates, [0.016065653, -0.0459218829, -0.05180232], 1e-10)
    expectClose(achievedTwist.slice(0, 2), [0.0994819768, -0.0010148512], 1e-10)
    expectClose(singularValues, [3.4438944967, 0.5794334462], 1e-10)
    expect(damping).toBe(0.1)
  })

  it('gives the damped and the undamped rates of the stretched 2R arm', () => {
    const chain = planar([1, 1])
    expectClose(
      askRates(chain, [0, 0], flat(0, 1), { task: PLANE, inverse: { method: 'damped', damping: 0.1 } }).rates,
      [0.3992015968, 0.1996007984],
      1e-10,
    )
    expectClose(askRates(chain, [0, 0], flat(0, 1), { task: PLANE, inverse: EXACT }).rates, [0.4, 0.2], 1e-15)
  })

  it.each([
    [0.1, [-0.997, 1.998], [-0.441, 0.888]],
    [0.01, [-10.0, 20.0], [-0.079, 0.159]],
    [0.001, [-100, 200], [-0.008, 0.016]],
  ])('bounds the rates that grow without damping as a 2R arm stretches (q2 = %s)', (q2, exact, damped) => {
    const chain = planar([1, 1])
    const free = askRates(chain, [0, q2], flat(-0.1, 0), { task: PLANE, inverse: EXACT }).rates
    const held = askRates(chain, [0, q2], flat(-0.1, 0), { task: PLANE, inverse: { method: 'damped', damping: 0.05 } }).rates
    expectClose(free, exact, 5e-3 * Math.abs(exact[1]!))
    expectClose(held, damped, 6e-4)
    expect(length(held)).toBeLessThanOrEqual(0.1 / (2 * 0.05))
  })

  it('takes damping 0 as no damping: the exact inverse at full rank, the truncated one at a singular pose', () => {
    const none = { method: 'damped', damping: 0 } as const
    const chain = planar([1, 1])
    expect(askRates(chain, [0.3, 0.8], flat(0.1, 0.1), { task: PLANE, inverse: none }).rates).toEqual(
      askRates(chain, [0.3, 0.8], flat(0.1, 0.1), { task: PLANE, inverse: EXACT }).rates,
    )
    expectClose(askRates(chain, [0, 0], flat(1, 1), { task: PLANE, inverse: none }).rates, [0.4, 0.2], 1e-15)
  })
})

describe('resolveRates, secondary', () => {
  it('moves towards a posture without moving the tool', () => {
    const secondary: Objective[] = [{ objective: 'posture', posture: [0, 0, 0], gain: 1 }]
    const { rates, secondaryRates, achievedTwist } = askRates(threeR, bent, flat(0.1, 0), { task: PLANE, inverse: EXACT, secondary })
    expectClose(secondaryRates, [-0.0328724319, 0.0898091541, -0.0898091541], 1e-10)
    expectClose(rates, [-0.0157201469, 0.0429482401, -0.1429482401], 1e-10)
    expectClose(achievedTwist.slice(0, 2), [0.1, 0], 1e-15)
  })

  it('projects with the undamped inverse, so that a damped task is not disturbed by the posture', () => {
    const secondary: Objective[] = [{ objective: 'posture', posture: [0, 0, 0], gain: 1 }]
    const inverse: Inverse = { method: 'damped', damping: 0.1 }
    const { secondaryRates } = askRates(threeR, bent, flat(0, 0), { task: PLANE, inverse, secondary })
    const moved = jacobianRows(threeR, bent, [0, 1]).map((row) => row.reduce((sum, part, i) => sum + part * secondaryRates[i]!, 0))
    // The damped projector would leak 0.0057 m/s here.
    expect(length(moved)).toBeLessThan(1e-15)
  })

  it.each([
    [[1, -1, 1], 3.74e-4],
    [[1, 1, 1], 6.23e-4],
  ])('leaks no more than the truncated direction carries (wish %s)', (wish, leak) => {
    const q = rad(30, 0.05, 0.05)
    const secondary: Objective[] = [{ objective: 'posture', posture: q.map((value, i) => value + wish[i]!), gain: 1 }]
    const { secondaryRates } = askRates(threeR, q, flat(0, 0), {
      task: PLANE,
      inverse: { method: 'truncated', tolerance: 1e-2 },
      secondary,
    })
    const moved = length(jacobianRows(threeR, q, [0, 1]).map((row) => row.reduce((sum, part, i) => sum + part * secondaryRates[i]!, 0)))
    expect(moved).toBeCloseTo(leak, 6)
    expect(moved).toBeLessThan(1.76e-3)
  })

  it('adds the objectives with their gains', () => {
    const posture: Objective = { objective: 'posture', posture: [0.5, 0.1, -0.4], gain: 0.7 }
    const middle: Objective = { objective: 'mid-range', gain: 2 }
    const chain = planar([1, 1, 1], { lower: -1, upper: 2 })
    const of = (...secondary: Objective[]) => askRates(chain, bent, flat(0, 0), { task: PLANE, inverse: EXACT, secondary }).secondaryRates
    expectClose(
      of(posture, middle),
      of(posture).map((rate, i) => rate + of(middle)[i]!),
      1e-15,
    )
  })
})

describe('resolveRates, at large', () => {
  it('is finite for every admitted input, at regular and singular poses, with every inverse', () => {
    const number = fc.oneof(fc.double({ min: -1e9, max: 1e9, noNaN: true }), fc.constantFrom(0, 1e9, -1e9, 1e-9, 1e-300, 5e-324, Math.PI))
    const positive = fc.oneof(fc.double({ min: 0, max: 1e9, noNaN: true }), fc.constantFrom(0, 1e-300, 5e-324, 1e9))
    const inverse: fc.Arbitrary<Inverse> = fc.oneof(
      fc.record({ method: fc.constant('truncated' as const), tolerance: positive }),
      fc.record({ method: fc.constant('damped' as const), damping: positive }),
      fc.record({ method: fc.constant('adaptive-damped' as const), threshold: positive, maxDamping: positive }),
      fc.record({ method: fc.constant('filtered' as const), threshold: positive, damping: positive }),
    )
    const weight = fc.oneof(fc.double({ min: 1e-6, max: 1e6, noNaN: true }), fc.constantFrom(1, 1e-6, 1e6))
    const acceleration = fc.oneof(fc.constant(null), positive)
    const joints = fc.record({
      jointWeights: fc.option(fc.array(weight, { minLength: 7, maxLength: 7 }), { nil: undefined }),
      accelerations: fc.array(acceleration, { minLength: 7, maxLength: 7 }),
      previousRates: fc.option(fc.array(number, { minLength: 7, maxLength: 7 }), { nil: undefined }),
      dt: fc.option(fc.constantFrom(1e-9, 0.01, 1e9), { nil: undefined }),
    })
    const seven = fc.array(number, { minLength: 7, maxLength: 7 })
    const chain = golden({ lower: -2, upper: 2, rate: 1 })
    const sliding = arm([
      { type: 'prismatic', rate: 1 },
      { axis: [0, 1, 0] },
      { axis: [1, 0, 0], mimic: { joint: 1, multiplier: 1e9 } },
      {},
      {},
      {},
      { type: 'prismatic', axis: [1, 1, 1] },
      {},
    ])
    fc.assert(
      fc.property(
        fc.boolean(),
        seven,
        fc.array(number, { minLength: 6, maxLength: 6 }),
        seven,
        number,
        inverse,
        fc.constantFrom('scale', 'saturate', 'report'),
        joints,
        (first, q, twist, posture, gain, how, rates, { jointWeights, accelerations, previousRates, dt }) => {
          const secondary: Objective[] = [
            { objective: 'posture', posture, gain },
            { objective: 'mid-range', gain },
            { objective: 'manipulability', gain },
          ]
          const outcome = askRates(first ? chain : sliding, q, twist, {
            inverse: how,
            secondary,
            limits: { rates: rates as RateLimits['rates'], derating: 0.5, accelerations, ...(dt === undefined ? {} : { dt }) },
            ...(jointWeights === undefined ? {} : { jointWeights }),
            ...(previousRates === undefined ? {} : { previousRates }),
          })
          const { diagnosis, saturated, ...numbers } = outcome
          expect(Object.values(numbers).flat().every(Number.isFinite), JSON.stringify(outcome)).toBe(true)
          expect(diagnosis.flatMap(({ direction }) => direction ?? []).every(Number.isFinite)).toBe(true)
          // Bounds that exclude standing still are met by clamping the last bits.
          if (saturated.length > 0 || previousRates !== undefined) return
          expect(outcome.rates).toEqual(
            outcome.primaryRates.map((rate, i) => outcome.scale * rate + outcome.secondaryScale * outcome.secondaryRates[i]! + 0),
          )
        },
      ),
      { seed: 9, numRuns: 1500 },
    )
  })

  it('keeps its secondary motion out of the task and its rates within the limits on random arms', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.double({ min: 0.01, max: 2, noNaN: true }), (seed, rate) => {
        const free = randomArm(seed)
        const chain = { ...free, joints: free.joints.map((joint, i) => (i % 3 === 2 ? joint : { ...joint, rate })) }
        const q = randomPose(chain, seed)
        const task = createTask(['vx', 'vy', 'wz'])
        const secondary: Objective[] = [{ objective: 'posture', posture: q.map((value, i) => value + ((i % 2) - 0.5)), gain: 3 }]
        const outcome = askRates(chain, q, [0.4, -0.3, 0, 0, 0, 0.5], { task, secondary, inverse: { method: 'damped', damping: 0.05 } })
        const j = jacobianRows(chain, q, task.rows)
        const size = Math.max(1, outcome.singularValues[0]!)
        for (const row of j)
          expect(Math.abs(row.reduce((sum, part, i) => sum + part * outcome.secondaryRates[i]!, 0))).toBeLessThan(1e-8 * size)
        outcome.rates.forEach((value, i) => expect(Math.abs(value)).toBeLessThanOrEqual(chain.joints[i]!.rate ?? Number.POSITIVE_INFINITY))
      }),
      { seed: 5, numRuns: 150 },
    )
  })

  it('leaks less than 1e-12 of its secondary motion into a task of full rank, and reports what it leaks below that', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.constantFrom(undefined, [1, 4, 2, 0.5, 3, 1, 2]), (seed, jointWeights) => {
        const chain = golden()
        const q = randomPose(chain, seed)
        const secondary: Objective[] = [{ objective: 'posture', posture: q.map((value, i) => value + ((i % 3) - 1)), gain: 1 }]
        const { leak, rank } = askRates(chain, q, [0.1, 0.2, 0.3, 0.1, 0.2, 0.3], { secondary, ...(jointWeights === undefined ? {} : { jointWeights }) })
        expect(rank).toBe(6)
        expect(leak).toBeLessThan(1e-12)
      }),
      { seed: 2, numRuns: 300 },
    )
    const q = rad(30, 0.05, 0.05)
    const secondary: Objective[] = [{ objective: 'posture', posture: q.map((value, i) => value + [1, -1, 1][i]!), gain: 1 }]
    expect(askRates(threeR, q, flat(0, 0), { task: PLANE, inverse: { method: 'truncated', tolerance: 1e-2 }, secondary }).leak).toBeCloseTo(3.74e-4, 6)
  })

  it('gives the rates of the triangular and of the singular value way alike, to 1e-14 times the condition number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), (seed) => {
        const chain = golden()
        const q = randomPose(chain, seed)
        const twist = [0.1, -0.2, 0.3, 0.2, 0.1, -0.3]
        const posture: Objective = { objective: 'posture', posture: [0, 0, 0, 1, 0, 1, 0], gain: 1 }
        const easy = askRates(chain, q, twist, { inverse: EXACT, secondary: [posture] })
        // An objective of gain 0 that looks at singular values sends the pose the long way.
        const long = askRates(chain, q, twist, { inverse: EXACT, secondary: [posture, { objective: 'manipulability', gain: 0 }] })
        const condition = easy.singularValues[0]! / easy.singularValues[5]!
        expectClose(easy.rates, long.rates, 1e-14 * condition * Math.max(1, ...long.rates.map(Math.abs)))
        expectClose(easy.singularValues, long.singularValues, 1e-14 * long.singularValues[0]!)
      }),
      { seed: 3, numRuns: 400 },
    )
  })

  it('gives the same rates alone as with everything else, to 1e-14 times the condition number, at hard poses bit for bit', () => {
    const chain = golden({ rate: 1 })
    const work = createWorkspace(chain)
    const record = createRateRecord(chain)
    const task = createTask()
    const twist = [0.1, -0.2, 0.3, 0.2, 0.1, -0.3]
    const inverses: readonly Inverse[] = [EXACT, { method: 'damped', damping: 0.05 }, { method: 'adaptive-damped', threshold: 0.02, maxDamping: 0.05 }]
    for (let seed = 1; seed <= 200; seed++) {
      const q = randomPose(chain, seed)
      if (seed % 10 === 0) q[3] = 0
      for (const inverse of inverses) {
        for (const secondary of [[], [{ objective: 'posture', posture: [0, 0, 0, 1, 0, 1, 0], gain: 1 }]] as const) {
          const whole = askRates(chain, q, twist, { inverse, secondary })
          forwardKinematics(chain, q, work)
          resolveRatesInto(chain, work, twist, { task, inverse, secondary, limits: { rates: 'scale', derating: 1 }, structural: structuralLoss(chain, task) }, record, undefined, 'rates')
          const condition = whole.singularValues[0]! / Math.max(whole.singularValues[5]!, 1e-9 * whole.singularValues[0]!)
          const hard = whole.rank < 6 && inverse.method !== 'damped'
          expectClose(record.rates, whole.rates, hard ? 0 : 1e-14 * condition * Math.max(1, ...whole.primaryRates.map(Math.abs)))
        }
      }
    }
  })

  it('keeps the direction of the tool when it slows down', () => {
    const chain = planar([1, 1, 1], { rate: 0.3 })
    const { scale, achievedTwist, primaryRates } = askRates(chain, bent, flat(1, 0), { task: PLANE, inverse: EXACT })
    expect(scale).toBeCloseTo(0.5645561911, 10)
    expectClose(primaryRates, [0.1715228496, -0.4686091399, -0.5313908601], 1e-10)
    expectClose(achievedTwist.slice(0, 2), [0.5645561911, 0], 1e-10)
  })

  it('says the rates as they are under report, whatever the limits', () => {
    const chain = planar([1, 1, 1], { rate: 0.3 })
    const report = askRates(chain, bent, flat(1, 0), { task: PLANE, inverse: EXACT, limits: { rates: 'report', derating: 0.1 } })
    expect([report.scale, report.secondaryScale]).toEqual([1, 1])
    expect(report.rates).toEqual(report.primaryRates)
  })

  it('gives the same bits for the same question', () => {
    const chain = golden({ rate: 0.4 })
    const secondary: Objective[] = [{ objective: 'posture', posture: [0, 0, 0, 1, 0, 1, 0], gain: 1 }]
    const once = () => askRates(chain, GOLDEN_POSE, [0.1, 0.2, 0.3, 0.1, 0.2, 0.3], { secondary })
    expect(JSON.stringify(once())).toBe(JSON.stringify(once()))
  })

  it('answers for a chain without joints that it can do nothing', () => {
    const fixed: Chain = { base: 'a', tip: 'b', joints: [], motions: [], constants: [transform([1, 2, 3])] }
    const { rates, rank, residual, diagnosis } = askRates(fixed, [], [0.1, 0, 0, 0, 0, 0])
    expect([rates, rank, residual]).toEqual([[], 0, [-0.1, 0, 0, 0, 0, 0]])
    expect(diagnosis.map(({ code, structural }) => [code, structural])).toEqual([['direction-lost', true]])
  })

  it('refuses a twist or a posture of the wrong length', () => {
    expect(() => askRates(threeR, bent, [0.1, 0])).toThrow('a twist has 6 components, 2 were given')
    expect(() => askRates(threeR, bent, flat(0, 0), { secondary: [{ objective: 'posture', posture: [0], gain: 1 }] })).toThrow(
      'a posture needs 3 joint values, 1 were given',
    )
  })
})
