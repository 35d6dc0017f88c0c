import { describe, expect, it } from 'vitest'
import { expectProblem, pointersOf } from '../expect-problem'
import { ask, resultOf, resultsOf } from './ask'
import { expectClose } from './close'

const PLANAR = { components: ['vx', 'vy'] }
const rad = (...degrees: number[]) => degrees.map((value) => (value * Math.PI) / 180)

describe('the basis', () => {
  it('is the planar closed form, signed by its first large joint (METHODS.md section 6)', async () => {
    for (const [q1, q2, q3] of [[30, 30, 30], [-70, 100, -40], [10, -20, 130]] as const) {
      const { basis, nullity, rank } = await resultOf('null-space', 'trainer-3r', { configurations: [rad(q1, q2, q3)], task: PLANAR })
      // n = (l2 l3 s3, -(l2 l3 s3 + l1 l3 s23), l1 l2 s2 + l1 l3 s23) with links of 1 m.
      const [s2, s3, s23] = [q2, q3, q2 + q3].map((value) => Math.sin((value * Math.PI) / 180)) as [number, number, number]
      const n = [s3, -(s3 + s23), s2 + s23]
      const length = Math.hypot(...n)
      const pivot = n.find((value) => Math.abs(value) >= 0.499 * Math.max(...n.map(Math.abs)))!
      expectClose(basis, n.map((value) => [(Math.sign(pivot) * value) / length]), 1e-12)
      expect({ nullity, rank }).toEqual({ nullity: 1, rank: 2 })
    }
  })

  it('has the published numbers at 30°, 30°, 30°, and the projector when asked for', async () => {
    const question = { units: { angle: 'deg' }, configurations: [[30, 30, 30]], task: PLANAR }
    const { projector, basis } = await resultOf('null-space', 'trainer-3r', { ...question, include: ['basis', 'projector'] })
    expectClose(basis, [[-0.2505628071], [0.6845503194], [-0.6845503194]], 1e-10)
    expectClose(projector, [
      [0.0627817203, -0.1715228496, 0.1715228496],
      [-0.1715228496, 0.4686091399, -0.4686091399],
      [0.1715228496, -0.4686091399, 0.4686091399],
    ], 1e-10)
    expect(await resultOf('null-space', 'trainer-3r', question)).not.toHaveProperty('projector')
  })

  it('is larger at a singular pose', async () => {
    const { nullity, basis } = await resultOf('null-space', 'trainer-3r', { configurations: [[0, 0, 0]], task: PLANAR })
    expect(nullity).toBe(2)
    for (const column of [0, 1]) expectClose(3 * basis![0]![column]! + 2 * basis![1]![column]! + basis![2]![column]!, 0, 1e-12)
  })

  it('leaves the elbow of an arm with spherical shoulder and wrist still (METHODS.md section 6)', async () => {
    const { basis, nullity } = await resultOf('null-space', 'skerry-7', { units: { angle: 'deg' }, configurations: [[10, 20, 30, 40, 50, 60, 70]] })
    expect(nullity).toBe(1)
    expectClose(basis![3]![0]!, 0, 1e-12)
  })

  it('holds whatever the units', async () => {
    const si = await resultOf('null-space', 'gannet-4', { configurations: [[0.3, 0.4, 0.05, 0.6]], task: PLANAR })
    const shop = await resultOf('null-space', 'gannet-4', { units: { length: 'mm' }, configurations: [[0.3, 0.4, 50, 0.6]], task: PLANAR })
    expect(shop).toEqual(si)
  })

  it('counts as free what the tolerance calls lost', async () => {
    const question = { configurations: [[0.3, 1e-4, 1e-4]], task: PLANAR }
    expect((await resultOf('null-space', 'trainer-3r', question)).rank).toBe(2)
    expect((await resultOf('null-space', 'trainer-3r', { ...question, tolerance: 1e-2 })).rank).toBe(1)
  })
})

