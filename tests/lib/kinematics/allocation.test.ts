import { setFlagsFromString } from 'node:v8'
import { runInNewContext } from 'node:vm'
import { describe, expect, it } from 'vitest'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { createNullSpaceRecord, fillNullSpace } from '@/lib/kinematics/null-space-record'
import type { RatePolicy } from '@/lib/kinematics/rate-policy'
import { createRateRecord } from '@/lib/kinematics/rate-record'
import { resolveRatesInto } from '@/lib/kinematics/resolve-rates'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { golden, numbers } from './arms'

setFlagsFromString('--expose-gc')
const collect = runInNewContext('gc') as () => void

const CALLS = 20_000
const WARM_UP = 30_000
/** Bytes a call. One array of seven numbers takes over a hundred; a single number that the engine puts aside, 16. */
const NOTHING = 100

/** Heap bytes that a call leaves behind before anything is collected, once the engine has done compiling; the best of five, because
 *  the engine works on things of its own. */
function bytesPerCall(call: (i: number) => void): number {
  for (let i = 0; i < WARM_UP; i++) call(i)
  let least = Number.POSITIVE_INFINITY
  for (let round = 0; round < 5; round++) {
    collect()
    const before = process.memoryUsage().heapUsed
    for (let i = 0; i < CALLS; i++) call(i)
    least = Math.min(least, Math.abs(process.memoryUsage().heapUsed - before) / CALLS)
  }
  return least
}

describe('a loop over configurations', () => {
  const chain = golden({ rate: 2, lower: -3, upper: 3 })
  const work = createWorkspace(chain)
  const record = createRateRecord(chain)
  const space = createNullSpaceRecord(chain)
  const task = createTask()
  const random = numbers(3)
  const poses = Array.from({ length: 64 }, () => Float64Array.from(chain.joints, () => 4 * random() - 2))
  const twist = Float64Array.of(0.1, -0.05, 0.08, 0.1, 0.2, -0.1)
  const policy: RatePolicy = {
    task,
    inverse: { method: 'truncated', tolerance: 1e-9 },
    secondary: [{ objective: 'posture', posture: new Float64Array(7), gain: 1 }, { objective: 'mid-range', gain: 1 }],
    limits: { rates: 'scale', derating: 1 },
    structural: structuralLoss(chain, task),
  }

  it('sees that an array in it would be noticed', () => {
    let kept: number[] = []
    expect(bytesPerCall((i) => (kept = [i, 1, 2, 3, 4, 5, 6.5]))).toBeGreaterThan(NOTHING)
    expect(kept).toHaveLength(7)
  })

  const damped: RatePolicy = { ...policy, inverse: { method: 'damped', damping: 0.05 }, secondary: [] }

  it.each([
    ['poses and Jacobians', () => jacobian(chain, work)],
    ['rates with posture and scaling', () => resolveRatesInto(chain, work, twist, policy, record)],
    ['damped rates alone', () => resolveRatesInto(chain, work, twist, damped, record, undefined, 'rates')],
  ] as const)('makes no array and no object for %s', (_name, ask) => {
    const bytes = bytesPerCall((i) => {
      forwardKinematics(chain, poses[i % poses.length]!, work)
      ask()
    })
    expect(bytes).toBeLessThan(NOTHING)
  })

  it('makes no array and no object for bases and projectors', () => {
    expect(bytesPerCall((i) => {
      forwardKinematics(chain, poses[i % poses.length]!, work)
      resolveRatesInto(chain, work, twist, policy, record)
      fillNullSpace(work, space)
    })).toBeLessThan(NOTHING)
    expect(space.nullity).toBe(1)
  })
})
