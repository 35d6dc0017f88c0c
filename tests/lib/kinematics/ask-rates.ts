import type { Chain } from '@/lib/kinematics/chain'
import { DEFAULT_INVERSE, rankTolerance } from '@/lib/kinematics/inverse'
import type { Instant, RatePolicy } from '@/lib/kinematics/rate-policy'
import { resolveRates, type RateOutcome } from '@/lib/kinematics/resolve-rates'
import { structuralLoss, type StructuralLoss, type StructuralOptions } from '@/lib/kinematics/structural-loss'
import { createTask, type Task } from '@/lib/kinematics/task'
import { at } from './arms'

export interface Wish extends Partial<Omit<RatePolicy, 'structural'>>, Instant {
  readonly tool?: ArrayLike<number>
}

/** The exact inverse: nothing damped, only true rank loss truncated. */
export const EXACT = { method: 'truncated', tolerance: 1e-9 } as const

/** The two linear components of an arm in the plane. */
export const PLANE = createTask(['vx', 'vy'])

const examined = new WeakMap<Chain, Map<string, StructuralLoss>>()

/** structuralLoss, once for each chain, task, tool and tolerance that a test asks about. */
function known(chain: Chain, task: Task, options: StructuralOptions): StructuralLoss {
  const ofChain = examined.get(chain) ?? new Map<string, StructuralLoss>()
  examined.set(chain, ofChain)
  const key = JSON.stringify([task, options.tolerance, Array.from(options.tipFromTool ?? [])])
  const found = ofChain.get(key) ?? structuralLoss(chain, task, options)
  ofChain.set(key, found)
  return found
}

/** A whole question in one call: defaults where nothing is wished. */
export function askRates(chain: Chain, q: ArrayLike<number>, twist: ArrayLike<number>, wish: Wish = {}): RateOutcome {
  const task = wish.task ?? createTask()
  const inverse = wish.inverse ?? DEFAULT_INVERSE
  const tool = wish.tool === undefined ? {} : { tipFromTool: wish.tool }
  const structural = known(chain, task, { tolerance: rankTolerance(inverse), ...tool })
  const limits = wish.limits ?? { rates: 'scale', derating: 1 }
  const { jointWeights, secondary = [] } = wish
  const policy = { task, inverse, secondary, limits, structural, ...(jointWeights === undefined ? {} : { jointWeights }) }
  return resolveRates(chain, at(chain, q, wish.tool), twist, policy, wish)
}

/** A twist in the plane. */
export function flat(vx: number, vy: number): number[] {
  return [vx, vy, 0, 0, 0, 0]
}
