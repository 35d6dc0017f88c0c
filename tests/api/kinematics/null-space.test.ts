import { describe, expect, it } from 'vitest'
import { resultOf } from './ask'
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
