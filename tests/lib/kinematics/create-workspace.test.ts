import { describe, expect, it } from 'vitest'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { planar } from './arms'

describe('createWorkspace', () => {
  const chain = planar([1, 1])

  it('refuses a motion that follows a joint which the chain does not have', () => {
    expect(() => createWorkspace({ ...chain, joints: chain.joints.slice(0, 1) })).toThrow(
      "'motion-2' follows a joint that the chain does not have",
    )
  })

  it('refuses an axis without direction and a missing constant', () => {
    expect(() => createWorkspace({ ...chain, motions: chain.motions.map((motion) => ({ ...motion, axis: [0, 0, 0] as const })) })).toThrow(
      "'motion-1' has no axis",
    )
    expect(() => createWorkspace({ ...chain, constants: chain.constants.slice(1) })).toThrow('one constant more')
  })

  it('leaves the chain as it is, frozen or not', () => {
    const before = JSON.stringify(chain)
    createWorkspace(Object.freeze(chain))
    expect(JSON.stringify(chain)).toBe(before)
  })

  it('makes room that grows with the joints and not with their square', () => {
    const long = createWorkspace(planar(new Array<number>(5000).fill(0.01)))
    const held = Object.values(long).reduce<number>((sum, part) => sum + (part instanceof Float64Array ? part.length : 0), 0)
    expect(held).toBeLessThan(5000 * 100)
  })
})
