import fc from 'fast-check'
import { all, create } from 'mathjs'
import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { nullSpace, type NullSpace, type NullSpaceOptions } from '@/lib/kinematics/null-space'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask, type Task } from '@/lib/kinematics/task'
import { arm, at, golden, GOLDEN_POSE, planar, rad, randomArm, randomPose, scara, sixAxis, transform } from './arms'
import { expectClose } from './expect-close'

const math = create(all ?? {})
const plane = createTask(['vx', 'vy'])

function ask(
  chain: Chain,
  q: ArrayLike<number>,
  task: Task,
  options: NullSpaceOptions = {},
  tool?: number[],
): NullSpace & { projector: number[][] } {
  const known = structuralLoss(chain, task, { ...options, ...(tool === undefined ? {} : { tipFromTool: tool }) })
  return { projector: [], ...nullSpace(chain, at(chain, q, tool), task, known, { ...options, withProjector: true }) }
}

const column = (matrix: readonly (readonly number[])[], k: number) => matrix.map((row) => row[k]!)

describe('nullSpace', () => {
  it('gives the projector of the planar 3R arm', () => {
    const { projector, rank, nullity } = ask(planar([1, 1, 1]), rad(30, 30, 30), plane)
    expectClose(
      projector.flat(),
      [0.0627817203, -0.1715228496, 0.1715228496, -0.1715228496, 0.4686091399, -0.4686091399, 0.1715228496, -0.4686091399, 0.4686091399],
      1e-10,
    )
    expect([rank, nullity]).toEqual([2, 1])
  })

  it('gives the closed-form null vector of the planar 3R arm, whose length is the manipulability (Cauchy & Binet)', () => {
    const { basis } = ask(planar([1, 1, 1]), rad(30, 30, 30), plane)
    // The second joint stands first among those at least half the largest: its component is made positive.
    expectClose(column(basis, 0), [-0.2505628071, 0.6845503194, -0.6845503194], 1e-10)
    fc.assert(
      fc.property(
        fc.tuple(...[1, 2, 3].map(() => fc.double({ min: 0.2, max: 2, noNaN: true }))),
        fc.tuple(...[1, 2, 3].map(() => fc.double({ min: -3, max: 3, noNaN: true }))),
        (lengths, q) => {
          const [l1, l2, l3] = lengths as [number, number, number]
          const [, q2, q3] = q as [number, number, number]
          const [s2, s3, s23] = [Math.sin(q2), Math.sin(q3), Math.sin(q2 + q3)]
          const closed = [l2 * l3 * s3, -(l2 * l3 * s3 + l1 * l3 * s23), l1 * l2 * s2 + l1 * l3 * s23]
          const length = Math.sqrt(closed.reduce((sum, part) => sum + part * part, 0))
          fc.pre(length > 1e-3)
          const vector = column(ask(planar(lengths), q, plane).basis, 0)
          const same = Math.sign(vector.reduce((sum, part, i) => sum + part * closed[i]!, 0))
          expectClose(
            vector,
            closed.map((part) => (same * part) / length),
            1e-11,
          )
        },
      ),
      { seed: 31, numRuns: 60 },
    )
  })

  it('gives the golden self-motion, in which the elbow joint has no part', () => {
    const { basis, nullity } = ask(golden(), GOLDEN_POSE, createTask())
    expect(nullity).toBe(1)
    expectClose(column(basis, 0), [0.687068979, -0.135672366, 0.099879873, 0, -0.644813803, 0.207862124, -0.20139944], 1e-9)
    expect(Math.abs(column(basis, 0)[3]!)).toBeLessThan(1e-15)
  })

  it('frees only the last joint when the turn about a tool axis along it is left out (dimensions from memory)', () => {
    const free = createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip')
    const { basis } = ask(sixAxis(), rad(20, -70, 80, -50, 60, 30), free)
    expectClose(column(basis, 0), [0, 0, 0, 0, 0, 1], 1e-12)
  })

  it('spreads the freedom of a tilted symmetric tool over all six joints (dimensions from memory)', () => {
    const chain = sixAxis()
    const q = rad(20, -70, 80, -50, 60, 30)
    const tool = transform([0, -0.1 * Math.SQRT1_2, 0.1 * Math.SQRT1_2], [Math.PI / 4, 0, 0])
    const t = at(chain, q, tool).baseFromTool
    expectClose([t[3]!, t[7]!, t[11]!], [0.602334498, 0.449066517, 0.374261133], 1e-9)
    const { basis } = ask(chain, q, createTask(['vx', 'vy', 'vz', 'wx', 'wy'], 'tip'), {}, tool)
    const expected = [0.076288431, -0.009623379, -0.074692305, 0.53694184, 0.694912051, 0.466153652]
    expectClose(column(basis, 0), expected, 1e-9)
  })

  it('keeps the defining properties of the projector and the basis on random arms and tasks', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 1_000_000 }),
        fc.subarray(['vx', 'vy', 'vz', 'wx', 'wy', 'wz'] as const, { minLength: 1 }),
        fc.constantFrom('base', 'tip'),
        (seed, components, frame) => {
          const chain = randomArm(seed)
          const n = chain.joints.length
          const task = createTask(components, frame as 'base' | 'tip')
          const work = at(chain, randomPose(chain, seed))
          const { projector, basis, rank, nullity, lostDirections } = nullSpace(chain, work, task, structuralLoss(chain, task), {
            withProjector: true,
          }) as NullSpace & { projector: number[][] }
          const size = Math.max(1, work.taskValues.values[0]!)
          expect(nullity).toBe(n - rank)
          expect(projector.reduce((trace, row, i) => trace + row[i]!, 0)).toBeCloseTo(nullity, 12)
          for (let i = 0; i < n; i++) {
            for (let j = 0; j < n; j++) {
              expect(projector[i]![j]).toBe(projector[j]![i])
              const squared = projector[i]!.reduce((sum, part, k) => sum + part * projector[k]![j]!, 0)
              const rebuilt = basis[i]!.reduce((sum, part, k) => sum + part * basis[j]![k]!, 0)
              expect(squared).toBeCloseTo(projector[i]![j]!, 12)
              expect(rebuilt).toBeCloseTo(projector[i]![j]!, 12)
            }
          }
          for (let k = 0; k < nullity; k++) {
            for (let other = 0; other <= k; other++) {
              expect(column(basis, k).reduce((sum, part, i) => sum + part * basis[i]![other]!, 0)).toBeCloseTo(other === k ? 1 : 0, 12)
            }
            for (let row = 0; row < task.rows.length; row++) {
              const felt = column(basis, k).reduce((sum, part, i) => sum + part * work.taskJacobian[row * n + i]!, 0)
              // A truncated value of up to 1e-9 times the largest may leak; rounding is far below that.
              expect(Math.abs(felt)).toBeLessThan(2e-9 * size)
            }
          }
          expect(lostDirections).toHaveLength(task.rows.length - rank)
        },
      ),
      { seed: 6, numRuns: 80 },
    )
  })

  it('gives the basis that Gram-Schmidt on the columns of the projector gives, step by step', () => {
    for (const seed of [3, 8, 21, 34]) {
      const chain = randomArm(seed)
      const { projector, basis, nullity } = ask(chain, randomPose(chain, seed), createTask(['vx', 'wz']))
      const remaining = projector.map((row) => [...row])
      for (let k = 0; k < nullity; k++) {
        const norms = remaining.map((_row, i) => Math.sqrt(remaining.reduce((sum, row) => sum + row[i]! ** 2, 0)))
        const pivot = norms.findIndex((norm) => norm >= 0.499 * Math.max(...norms))
        const vector = remaining.map((row) => row[pivot]! / norms[pivot]!)
        expect(vector[pivot]).toBeGreaterThan(0)
        expectClose(column(basis, k), vector, 1e-12)
        remaining.forEach((row, i) =>
          row.forEach((_part, j) => {
            row[j]! -= vector[i]! * vector[j]!
          }),
        )
      }
    }
  })

  it('agrees with the pseudo-inverse of mathjs', () => {
    const chain = golden()
    const work = at(chain, GOLDEN_POSE)
    const { projector } = ask(chain, GOLDEN_POSE, createTask())
    nullSpace(chain, work, createTask(), structuralLoss(chain, createTask()))
    const j = Array.from({ length: 6 }, (_row, i) => Array.from(work.taskJacobian.subarray(7 * i, 7 * i + 7)))
    const witness = math.subtract(math.identity(7), math.multiply(math.pinv(j), j)) as unknown as { toArray(): number[][] }
    expectClose(projector.flat(), witness.toArray().flat(), 1e-12)
  })

  it('opens a further self-motion at a singular pose and names the direction that pays for it', () => {
    const { rank, nullity, lostDirections } = ask(planar([1, 1, 1]), [0, 0, 0], plane)
    expect([rank, nullity]).toEqual([1, 2])
    expect(lostDirections).toHaveLength(1)
    expectClose(lostDirections[0]!.direction, [1, 0, 0, 0, 0, 0], 1e-15)
    expect(lostDirections[0]!.structural).toBe(false)
  })

  it('tells what a planar arm never has from what it lacks at this pose, structural ones first and in twist order', () => {
    const bent = ask(planar([1, 1, 1]), [0.3, 0.4, 0.5], createTask()).lostDirections
    expect(bent.map(({ structural }) => structural)).toEqual([true, true, true])
    expectClose(
      bent.flatMap(({ direction }) => direction),
      [0, 0, 1, 0, 0, 0, 0, 0, 0, 1, 0, 0, 0, 0, 0, 0, 1, 0],
      1e-12,
    )
    const straight = ask(planar([1, 1, 1]), [0, 0, 0], createTask()).lostDirections
    expect(straight.map(({ structural }) => structural)).toEqual([true, true, true, false])
    expectClose(
      straight.flatMap(({ direction }) => direction),
      [...bent.flatMap(({ direction }) => direction), 1, 0, 0, 0, 0, 0],
      1e-12,
    )
  })

  it('calls the tilting of a SCARA arm structural in both frames', () => {
    for (const frame of ['base', 'tip'] as const) {
      const { lostDirections } = ask(scara(), [0.3, 0.7, 0.1, 1], createTask(undefined, frame))
      expect(lostDirections.map(({ structural }) => structural)).toEqual([true, true])
      expectClose(
        lostDirections.flatMap(({ direction }) => direction),
        [0, 0, 0, 1, 0, 0, 0, 0, 0, 0, 1, 0],
        1e-12,
      )
    }
  })

  it('calls a loss structural where no pose has more rank, though another direction is lost from pose to pose', () => {
    const fiveAxes: Chain = {
      ...sixAxis(),
      joints: sixAxis().joints.slice(0, 5),
      motions: sixAxis().motions.slice(0, 5),
      constants: sixAxis().constants.slice(0, 6),
    }
    const first = ask(fiveAxes, [0.3, -1, 1.2, 0.4, 0.9], createTask()).lostDirections
    const second = ask(fiveAxes, [1.3, -0.5, 0.9, 0.2, 0.7], createTask()).lostDirections
    expect([...first, ...second].map(({ structural }) => structural)).toEqual([true, true])
    expect(Math.abs(first[0]!.direction.reduce((sum, part, i) => sum + part * second[0]!.direction[i]!, 0))).toBeLessThan(0.99)
  })

  it('takes lost directions from the Jacobian scaled by the characteristic length', () => {
    const chain = arm([{ axis: [0, 0, 1] }], transform([1, 0, 0]))
    const task = createTask(['vy', 'wz'])
    expectClose(
      ask(chain, [0], task, { characteristicLength: 0.5 }).lostDirections[0]!.direction,
      [0, 1 / Math.sqrt(5), 0, 0, 0, -2 / Math.sqrt(5)],
      1e-15,
    )
  })

  it('decides rank by the tolerance it is given, here and in what counts as structural', () => {
    const chain = planar([1, 1, 1])
    expect(ask(chain, rad(30, 0.05, 0.05), plane).rank).toBe(2)
    const coarse = ask(chain, rad(30, 0.05, 0.05), plane, { tolerance: 1e-2 })
    expect([coarse.rank, coarse.nullity]).toEqual([1, 2])
    expect(coarse.lostDirections.map(({ structural }) => structural)).toEqual([false])
  })

  it('keeps a hundred joints exact', () => {
    const chain = planar(Array.from({ length: 108 }, (_unused, i) => 0.1 + (i % 7) / 50))
    const q = Array.from({ length: 108 }, (_unused, i) => Math.sin(i) / 5)
    const work = at(chain, q)
    const { basis, nullity } = nullSpace(chain, work, plane, structuralLoss(chain, plane))
    expect(nullity).toBe(106)
    for (let k = 0; k < nullity; k++) {
      const vector = column(basis, k)
      for (const row of [0, 1]) {
        expect(Math.abs(vector.reduce((sum, part, i) => sum + part * work.taskJacobian[row * 108 + i]!, 0))).toBeLessThan(
          1e-13 * work.taskValues.values[0]!,
        )
      }
      for (let other = 0; other <= k; other++) {
        expect(vector.reduce((sum, part, i) => sum + part * basis[i]![other]!, 0)).toBeCloseTo(other === k ? 1 : 0, 12)
      }
    }
  })

  it('leaves the basis out where it is not wanted', () => {
    const whole = ask(golden(), GOLDEN_POSE, createTask())
    expect(ask(golden(), GOLDEN_POSE, createTask(), { withBasis: false })).toEqual({ ...whole, basis: [] })
  })

  it('does not let rounding choose between two components of equal size', () => {
    const chain = planar([1, 1, 1])
    const signs = Array.from({ length: 50 }, (_unused, i) => Math.sign(column(ask(chain, rad(30 + i * 1e-9, 30, 30), plane).basis, 0)[1]!))
    expect(new Set(signs)).toEqual(new Set([1]))
  })

  it('gives the same bits for the same question', () => {
    const chain = randomArm(17)
    expect(ask(chain, randomPose(chain, 3), createTask())).toEqual(ask(chain, randomPose(chain, 3), createTask()))
  })
})