describe('lost directions', () => {
  it('are structural where no pose of the chain has them', async () => {
    const { lostDirections } = await resultOf('null-space', 'trainer-3r', { units: { angle: 'deg' }, configurations: [[30, 30, 30]] })
    expect(lostDirections).toEqual([2, 3, 4].map((row) => ({ direction: [0, 1, 2, 3, 4, 5].map((i) => (i === row ? 1 : 0)), structural: true })))
  })

  it('are not structural where only this pose lacks them', async () => {
    const { lostDirections } = await resultOf('null-space', 'trainer-3r', { configurations: [[0, 0, 0]], task: PLANAR })
    expect(lostDirections).toEqual([{ direction: [1, 0, 0, 0, 0, 0], structural: false }])
    expect((await resultOf('null-space', 'trainer-3r', { configurations: [[0.1, 0.4, 0.2]], task: PLANAR })).lostDirections).toEqual([])
  })

  it('are written in the frame of the task', async () => {
    const { lostDirections } = await resultOf('null-space', 'trainer-3r', { units: { angle: 'deg' }, configurations: [[90, 0, 0]], task: { ...PLANAR, frame: 'tip' } })
    expect(lostDirections).toHaveLength(1)
    expectClose(lostDirections![0]!.direction, [1, 0, 0, 0, 0, 0], 1e-12)
  })
})

/** Columns of a basis (n x k). */
const columns = (basis: readonly (readonly number[])[]) => basis[0]!.map((_, k) => basis.map((row) => row[k]!))
const dot = (a: readonly number[], b: readonly number[]) => a.reduce((sum, value, i) => sum + value * b[i]!, 0)
/** The largest change of an entry from each basis to the next. */
const jumps = (bases: readonly (readonly (readonly number[])[])[]) =>
  bases.slice(1).map((basis, i) => Math.max(...basis.flatMap((row, r) => row.map((value, k) => Math.abs(value - bases[i]![r]![k]!)))))

