import { describe, expect, it } from 'vitest'
import type { Chain } from '@/lib/kinematics/chain'
import { createTask } from '@/lib/kinematics/task'
import { at, golden, planar, rad, transform } from './arms'
import { askRates, EXACT, flat, PLANE, type Wish } from './ask-rates'

function words(chain: Chain, q: ArrayLike<number>, twist: ArrayLike<number>, wish: Wish = {}): string {
  const found = askRates(chain, q, twist, { inverse: EXACT, ...wish }).diagnosis.filter(({ code, structural }) => code === 'direction-lost' && structural === false)
  expect(found).toHaveLength(1)
  return found[0]!.detail
}

/** The twist that asks of the point where the golden arm's wrist axes meet to move away from the shoulder. */
function outwardAtWrist(q: readonly number[]): number[] {
  const t = at(golden(), q).baseFromTip
  const fromWrist = [0.1 * t[2]!, 0.1 * t[6]!, 0.1 * t[10]!]
  const wrist = [t[3]! - fromWrist[0]!, t[7]! - fromWrist[1]!, t[11]! - fromWrist[2]! - 0.3]
  const [x, y, z] = wrist as [number, number, number]
  const [a, b, c] = fromWrist.map((part) => -part) as [number, number, number]
  return [x, y, z, b * z - c * y, c * x - a * z, a * y - b * x]
}

describe('lostGeometry', () => {
  it('names the plane and the joint at which a planar arm is stretched or folded, and tells outward from inward', () => {
    const chain = planar([1, 1, 1])
    const out = words(chain, rad(30, 0, 0), flat(Math.cos(Math.PI / 6), 0.5), { task: PLANE })
    expect(out).toContain("radially outward, away from the axis of 'motion-1', in the plane of links 'link-1' and 'link-2': the arm is stretched at 'motion-2'")
    expect(words(chain, rad(30, 0, 0), flat(-Math.cos(Math.PI / 6), -0.5), { task: PLANE })).toContain('radially inward, towards')
    expect(words(chain, [0, 0, Math.PI], flat(1, 0), { task: PLANE })).toContain("in the plane of links 'link-2' and 'link-3': the arm is folded at 'motion-3'")
    const folded = planar([2, 1])
    expect(words(folded, [0, Math.PI], flat(1, 0), { task: PLANE })).toContain("the arm is folded at 'motion-2'")
  })

  it('says the same in tip axes, in which the direction has other numbers', () => {
    const task = createTask(['vx', 'vy'], 'tip')
    expect(words(planar([1, 1, 1]), rad(30, 0, 0), flat(1, 0), { task })).toContain('along x of the tool (radially outward, away from')
  })

  it('names the point of the stretched 7R arm that cannot move: the wrist, away from the shoulder', () => {
    const q = rad(10, 40, 30, 0, 20, 50, 60)
    expect(words(golden(), q, outwardAtWrist(q))).toContain(
      "(the point where the axes of 'motion-6' and 'motion-7' meet cannot move radially outward, away from the point where the axes of " +
        "'motion-1' and 'motion-2' meet, in the plane of links 'link-3' and 'link-4': the arm is stretched at 'motion-4')",
    )
  })

  it('says that two axes are in line where that is what costs a turn', () => {
    const q = rad(10, 20, 90, 40, 90, 0, 70)
    const lost = askRates(golden(), q, [0, 0, 0, 1, 2, 3], { inverse: EXACT }).diagnosis.find(({ code }) => code === 'direction-lost')
    expect(lost).toBeDefined()
    const roll = planar([0, 0])
    const wrist: Chain = {
      ...roll,
      joints: [...roll.joints, { ...roll.joints[0]!, name: 'joint-3' }],
      motions: [
        { ...roll.motions[0]!, axis: [0, 0, 1] },
        { ...roll.motions[1]!, axis: [0, 1, 0] },
        { ...roll.motions[1]!, name: 'motion-3', joint: 2, axis: [0, 0, 1] },
      ],
      constants: [transform(), transform(), transform(), transform([0, 0, 0.1])],
    }
    const detail = words(wrist, [0.3, 0, 0.2], [0, 0, 0, Math.cos(0.3), Math.sin(0.3), 0], { task: createTask(['wx', 'wy', 'wz']) })
    expect(detail).toContain("the axes of 'motion-1' and 'motion-3' are in line")
  })

  it('keeps to the numbers of the twist where neither is so', () => {
    const q = rad(10, 0, 30, 40, 50, 0, 70)
    const lost = askRates(golden(), q, [1, 1, 1, 1, 1, 1], { inverse: EXACT }).diagnosis.filter(({ code }) => code === 'direction-lost')
    expect(lost).toHaveLength(1)
    expect(lost[0]!.detail).toMatch(/^The tool cannot move in the direction \(v[^()]+\) in the axes of the base at this pose/)
  })
})
