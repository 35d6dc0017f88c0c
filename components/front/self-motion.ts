import type { Chain } from '@/lib/kinematics/chain'
import { closedLoopTwist } from '@/lib/kinematics/closed-loop-twist'
import { createWorkspace } from '@/lib/kinematics/create-workspace'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { nullSpace } from '@/lib/kinematics/null-space'
import type { StructuralLoss } from '@/lib/kinematics/structural-loss'
import { createTask } from '@/lib/kinematics/task'
import { taskJacobian } from '@/lib/kinematics/task-jacobian'
import { sideOutside } from '@/lib/kinematics/within-limits'
import { radFromDeg } from '@/lib/units'
import { corrected, unfelt } from './pose-holding'

/** Length of one step along the null space: the norm of the joint displacement, rad. */
const STEP = radFromDeg(1)
/** Corrections after a step; each squares the error, so two or three leave rounding. */
const MOST_CORRECTIONS = 4
/** m and rad, together: rounding, not worth another correction. */
const SETTLED = 1e-13
/** m and rad, together: what the tool may be off after the corrections for the pose to count as held. */
const HELD = 1e-9
export const MOST_STEPS = 260

const TASK = createTask()

export interface SelfMotionPoint {
  readonly q: readonly number[]
  /** The step that was reached: nearer to 0 than the one asked for where the way ends. */
  readonly step: number
  /** Why it goes no further; null while it does. */
  readonly stop: string | null
}

export interface SelfMotion {
  /** The configuration `step` steps along the self-motion. */
  at(step: number): SelfMotionPoint
}

/** The way on which `chain` can move from `start` while its tool stands still: the null space followed step by step, the pose
 *  corrected in closed loop after each. Found as far as it is asked for, and kept. */
export function createSelfMotion(chain: Chain, start: readonly number[], structural: StructuralLoss): SelfMotion {
  const work = createWorkspace(chain)
  forwardKinematics(chain, start, work)
  const goal = Float64Array.from(work.baseFromTip)
  const { basis, nullity } = nullSpace(chain, work, TASK, structural)
  const first = basis.map((row) => row[0] ?? 0)
  const error = () => closedLoopTwist(work, { baseFromGoal: goal, positionGain: 1, orientationGain: 1 }, 'base')

  function side(sign: 1 | -1) {
    const points: (readonly number[])[] = [start]
    let direction = first.map((part) => sign * part)
    let stop: string | null = nullity === 0 ? 'no spare freedom here' : null

    function extend() {
      const from = points[points.length - 1]!
      const q = from.map((value, i) => value + STEP * direction[i]!)
      forwardKinematics(chain, q, work)
      let left = error()
      for (let round = 0; round < MOST_CORRECTIONS && left.some((part) => Math.abs(part) > SETTLED); round++) {
        taskJacobian(chain, work, TASK)
        corrected(work, left).forEach((change, i) => {
          q[i] = q[i]! + change
        })
        forwardKinematics(chain, q, work)
        left = error()
      }
      const outside = chain.joints.find((joint, i) => sideOutside(q[i]!, joint.lower, joint.upper) !== 0)
      if (outside !== undefined) {
        stop = `${outside.name} reaches its limit`
        return
      }
      if (left.some((part) => Math.abs(part) > HELD)) {
        stop = 'the pose cannot be held further'
        return
      }
      points.push(q)
      // What the null space here keeps of the way so far, so that it neither jumps nor turns back.
      taskJacobian(chain, work, TASK)
      const turned = unfelt(work, direction)
      const length = Math.sqrt(turned.reduce((sum, part) => sum + part * part, 0))
      if (length < 0.1) stop = 'the way branches here'
      else direction = turned.map((part) => part / length)
    }

    return (steps: number): SelfMotionPoint => {
      while (points.length <= steps && stop === null) extend()
      const reached = Math.min(steps, points.length - 1)
      return { q: points[reached]!, step: sign * reached, stop: reached < steps ? stop : null }
    }
  }

  const sides = { forward: side(1), back: side(-1) }
  return { at: (step) => (step < 0 ? sides.back(-step) : sides.forward(step)) }
}
