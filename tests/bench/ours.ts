import type { Chain } from '@/lib/kinematics/chain'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { nullSpace } from '@/lib/kinematics/null-space'
import { createNullSpaceRecord, fillNullSpace } from '@/lib/kinematics/null-space-record'
import { createRateRecord } from '@/lib/kinematics/rate-record'
import type { RatePolicy } from '@/lib/kinematics/rate-policy'
import { resolveRatesInto } from '@/lib/kinematics/resolve-rates'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { DAMPING, POSTURE, TWIST } from './arms'

/** One question asked of one configuration. */
export type Ask = (q: Float64Array) => unknown

/** The product's answers, in a loop that keeps its workspace and record: they stand there, so that nothing can be optimised away. */
export function ours(chain: Chain): Record<'fk' | 'fk-jacobian' | 'null-space' | 'damped' | 'spare' | 'everything', Ask> {
  const work = createWorkspace(chain)
  const record = createRateRecord(chain)
  const space = createNullSpaceRecord(chain)
  const task = createTask()
  const common = { task, structural: structuralLoss(chain, task), limits: { rates: 'scale', derating: 1 } } as const
  const damped: RatePolicy = { ...common, inverse: { method: 'damped', damping: DAMPING }, secondary: [] }
  const spare: RatePolicy = {
    ...common,
    inverse: { method: 'truncated', tolerance: 1e-9 },
    secondary: [{ objective: 'posture', posture: new Float64Array(chain.joints.length).fill(POSTURE), gain: 1 }],
  }
  return {
    fk: (q) => forwardKinematics(chain, q, work),
    'fk-jacobian': (q) => {
      forwardKinematics(chain, q, work)
      jacobian(chain, work)
    },
    'null-space': (q) => {
      forwardKinematics(chain, q, work)
      return nullSpace(chain, work, task, common.structural)
    },
    damped: (q) => {
      forwardKinematics(chain, q, work)
      resolveRatesInto(chain, work, TWIST, damped, record, undefined, 'rates')
    },
    spare: (q) => {
      forwardKinematics(chain, q, work)
      resolveRatesInto(chain, work, TWIST, spare, record, undefined, 'rates')
    },
    everything: (q) => {
      forwardKinematics(chain, q, work)
      resolveRatesInto(chain, work, TWIST, spare, record)
      fillNullSpace(work, space)
    },
  }
}
