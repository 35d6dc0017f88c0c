import { describe, expect, it } from 'vitest'
import { structuralLoss, structuralLossInSteps } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { golden, planar, scara, transform } from './arms'
import { expectClose } from './expect-close'

describe('structuralLoss', () => {
  it('finds the largest rank and every direction that any pose reaches', () => {
    expect(structuralLoss(golden(), createTask())).toMatchObject({ largestRank: 6, reachedCount: 6 })
    expect(structuralLoss(scara(), createTask())).toMatchObject({ largestRank: 4, reachedCount: 4 })
    // Two joints never have more than rank 2 at a time, but together their poses reach the whole plane and its turn.
    expect(structuralLoss(planar([1, 1]), createTask())).toMatchObject({ largestRank: 2, reachedCount: 3 })
  })

  it('spans what is reached by orthonormal rows, and nothing of what never is', () => {
    const { reached, reachedCount } = structuralLoss(planar([1, 1, 1]), createTask())
    expect(reachedCount).toBe(3)
    for (let k = 0; k < reachedCount; k++) {
      const row = reached.subarray(6 * k, 6 * k + 6)
      expect(row.reduce((sum, part) => sum + part * part, 0)).toBeCloseTo(1, 14)
      expectClose([row[2]!, row[3]!, row[4]!], [0, 0, 0], 1e-14)
    }
  })

  it('looks at the tool point: a tool off the axis of a turn is moved by it', () => {
    const task = createTask(['vx', 'vy'])
    const chain = planar([0])
    expect(structuralLoss(chain, task).largestRank).toBe(0)
    const tipFromTool = transform([0.1, 0, 0])
    expect(structuralLoss(chain, task, { tipFromTool })).toMatchObject({ largestRank: 1, reachedCount: 2 })
    expect(structuralLoss(chain, createTask(['vx', 'vy'], 'tip'), { tipFromTool })).toMatchObject({ reachedCount: 1 })
  })

  it('pauses after each of its 32 configurations, for whoever must not be held up', () => {
    const steps = structuralLossInSteps(golden(), createTask())
    let pauses = 0
    let step = steps.next()
    for (; step.done !== true; step = steps.next()) pauses++
    expect(pauses).toBe(32)
    expect(step.value).toEqual(structuralLoss(golden(), createTask()))
  })
})
