import { describe, expect, it } from 'vitest'
import { resultOf } from './ask'
import { expectClose } from './close'

const DEG = { angle: 'deg' }
const BENT = { units: DEG, configurations: [[30, 30, 30]] }
/** METHODS.md J2: linear rows of the planar arm at 30°, 30°, 30°. */
const J2 = [[-2.3660254038, -1.8660254038, -1], [1.3660254038, 0.5, 0]]
const NONE = [0, 0, 0]

describe('the matrix', () => {
  it('is 6 x n in twist order, as the planar closed form has it (METHODS.md J2)', async () => {
    const { jacobian } = await resultOf('jacobian', 'trainer-3r', { configurations: [[Math.PI / 6, Math.PI / 6, Math.PI / 6]] })
    expectClose(jacobian, [...J2, NONE, NONE, NONE, [1, 1, 1]], 1e-10)
  })

  it('stays 6 x n whatever the task, and turns with the frame', async () => {
    // The tool points along y of the base: its x is base y, its y is minus base x.
    const { jacobian } = await resultOf('jacobian', 'trainer-3r', { ...BENT, units: {}, configurations: [[0, 0, Math.PI / 2]], frame: 'tip', task: { components: ['vx'] } })
    expectClose(jacobian, [[2, 1, 0], [1, 1, 1], NONE, NONE, NONE, [1, 1, 1]], 1e-12)
  })

  it('is of the tool point', async () => {
    const tool = { position: [-1, 0, 0], quaternion: [0, 0, 0, 1] }
    const { jacobian } = await resultOf('jacobian', 'trainer-3r', { configurations: [NONE], tool })
    expectClose(jacobian, [NONE, [2, 1, 0], NONE, NONE, NONE, [1, 1, 1]])
  })

  it('is written in the units of row over column', async () => {
    const q = [20, -40, 50, 30]
    const shop = await resultOf('jacobian', 'gannet-4', { units: { length: 'mm', angle: 'deg' }, configurations: [q] })
    const si = await resultOf('jacobian', 'gannet-4', { configurations: [[(20 * Math.PI) / 180, (-40 * Math.PI) / 180, 0.05, (30 * Math.PI) / 180]] })
    const mmPerDeg = (1000 * Math.PI) / 180
    // Columns: rotary, rotary, prismatic, rotary. Linear rows in mm per deg or mm per mm, angular rows in deg per deg.
    const factor = (row: number, column: number) => (row < 3 && column !== 2 ? mmPerDeg : 1)
    expectClose(shop.jacobian, si.jacobian!.map((row, i) => row.map((value, j) => value * factor(i, j))), 1e-10)
    expect(shop.singularValues).toEqual(si.singularValues)
  })
})

