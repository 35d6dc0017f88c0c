import { describe, expect, it } from 'vitest'
import { readBench } from '@/components/front/bench-reading'
import { createSelfMotion, MOST_STEPS } from '@/components/front/self-motion'
import { structuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { listViolations } from '@/lib/kinematics/within-limits'
import { radFromDeg } from '@/lib/units'
import { sampleChain } from '../drawing/sample-chains'

const START = [-8, -40, 0, 84, 0, 46, 0].map(radFromDeg)
const skerry = sampleChain('skerry-7.urdf')
const motionFrom = (start: readonly number[]) => createSelfMotion(skerry, start, structuralLoss(skerry, createTask()))

describe('createSelfMotion', () => {
  it('moves the joints while the tool stands still to a nanometre and a nanoradian', () => {
    const motion = motionFrom(START)
    const held = readBench(skerry, START)
    for (const step of [-120, -40, -1, 1, 60, 150]) {
      const point = motion.at(step)
      expect(point.step).toBe(step)
      const moved = readBench(skerry, point.q)
      held.position.forEach((part, i) => expect(Math.abs(moved.position[i]! - part)).toBeLessThan(1e-9))
      held.quaternion.forEach((part, i) => expect(Math.abs(moved.quaternion[i]! - part)).toBeLessThan(1e-9))
      expect(Math.max(...point.q.map((value, i) => Math.abs(value - START[i]!)))).toBeGreaterThan(0.005)
    }
  })

  it('leaves the elbow angle alone, which the distance from shoulder to wrist fixes', () => {
    const { q } = motionFrom(START).at(100)
    expect(q[3]).toBeCloseTo(START[3]!, 9)
  })

  it('answers the same configuration for the same step, whichever way it was reached', () => {
    const wandering = motionFrom(START)
    for (const step of [40, -90, 10, 75]) wandering.at(step)
    expect(wandering.at(75)).toEqual(motionFrom(START).at(75))
    expect(wandering.at(0).q).toEqual(START)
  })

  it('stays within the limits, and where it ends says which joint is in the way', () => {
    const motion = motionFrom([0, -1.95, 0, 0.9, 0, 0.5, 0])
    const ends = [motion.at(-MOST_STEPS), motion.at(MOST_STEPS)]
    for (const end of ends) expect(listViolations(skerry, end.q)).toEqual([])
    expect(ends.map((end) => end.stop)).toContain('shoulder_lift reaches its limit')
  })

  it('does not move an arm that has no spare freedom, and says so', () => {
    const fulmar = sampleChain('fulmar-6.urdf')
    const start = [0, 0.4, -0.4, 0.2, 0.7, 0]
    const motion = createSelfMotion(fulmar, start, structuralLoss(fulmar, createTask()))
    expect(motion.at(5)).toEqual({ q: start, step: 0, stop: 'no spare freedom here' })
  })
})
