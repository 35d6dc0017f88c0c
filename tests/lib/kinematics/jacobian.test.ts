import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { jacobian } from '@/lib/kinematics/jacobian'
import { quaternionOf } from '@/lib/math/quaternion'
import { arm, at, golden, GOLDEN_POSE, planar, rad, randomArm, randomPose, screwArm, transform } from './arms'
import { expectClose } from './expect-close'

const SCREWS = [
  [0, 0, 1, 0, 0.2, 0.2],
  [1, 0, 0, 2, 0, 3],
  [0, 1, 0, 0, 2, 1],
  [1, 0, 0, 0.2, 0.3, 0.4],
] as const
const SCREW_POSE = [0.2, 1.1, 0.1, 1.2]

/** Rows of `matrix` (6 x n), angular block first. */
function angularFirst(matrix: ArrayLike<number>): number[] {
  const all = Array.from(matrix)
  return [...all.slice(all.length / 2), ...all.slice(0, all.length / 2)]
}

function rowsOf(matrix: ArrayLike<number>, rows: readonly number[]): number[] {
  const n = matrix.length / 6
  return rows.flatMap((row) => Array.from(matrix).slice(row * n, (row + 1) * n))
}

describe('jacobian', () => {
  it('J1 gives the planar 2R Jacobian of the closed form', () => {
    const chain = planar([0.4, 0.3])
    const j = rowsOf(jacobian(chain, at(chain, rad(30, 60))), [0, 1])
    expectClose(j, [-0.5, -0.3, 0.3464101615, 0], 1e-10)
    expect(j[0]! * j[3]! - j[1]! * j[2]!).toBeCloseTo(0.4 * 0.3 * Math.sin(Math.PI / 3), 15)
  })

  it('J2 gives the planar 3R Jacobian of the closed form, with one row of turning', () => {
    const chain = planar([1, 1, 1])
    const j = jacobian(chain, at(chain, rad(30, 30, 30)))
    expectClose(rowsOf(j, [0, 1]), [-2.3660254038, -1.8660254038, -1, 1.3660254038, 0.5, 0], 1e-10)
    expectClose(rowsOf(j, [2, 3, 4, 5]), [0, 0, 0, 0, 0, 0, 0, 0, 0, 1, 1, 1], 0)
  })

  it('J3 gives the body Jacobian of the code library of Lynch & Park 2017 in tool axes, screws with pitch as folded mimics', () => {
    const chain = screwArm(SCREWS, transform(), 'in-tip')
    expect(chain.motions.filter((motion) => !motion.rotary).map((motion) => motion.multiplier)).toEqual([0.2, 2, 2, 0.2])
    expectClose(
      angularFirst(jacobian(chain, at(chain, SCREW_POSE), 'tip')),
      [
        -0.04528405, 0.99500417, 0, 1, 0.74359313, 0.09304865, 0.36235775, 0, -0.66709716, 0.03617541, -0.93203909, 0, 2.32586047, 1.66809,
        0.56410831, 0.2, -1.44321167, 2.94561275, 1.43306521, 0.3, -2.06639565, 1.82881722, -1.58868628, 0.4,
      ],
      1e-8,
    )
  })

  it('J4 gives the space Jacobian of the same library once the reference point is shifted to the base origin', () => {
    const chain = screwArm(SCREWS, transform())
    const work = at(chain, SCREW_POSE)
    const n = 4
    const shifted = Array.from(jacobian(chain, work))
    const [x, y, z] = [work.baseFromTip[3]!, work.baseFromTip[7]!, work.baseFromTip[11]!]
    for (let c = 0; c < n; c++) {
      const [w1, w2, w3] = [shifted[3 * n + c]!, shifted[4 * n + c]!, shifted[5 * n + c]!]
      shifted[c]! += y * w3 - z * w2
      shifted[n + c]! += z * w1 - x * w3
      shifted[2 * n + c]! += x * w2 - y * w1
    }
    expectClose(
      angularFirst(shifted),
      [
        0, 0.98006658, -0.09011564, 0.95749426, 0, 0.19866933, 0.4445544, 0.28487557, 1, 0, 0.89120736, -0.04528405, 0, 1.95218638,
        -2.21635216, -0.51161537, 0.2, 0.43654132, -2.43712573, 2.77535713, 0.2, 2.96026613, 3.23573065, 2.22512443,
      ],
      1e-8,
    )
  })

  it('J5 gives the golden Jacobian of the 7R arm', () => {
    const chain = golden()
    expectClose(
      jacobian(chain, at(chain, GOLDEN_POSE)),
      [
        0.04363621, 0.714306905, 0.084082602, -0.31677871, -0.084809167, 0.018504288, 0, 0.039212607, 0.12595158, -0.207459553,
        -0.229596056, 0.008196407, 0.077708111, 0, 0, -0.031039531, -0.017026609, -0.100178436, -0.015499164, -0.060158464, 0, 0,
        -0.173648178, 0.336824089, 0.613092022, -0.201320346, -0.979291909, -0.082137029, 0, 0.984807753, 0.059391175, -0.771280576,
        -0.361850031, 0.094643954, 0.622243901, 1, 0, 0.939692621, -0.171010072, 0.9102388, -0.178968935, 0.778502432,
      ],
      1e-9,
    )
  })

  it('J6 gives the velocity of the tool point and not that of the base origin', () => {
    const chain = arm([{}], transform([0.5, 0, 0.3]))
    const column = (tool?: number[]) => Array.from(jacobian(chain, at(chain, [0], tool)))
    expect(column()).toEqual([0, 0.5, 0, 0, 0, 1])
    expectClose(
      column(transform([0.1, 0, 0])).map((v, i) => v - column()[i]!),
      [0, 0.1, 0, 0, 0, 0],
      1e-15,
    )
  })

  it('folds a mimic joint into the column of the joint it follows', () => {
    const chain = arm([{}, { xyz: [1, 0, 0] }, { xyz: [1, 0, 0], mimic: { joint: 1, multiplier: 2, offset: 0.1 } }], transform([1, 0, 0]))
    expectClose(rowsOf(jacobian(chain, at(chain, [0.3, 0.4])), [0, 1]), [-1.9393114969, -3.6429384963, 1.6909791541, 0.6772436204], 1e-10)
  })

  it('is the derivative of the pose, on random arms with prismatic joints, mimics and a tool', () => {
    const tool = transform([0.1, 0.2, -0.3], [1, -0.5, 2])
    for (let seed = 1; seed <= 40; seed++) {
      const chain = randomArm(seed)
      const q = randomPose(chain, seed)
      const exact = jacobian(chain, at(chain, q, tool))
      expectClose(exact, differences(chain, q, tool), 2e-7 * Math.max(1, ...Array.from(exact, Math.abs)))
    }
  })

  it('turns both blocks into tool axes, which changes no length', () => {
    const chain = randomArm(5)
    const work = at(chain, randomPose(chain, 5))
    const base = Array.from(jacobian(chain, work))
    const tip = Array.from(jacobian(chain, work, 'tip'))
    const n = chain.joints.length
    for (let c = 0; c < n; c++) {
      for (const block of [0, 3]) {
        const length = (m: number[]) => Math.sqrt([0, 1, 2].reduce((sum, k) => sum + m[(block + k) * n + c]! ** 2, 0))
        expect(length(tip)).toBeCloseTo(length(base), 13)
      }
    }
    expect(tip).not.toEqual(base)
  })
})

/** Central differences of position and rotation; the angular velocity from the quaternion of the small rotation between both sides. */
function differences(chain: Chain, q: readonly number[], tool: readonly number[]): number[] {
  const n = q.length
  const step = 1e-6
  const out = new Array<number>(6 * n).fill(0)
  for (let c = 0; c < n; c++) {
    const moved = (by: number) =>
      at(
        chain,
        q.map((value, i) => (i === c ? value + by : value)),
        tool,
      ).baseFromTool
    const [plus, minus] = [moved(step), moved(-step)]
    for (const k of [0, 1, 2]) out[k * n + c] = (plus[4 * k + 3]! - minus[4 * k + 3]!) / (2 * step)
    const turn = new Float64Array(12)
    for (let i = 0; i < 3; i++) {
      for (let j = 0; j < 3; j++) turn[4 * i + j] = [0, 1, 2].reduce((sum, k) => sum + plus[4 * i + k]! * minus[4 * j + k]!, 0)
    }
    const quaternion = quaternionOf(turn)
    for (const k of [0, 1, 2]) out[(3 + k) * n + c] = (2 * quaternion[k]!) / (2 * step)
  }
  return out
}
