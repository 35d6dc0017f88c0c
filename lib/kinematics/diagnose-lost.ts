import type { Chain } from './chain'
import type { Workspace } from './create-workspace'
import type { Diagnosis, Finished } from './diagnosis'
import { directionWords } from './direction-words'
import { freesDirection } from './frees-direction'
import { lostGeometry } from './lost-geometry'
import { lostParts, type Cause, type LostPart } from './lost-parts'
import type { RatePolicy } from './rate-policy'
import { suggestPosture } from './suggest-posture'

/** What there is to say of directions that were asked for and are not delivered. */
export function diagnoseLost(chain: Chain, work: Workspace, policy: RatePolicy, done: Finished): Diagnosis[] {
  if (done.easy) return []
  return lostParts(work, policy.task, done.rank, policy.structural).map((part) =>
    part.cause === 'pose' ? lostHere(chain, work, policy, done, part) : lostForGood(policy, part, part.cause),
  )
}

/** Sentences for what no pose of the chain mends. */
const FOR_GOOD: Readonly<Record<Exclude<Cause, 'pose'>, string>> = {
  never: 'this chain can never move in that direction, whatever its pose',
  'always-one': 'this chain has too few joints for the whole task, so that some direction is missing at each of its poses',
}

function lostForGood({ task }: RatePolicy, { direction }: LostPart, cause: Exclude<Cause, 'pose'>): Diagnosis {
  const detail = `The tool cannot ${directionWords(direction, task.frame)}: ${FOR_GOOD[cause]}. Ask for fewer components.`
  return { code: 'direction-lost', direction, structural: true, freed: false, detail }
}

function lostHere(chain: Chain, work: Workspace, { task, secondary }: RatePolicy, done: Finished, part: LostPart): Diagnosis {
  const { direction } = part
  const spare = done.secondaryRates.map((rate) => done.secondaryScale * rate)
  const freed = freesDirection(chain, work, task, direction, spare)
  const suggestion = freed || done.nullity === 0 ? null : suggestPosture(chain, work, task, done.rank, direction)
  const geometry = lostGeometry(chain, work, task, part)
  const motion = `${directionWords(direction, task.frame)}${geometry === '' ? '' : ` (${geometry})`}`
  const way = freed ? FREED : `and ${whyNot(work, done, secondary.length)}: ${wayOut(chain, done, suggestion)}`
  return {
    code: 'direction-lost',
    direction,
    structural: false,
    freed,
    detail: `The tool cannot ${motion} at this pose, ${way}`,
    ...(suggestion === null ? {} : { suggestion }),
  }
}

const FREED = 'but the spare freedom is moving the arm out of it: the direction comes back by itself.'

/** Why the objectives of this answer do not bring the direction back. */
function whyNot({ solved }: Workspace, done: Finished, objectives: number): string {
  if (done.nullity === 0) return 'no spare freedom is left to move the arm out of it'
  if (objectives === 0) return 'no objective is moving the arm out of it'
  if (solved.wished === 0) return 'the objectives given ask for nothing here'
  if (done.secondaryRates.every((rate) => rate === 0)) {
    return 'the objectives given ask only for motion that the task itself feels (their pull lies along the rows of the Jacobian), of which nothing is spare'
  }
  if (done.secondaryScale === 0) return 'the joint limits leave nothing of the motion that the objectives ask for'
  return 'the objectives given do not move the arm out of it'
}

function wayOut(chain: Chain, done: Finished, suggestion: readonly number[] | null): string {
  if (done.nullity === 0) return 'approach it from another pose.'
  if (suggestion === null) return 'no bending of a single joint brings the direction back; start elsewhere.'
  return `add a posture objective that leads away from here, for example to (${valuesOf(chain, suggestion)}), which brings the direction back.`
}

/** Of a long chain only so many values are written out; all are in the suggestion. */
const MOST_VALUES = 12

function valuesOf(chain: Chain, posture: readonly number[]): string {
  const values = posture.slice(0, MOST_VALUES).map((value, i) => {
    const unit = chain.joints[i]!.type === 'prismatic' ? 'm' : 'rad'
    return `${chain.joints[i]!.name} ${Number(value.toFixed(3)) + 0} ${unit}`
  })
  return posture.length > MOST_VALUES ? `${values.join(', ')}, …` : values.join(', ')
}
