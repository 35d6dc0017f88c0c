import { SingularValueDecomposition } from 'ml-matrix'
import { describe, expect, it } from 'vitest'
import { measures, partMeasures } from '@/lib/kinematics/measures'
import { createTask } from '@/lib/kinematics/task'
import { arm, at, golden, GOLDEN_POSE, planar, rad, randomArm, randomPose } from './arms'
import { expectClose } from './expect-close'

const plane = createTask(['vx', 'vy'])

describe('measures', () => {
  it('J1 gives the singular values of the planar 2R arm, and l1·l2·|sin q2| as manipulability (Yoshikawa 1985)', () => {
    const chain = planar([0.4, 0.3])
    const { singularValues, manipulability, rank } = measures(chain, at(chain, rad(30, 60)), plane)
    expectClose(singularValues, [0.659683898, 0.157534614], 1e-9)
    expect(manipulability).toBeCloseTo(0.1039230485, 10)
    expect(rank).toBe(2)
  })

  it('gives the golden 7R arm its manipulability, and a condition number that depends on the characteristic length', () => {
    const chain = golden()
    const work = at(chain, GOLDEN_POSE)
    const of = (characteristicLength: number) => measures(chain, work, createTask(), { characteristicLength }).conditionNumber
    expect(measures(chain, work, createTask()).manipulability).toBeCloseTo(0.0193374876, 9)
    expectClose(
      [1, 0.001, 0.1, 0.3, 0.5].map((length) => of(length)!),
      [24.654, 1421.11, 16.608, 12.611, 14.614],
      0.005,
    )
  })

  it('finds the isotropic pose of a 2R arm with l1 = √2·l2, whatever the first joint does (Salisbury & Craig 1982)', () => {
    const chain = planar([Math.SQRT2, 1])
    for (const q of [rad(0, 135), rad(77, -135)]) {
      const { singularValues, conditionNumber } = measures(chain, at(chain, q), plane)
      expectClose(singularValues, [1, 1], 1e-14)
      expect(conditionNumber).toBeCloseTo(1, 14)
    }
  })

  it.each([
    ['the elbow stretched', [10, 20, 30, 0, 50, 60, 70]],
    ['shoulder upright and upper roll square', [10, 0, 90, 40, 50, 60, 70]],
    ['wrist straight and fore roll square', [10, 20, 30, 40, 90, 0, 70]],
    ['shoulder upright and wrist straight', [10, 0, 30, 40, 50, 0, 70]],
  ])('knows the golden arm to be singular with %s, and gives no condition number', (_name, degrees) => {
    const chain = golden()
    const { singularValues, rank, conditionNumber } = measures(chain, at(chain, rad(...degrees)), createTask())
    expect(singularValues.at(-1)).toBeLessThan(1e-15)
    expect(rank).toBe(5)
    expect(conditionNumber).toBeNull()
  })

  it.each([
    ['the shoulder upright', [10, 0, 30, 40, 50, 60, 70]],
    ['the wrist straight', [10, 20, 30, 40, 50, 0, 70]],
  ])('does not call the golden arm singular with %s alone', (_name, degrees) => {
    const chain = golden()
    expect(measures(chain, at(chain, rad(...degrees)), createTask()).rank).toBe(6)
  })

  it('agrees with the singular values of ml-matrix on random arms, tasks and frames', () => {
    for (let seed = 1; seed <= 40; seed++) {
      const chain = randomArm(seed)
      const task = createTask(seed % 3 === 0 ? ['vx', 'wz', 'vy'] : undefined, seed % 2 === 0 ? 'tip' : 'base')
      const work = at(chain, randomPose(chain, seed))
      const { singularValues } = measures(chain, work, task, { characteristicLength: 0.5 })
      const n = chain.joints.length
      const rows = task.rows.map((_row, k) => Array.from(work.taskJacobian.subarray(k * n, (k + 1) * n)))
      const witness = new SingularValueDecomposition(rows, { autoTranspose: true }).diagonal.slice(0, singularValues.length)
      expectClose(singularValues, witness, 1e-12 * Math.max(1, witness[0]!))
    }
  })

  it('has as many singular values as joints when there are fewer joints than components', () => {
    const chain = planar([1, 1])
    expect(measures(chain, at(chain, [0.3, 0.4]), createTask()).singularValues).toHaveLength(2)
  })

  it('counts rank by the tolerance it is given', () => {
    const chain = planar([1, 1])
    const work = at(chain, [0.3, 1e-3])
    expect(measures(chain, work, plane).rank).toBe(2)
    expect(measures(chain, work, plane, { tolerance: 1e-2 })).toMatchObject({ rank: 1, conditionNumber: null })
  })

  it('says rank 0 of an arm that the task does not feel at all', () => {
    const chain = arm([{ type: 'prismatic' }])
    expect(measures(chain, at(chain, [0.2]), createTask(['wx', 'wy']))).toMatchObject({
      rank: 0,
      singularValues: [0],
      conditionNumber: null,
    })
  })
})

describe('partMeasures', () => {
  it('gives the singular values of the linear and the angular rows, each by itself', () => {
    const chain = golden()
    const work = at(chain, GOLDEN_POSE)
    for (const frame of ['base', 'tip'] as const) {
      const { translational, rotational } = partMeasures(chain, work, createTask(undefined, frame))
      const witness = (components: readonly ['vx', 'vy', 'vz'] | readonly ['wx', 'wy', 'wz']) => {
        measures(chain, work, createTask(components))
        return new SingularValueDecomposition([0, 1, 2].map((k) => Array.from(work.taskJacobian.subarray(7 * k, 7 * k + 7))), { autoTranspose: true }).diagonal
      }
      expectClose(translational, witness(['vx', 'vy', 'vz']), 1e-14)
      expectClose(rotational, witness(['wx', 'wy', 'wz']), 1e-14)
    }
  })

  it('leaves a part empty that the task does not have', () => {
    const chain = planar([1, 1])
    const { translational, rotational } = partMeasures(chain, at(chain, rad(30, 60)), plane)
    expect(translational).toHaveLength(2)
    expect(rotational).toEqual([])
    expect(partMeasures(chain, at(chain, [0, 0]), createTask(['wz'])).translational).toEqual([])
  })
})
