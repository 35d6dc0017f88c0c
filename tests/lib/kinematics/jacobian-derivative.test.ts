import { describe, it } from 'vitest'
import { jacobian } from '@/lib/kinematics/jacobian'
import { jacobianDerivative } from '@/lib/kinematics/jacobian-derivative'
import { at, randomArm, randomPose, transform } from './arms'
import { expectClose } from './expect-close'

describe('jacobianDerivative', () => {
  const tool = transform([0.1, 0.2, -0.3], [1, -0.5, 2])

  it.each(['base', 'tip'] as const)('is the derivative of the Jacobian along the motion in %s axes, on random arms with prismatic joints, mimics and a tool', (frame) => {
    for (let seed = 1; seed <= 40; seed++) {
      const chain = randomArm(seed)
      const q = randomPose(chain, seed)
      const rates = randomPose(chain, seed + 500)
      const step = 1e-5
      const moved = (by: number) => Float64Array.from(jacobian(chain, at(chain, q.map((value, i) => value + by * rates[i]!), tool), frame))
      const [ahead, behind] = [moved(step), moved(-step)]
      const differences = ahead.map((value, i) => (value - behind[i]!) / (2 * step))
      const exact = jacobianDerivative(chain, at(chain, q, tool), rates, frame)
      expectClose(exact, differences, 1e-8 * Math.max(1, ...Array.from(exact, Math.abs)))
    }
  })

  it('is zero while nothing moves', () => {
    const chain = randomArm(3)
    expectClose(jacobianDerivative(chain, at(chain, randomPose(chain, 3)), chain.joints.map(() => 0)), new Float64Array(6 * chain.joints.length), 0)
  })
})