describe('alignTo', () => {
  const chain = golden()
  const task = createTask(['vx', 'vy', 'vz'])
  const known = structuralLoss(chain, task)
  const pose = (i: number) => GOLDEN_POSE.map((value, k) => value + 0.8 * Math.sin(0.01 * i + k))

  it('keeps a basis of four directions continuous along a path on which the canonical one jumps', () => {
    const step = (a: number[][], b: number[][]) => Math.max(...a.flatMap((row, i) => row.map((part, k) => Math.abs(part - b[i]![k]!))))
    let [aligned, canonical] = [nullSpace(chain, at(chain, pose(0)), task, known).basis, nullSpace(chain, at(chain, pose(0)), task, known).basis]
    let [worst, jump] = [0, 0]
    for (let i = 1; i <= 700; i++) {
      const work = at(chain, pose(i))
      const next = nullSpace(chain, work, task, known, { alignTo: aligned }).basis
      const plain = nullSpace(chain, work, task, known).basis
      worst = Math.max(worst, step(next, aligned))
      jump = Math.max(jump, step(plain, canonical))
      ;[aligned, canonical] = [next, plain]
    }
    expect(jump).toBeGreaterThan(0.5)
    expect(worst).toBeLessThan(0.05)
  })

  it('changes neither the space nor the projector', () => {
    const work = at(chain, pose(5))
    const plain = nullSpace(chain, work, task, known, { withProjector: true })
    const turned = nullSpace(chain, work, task, known, { withProjector: true, alignTo: nullSpace(chain, at(chain, pose(90)), task, known).basis })
    expect(turned.projector).toEqual(plain.projector)
    turned.basis.forEach((row, i) =>
      turned.basis.forEach((other, j) => expect(row.reduce((sum, part, k) => sum + part * other[k]!, 0)).toBeCloseTo(plain.projector![i]![j]!, 13)),
    )
  })

  it('goes through a singular pose, where a direction comes and goes', () => {
    const arm3 = planar([1, 1, 1])
    const loss = structuralLoss(arm3, plane)
    let basis = nullSpace(arm3, at(arm3, [0.3, 0.2, 0.2]), plane, loss).basis
    const widths = [[0, 0, 0], [0.1, -0.2, 0.3]].map((q) => {
      basis = nullSpace(arm3, at(arm3, q), plane, loss, { alignTo: basis }).basis
      return basis[0]!.length
    })
    expect(widths).toEqual([2, 1])
  })

  it('refuses a basis of another shape', () => {
    const work = at(chain, GOLDEN_POSE)
    for (const alignTo of [[[1]], [[1], [1], [1], [1], [1], [1], [1, 2]]]) {
      expect(() => nullSpace(chain, work, task, known, { alignTo })).toThrow('a basis to align to needs 7 rows of equal length')
    }
  })
})