describe('the measures', () => {
  it('are those of the planar position task (METHODS.md sections 6, 7)', async () => {
    const result = await resultOf('jacobian', 'trainer-3r', { ...BENT, task: { components: ['vx', 'vy'] } })
    expectClose(result.singularValues, [3.4438944967, 0.5794334462], 1e-9)
    // Manipulability: the length of the closed-form null vector, by Cauchy and Binet.
    expectClose(result.manipulability!, 1.9955076567, 1e-9)
    expectClose(result.conditionNumber!, 3.4438944967 / 0.5794334462, 1e-8)
    expect(result.rank).toBe(2)
  })

  it('are those of the square task with the turn (METHODS.md J2: det = 0.5)', async () => {
    const result = await resultOf('jacobian', 'trainer-3r', { ...BENT, task: { components: ['wz', 'vx', 'vy'] } })
    expectClose(result.manipulability!, 0.5, 1e-12)
    expect(result.rank).toBe(3)
  })

  it('have one singular value for each component or joint, whichever are fewer, and no condition where rank is lost', async () => {
    const whole = await resultOf('jacobian', 'trainer-3r', BENT)
    expect([whole.singularValues!.length, whole.rank]).toEqual([3, 3])
    const straight = await resultOf('jacobian', 'trainer-3r', { configurations: [NONE], task: { components: ['vx', 'vy'] } })
    expect(straight).toMatchObject({ rank: 1, conditionNumber: null })
    expectClose(straight.singularValues, [Math.sqrt(14), 0], 1e-12)
  })

  it('divide the linear rows by the characteristic length, and only them', async () => {
    const question = { ...BENT, task: { components: ['vx', 'vy'] } }
    const scaled = await resultOf('jacobian', 'trainer-3r', { ...question, characteristicLength: 2 })
    expectClose(scaled.singularValues, [3.4438944967 / 2, 0.5794334462 / 2], 1e-9)
    const turning = await resultOf('jacobian', 'trainer-3r', { ...BENT, task: { components: ['wz'] }, characteristicLength: 2 })
    expectClose(turning.singularValues, [Math.sqrt(3)], 1e-12)
  })

  it('are taken in the frame of the task', async () => {
    const question = { units: DEG, configurations: [[0, 0, 90]] }
    const alongBaseX = await resultOf('jacobian', 'trainer-3r', { ...question, task: { components: ['vx'], frame: 'base' } })
    const alongToolX = await resultOf('jacobian', 'trainer-3r', { ...question, task: { components: ['vx'], frame: 'tip' } })
    expectClose(alongBaseX.singularValues, [Math.sqrt(3)], 1e-12)
    expectClose(alongToolX.singularValues, [Math.sqrt(5)], 1e-12)
  })
})

describe('the parts', () => {
  const parts = ['translationalSingularValues', 'rotationalSingularValues']

  it('are of the linear and the angular rows by themselves: those of J2 by their closed form', async () => {
    const { translationalSingularValues, rotationalSingularValues } = await resultOf('jacobian', 'trainer-3r', { ...BENT, include: parts })
    // The squares are the eigenvalues of the 2 x 2 matrix J2 J2ᵀ.
    const rowTimesRow = (i: number, j: number) => J2[i]!.reduce((sum, value, column) => sum + value * J2[j]![column]!, 0)
    const [a, b, d] = [rowTimesRow(0, 0), rowTimesRow(0, 1), rowTimesRow(1, 1)]
    const root = Math.hypot((a - d) / 2, b)
    expectClose(translationalSingularValues, [Math.sqrt((a + d) / 2 + root), Math.sqrt((a + d) / 2 - root), 0], 1e-9)
    expectClose(rotationalSingularValues, [Math.sqrt(3), 0, 0], 1e-12)
  })

  it('are in SI whatever the units, and free of the characteristic length', async () => {
    const asked = (more: object) => resultOf('jacobian', 'gannet-4', { configurations: [[0.3, -0.7, 0.05, 0.5]], include: parts, ...more })
    const plain = await asked({})
    expect(await asked({ characteristicLength: 0.1 })).toEqual(plain)
    const q = [0.3, -0.7, 0.05, 0.5].map((value, i) => (i === 2 ? value * 1000 : (value * 180) / Math.PI))
    const shop = await asked({ units: { length: 'mm', angle: 'deg' }, configurations: [q] })
    expectClose(shop.translationalSingularValues, plain.translationalSingularValues!, 1e-12)
    expectClose(shop.rotationalSingularValues, plain.rotationalSingularValues!, 1e-12)
  })

  it('are empty where the task has no component of the kind', async () => {
    expect(await resultOf('jacobian', 'trainer-3r', { ...BENT, include: parts, task: { components: ['wz'] } })).toEqual({ translationalSingularValues: [], rotationalSingularValues: [expect.closeTo(Math.sqrt(3), 12)] })
    expect((await resultOf('jacobian', 'trainer-3r', { ...BENT, include: parts, task: { components: ['vx', 'vy'] } })).rotationalSingularValues).toEqual([])
  })
})
