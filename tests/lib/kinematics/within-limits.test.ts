import { describe, expect, it } from 'vitest'
import { listViolations } from '@/lib/kinematics/within-limits'
import { arm } from './arms'

describe('listViolations', () => {
  const chain = arm([{ lower: -1, upper: 1 }, { type: 'continuous' }, { type: 'prismatic', lower: 0 }])

  it('names each joint that is beyond a limit, with the value and both bounds', () => {
    expect(listViolations(chain, [1.5, 1e6, -0.1])).toEqual([
      { joint: 'joint-1', value: 1.5, lower: -1, upper: 1 },
      { joint: 'joint-3', value: -0.1, lower: 0, upper: null },
    ])
  })

  it('forgives 1e-9 and no more, at both ends', () => {
    expect(listViolations(chain, [1 + 0.9e-9, 0, -0.9e-9])).toEqual([])
    expect(listViolations(chain, [-1 - 1.1e-9, 0, -1.1e-9])).toHaveLength(2)
  })

  it('takes a limit rounded up to binary32 by a controller as beyond it, as it is', () => {
    expect(listViolations(arm([{ lower: -Math.PI, upper: Math.PI }]), [Math.fround(Math.PI)])).toHaveLength(1)
  })
})
