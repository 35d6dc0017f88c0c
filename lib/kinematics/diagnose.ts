import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import { directionWords } from './direction-words'
import { freesDirection } from './frees-direction'
import { lostParts, type Cause, type LostPart } from './lost-parts'
import type { StructuralLoss } from './structural-loss'
import type { Task } from './task'
import { isAtLimit, sideOutside } from './within-limits'

/** What there is to say about an answer. */
export type DiagnosisCode = 'direction-lost' | 'near-singular' | 'rate-limited' | 'secondary-starved' | 'at-limit' | 'outside-limits'

/** One thing that a person should know about an answer. */
export interface Diagnosis {
  readonly code: DiagnosisCode
  /** A sentence for whoever stands at the arm. */
  readonly detail: string
  /** direction-lost: unit, 6 numbers in the task's frame, signed by the canonical rule. */
  readonly direction?: number[]
  /** direction-lost: whether no pose of the chain has it. */
  readonly structural?: boolean
  /** direction-lost: whether the secondary motion of this answer is bringing it within reach. */
  readonly freed?: boolean
  readonly joint?: string
}

/** Below this smallest singular value a pose is called near singular (SI, unscaled). */
const NEAR_SINGULAR = 0.02
/** A rate under this part of the fastest joint's is rounding, and drives nothing anywhere. */
const STANDING_STILL = 1e-12

/** The finished numbers that a diagnosis looks at. */
export interface Finished {
  readonly rates: readonly number[]
  readonly secondaryRates: readonly number[]
  readonly scale: number
  readonly secondaryScale: number
  readonly singularValues: readonly number[]
  readonly rank: number
  readonly nullity: number
  readonly damping: number
  /** How many objectives were given. */
  readonly objectives: number
  readonly derating: number
}

/** Everything worth saying about an answer for the pose in `work`, in the order of the codes, joints in chain order. */
export function diagnose(chain: Chain, work: Workspace, task: Task, known: StructuralLoss, done: Finished): Diagnosis[] {
  return [
    ...lostParts(work, task, done.rank, known).map((part) => directionLost(chain, work, task, done, part)),
    ...nearSingular(done),
    ...slowed(chain, done),
    ...starved(done),
    ...atLimits(chain, work, done),
    ...outsideLimits(chain, work, done),
  ]
}

/** Sentences for what no pose of the chain mends. */
const FOR_GOOD: Readonly<Record<Exclude<Cause, 'pose'>, string>> = {
  never: 'this chain can never move in that direction, whatever its pose',
  'always-one': 'this chain has too few joints for the whole task, so that some direction is missing at each of its poses',
}

function directionLost(chain: Chain, work: Workspace, task: Task, done: Finished, { direction, cause }: LostPart): Diagnosis {
  const motion = directionWords(direction, task.frame)
  const base = { code: 'direction-lost', direction, structural: cause !== 'pose' } as const
  if (cause !== 'pose') return { ...base, freed: false, detail: `The tool cannot ${motion}: ${FOR_GOOD[cause]}. Ask for fewer components.` }
  const freed = freesDirection(
    chain,
    work,
    task,
    direction,
    done.secondaryRates.map((rate) => done.secondaryScale * rate),
  )
  return { ...base, freed, detail: `The tool cannot ${motion} at this pose, ${wayOut(done, freed)}` }
}

function wayOut(done: Finished, freed: boolean): string {
  if (freed) return 'but the spare freedom is moving the arm out of it: the direction comes back by itself.'
  if (done.nullity === 0) return 'and no spare freedom is left to move the arm out of it: approach it from another pose.'
  if (done.objectives === 0) {
    return 'and no objective is moving the arm out of it: add a posture objective that leads away from here, or start elsewhere.'
  }
  return 'and the objectives given do not move the arm out of it: choose a posture that leads away from here, or start elsewhere.'
}

function nearSingular({ singularValues, damping }: Finished): Diagnosis[] {
  const smallest = singularValues.at(-1)
  if (!(damping > 0) && (smallest === undefined || smallest >= NEAR_SINGULAR)) return []
  const value = smallest === undefined ? '' : ` (smallest singular value ${smallest.toPrecision(3)})`
  const consequence =
    damping > 0
      ? `damping ${damping.toPrecision(3)} holds the joint rates down, and the tool falls short of what was asked by the residual`
      : 'small tool motions need large joint rates'
  return [{ code: 'near-singular', detail: `${near(smallest)}${value}: ${consequence}.` }]
}

function near(smallest: number | undefined): string {
  return smallest === undefined || smallest >= NEAR_SINGULAR ? 'Damping is at work' : 'The arm is near a singular pose'
}

function slowed(chain: Chain, { scale, rates, derating }: Finished): Diagnosis[] {
  if (scale >= 1) return []
  const joint = busiest(chain, rates, derating)
  const cause = joint === undefined ? 'A joint would exceed its rate limit' : `Joint '${joint}' would exceed its rate limit`
  const detail = `${cause}: the tool is slowed to ${percent(scale)} of what was asked, its direction kept.`
  return [{ code: 'rate-limited', detail, ...(joint === undefined ? {} : { joint }) }]
}

/** The joint that is nearest to its rate limit in the answer; of equals the first. */
function busiest(chain: Chain, rates: readonly number[], derating: number): string | undefined {
  let most = 0
  let name: string | undefined
  chain.joints.forEach((joint, i) => {
    if (joint.rate === null) return
    const load = Math.abs(rates[i]!) / (joint.rate * derating)
    if (load > most * (1 + 1e-9)) {
      most = load
      name = joint.name
    }
  })
  return name
}

function starved({ secondaryScale }: Finished): Diagnosis[] {
  if (secondaryScale >= 1) return []
  return [
    {
      code: 'secondary-starved',
      detail: `The rate limits leave ${percent(secondaryScale)} of the motion that the objectives ask of the spare freedom.`,
    },
  ]
}

function atLimits(chain: Chain, work: Workspace, { rates }: Finished): Diagnosis[] {
  const still = stillness(rates)
  return chain.joints.flatMap(({ name, lower, upper }, i): Diagnosis[] => {
    const up = isAtLimit(work.q[i]!, upper) && rates[i]! > still
    const down = isAtLimit(work.q[i]!, lower) && rates[i]! < -still
    if (!up && !down) return []
    return [{ code: 'at-limit', joint: name, detail: `Joint '${name}' is at its ${up ? 'upper' : 'lower'} limit and is driven outward.` }]
  })
}

function outsideLimits(chain: Chain, work: Workspace, { rates }: Finished): Diagnosis[] {
  const still = stillness(rates)
  return chain.joints.flatMap(({ name, lower, upper }, i): Diagnosis[] => {
    const side = sideOutside(work.q[i]!, lower, upper)
    if (side === 0) return []
    const outward = side * rates[i]!
    const what = outward > still ? 'is driven further out' : outward < -still ? 'is moving back' : 'is not moving back'
    return [
      {
        code: 'outside-limits',
        joint: name,
        detail: `Joint '${name}' is ${side > 0 ? 'above its upper' : 'below its lower'} limit and ${what}.`,
      },
    ]
  })
}

function stillness(rates: readonly number[]): number {
  return STANDING_STILL * rates.reduce((most, rate) => Math.max(most, Math.abs(rate)), 0)
}

function percent(part: number): string {
  return `${(100 * part).toPrecision(3)} %`
}