describe('alignTo', () => {
  const bent = { configurations: [rad(30, 30, 30)], task: PLANAR }

  it('turns the first result to the basis sent, which need not be exact', async () => {
    const canonical = (await resultOf('null-space', 'trainer-3r', bent)).basis!
    for (const [alignTo, sign] of [[[[0.3], [-0.7], [0.6]], -1], [[[-3], [7], [-6]], 1]] as const) {
      expectClose((await resultOf('null-space', 'trainer-3r', { ...bent, alignTo })).basis, canonical.map(([value]) => [sign * value!]), 1e-12)
    }
  })

  it('turns each further result to the one before, where the canonical basis jumps', async () => {
    const configurations = Array.from({ length: 61 }, (_, i) => [0.4, 1.2, 0.2 + (2.3 * i) / 60])
    const canonical = (await resultsOf('null-space', 'trainer-3r', { configurations, task: PLANAR })).map(({ basis }) => basis!)
    expect(Math.max(...jumps(canonical))).toBeGreaterThan(0.5)
    const aligned = (await resultsOf('null-space', 'trainer-3r', { configurations, task: PLANAR, alignTo: canonical[0] })).map(({ basis }) => basis!)
    expect(Math.max(...jumps(aligned))).toBeLessThan(0.1)
    expectClose(aligned[0], canonical[0]!, 1e-12)
    // Whatever its sign, it is the same line.
    aligned.forEach((basis, i) => expectClose(Math.abs(dot(columns(basis)[0]!, columns(canonical[i]!)[0]!)), 1, 1e-12))
  })

  it('keeps two directions continuous, orthonormal and within the null space', async () => {
    // The wrist flips past straight, the elbow bends: seven joints with a symmetric tool have two directions to spare.
    const configurations = Array.from({ length: 81 }, (_, i) => rad(10 + i, -35 + i / 2, 20 - i, 40 + i / 2, 50, -39.7 + i, 70))
    const question = { configurations, task: { components: ['vx', 'vy', 'vz', 'wx', 'wy'], frame: 'tip' }, include: ['basis', 'projector', 'nullity'] }
    const first = await resultOf('null-space', 'skerry-7', { ...question, configurations: [configurations[0]] })
    expect(first.nullity).toBe(2)
    const results = await resultsOf('null-space', 'skerry-7', { ...question, alignTo: first.basis })
    expect(Math.max(...jumps(results.map(({ basis }) => basis!)))).toBeLessThan(0.2)
    for (const { basis, projector } of results) {
      const pair = columns(basis!)
      expectClose(pair.map((a) => pair.map((b) => dot(a, b))), [[1, 0], [0, 1]], 1e-12)
      expectClose(basis!.map((row) => basis!.map((other) => dot(row, other))), projector!, 1e-12)
    }
  })

  it('is the nearest of all turned bases (orthogonal Procrustes)', async () => {
    const question = { configurations: [rad(10, 20, 30, 40, 50, 60, 70)], task: { components: ['vx', 'vy', 'vz', 'wx', 'wy'], frame: 'tip' } }
    const alignTo = [[0.2, 0.1], [-0.5, 0.3], [0.4, -0.2], [0.1, 0.7], [0.3, 0.2], [-0.1, 0.6], [0.6, -0.4]]
    const { basis } = await resultOf('null-space', 'skerry-7', { ...question, alignTo })
    // At the best turn the overlap with what was wanted is symmetric and positive.
    const [[a, b], [c, d]] = columns(basis!).map((mine) => columns(alignTo).map((wanted) => dot(mine, wanted))) as [[number, number], [number, number]]
    expectClose(b, c, 1e-12)
    expect(a + d).toBeGreaterThan(0)
    expect(a * d - b * c).toBeGreaterThan(0)
  })

  it('matches as many columns as there are on both sides', async () => {
    const two = { configurations: [rad(10, 20, 30, 40, 50, 60, 70)], task: { components: ['vx', 'vy', 'vz', 'wx', 'wy'], frame: 'tip' } }
    const plain = columns((await resultOf('null-space', 'skerry-7', two)).basis!)
    // One column for two directions: the first becomes it, the second is what is left, canonical.
    const wanted = plain[0]!.map((value, i) => [(value + plain[1]![i]!) / -Math.SQRT2])
    const [first, second] = columns((await resultOf('null-space', 'skerry-7', { ...two, alignTo: wanted })).basis!) as [number[], number[]]
    expectClose(first, wanted.map(([value]) => value!), 1e-12)
    const largest = Math.max(...second.map(Math.abs))
    expect(second.find((value) => Math.abs(value) >= 0.499 * largest)).toBeGreaterThan(0)
    expectClose(dot(first, second), 0, 1e-12)
    // Three columns for one direction: the last two are not used.
    const one = await resultOf('null-space', 'trainer-3r', { ...bent, alignTo: [[0.3, 5, 0], [-0.7, 5, 0], [0.6, 5, 1]] })
    expect(one).toEqual(await resultOf('null-space', 'trainer-3r', { ...bent, alignTo: [[0.3], [-0.7], [0.6]] }))
    // None: canonical.
    expect(await resultOf('null-space', 'trainer-3r', { ...bent, alignTo: [[], [], []] })).toEqual(await resultOf('null-space', 'trainer-3r', bent))
  })

  it('goes on where the null space grows and shrinks on the way', async () => {
    const configurations = [[0.3, 0.4, 0.5], [0, 0, 0], [0.3, 0.4, 0.5]]
    const results = await resultsOf('null-space', 'trainer-3r', { configurations, task: PLANAR, alignTo: [[1], [-1], [1]] })
    expect(results.map(({ nullity, basis }) => [nullity, basis![0]!.length])).toEqual([[1, 1], [2, 2], [1, 1]])
    const [before, straight] = results.map(({ basis }) => columns(basis!)) as [number[][], number[][]]
    expect(dot(before[0]!, straight[0]!)).toBeGreaterThan(0.5)
  })

  it('changes nothing but the basis', async () => {
    const include = ['rank', 'nullity', 'singularValues', 'lostDirections', 'projector']
    expect(await resultOf('null-space', 'trainer-3r', { ...bent, include, alignTo: [[1], [2], [3]] })).toEqual(await resultOf('null-space', 'trainer-3r', { ...bent, include }))
  })

  it.each([
    [[[1], [0]], 'length-mismatch', ['/alignTo']],
    [[], 'length-mismatch', ['/alignTo']],
    [[[1], [0], [0], [0]], 'length-mismatch', ['/alignTo']],
    [[[1], [0, 1], []], 'length-mismatch', ['/alignTo/1', '/alignTo/2']],
    [[[1], [2e9], [0]], 'invalid-request', ['/alignTo/1/0']],
    [[1, 0, 0], 'invalid-request', ['/alignTo/0', '/alignTo/1', '/alignTo/2']],
    [[[1], [null], [0]], 'invalid-request', ['/alignTo/1/0']],
  ] as const)('refuses %j', async (alignTo, code, pointers) => {
    const response = await ask('null-space', 'trainer-3r', { ...bent, alignTo })
    expectProblem(response, code)
    expect(pointersOf(response)).toEqual(pointers)
  })
})
