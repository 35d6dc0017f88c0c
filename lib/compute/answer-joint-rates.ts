import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { JointRatesResult } from '@/lib/contract/kinematic-answers'
import type { Inverse as InverseQuestion } from '@/lib/contract/kinematic-quantities'
import { JOINT_RATES_FIELDS, type JointRatesQuestion } from '@/lib/contract/kinematic-questions'
import { inSlices } from '@/lib/in-slices'
import { closedLoopTwist, type Reference } from '@/lib/kinematics/closed-loop-twist'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { DEFAULT_INVERSE, type Inverse, rankTolerance } from '@/lib/kinematics/inverse'
import { RANK_TOLERANCE } from '@/lib/kinematics/measures'
import type { RateLimits } from '@/lib/kinematics/rate-bounds'
import type { RatePolicy } from '@/lib/kinematics/rate-policy'
import { resolveRates } from '@/lib/kinematics/resolve-rates'
import { structuralLossInSteps } from '@/lib/kinematics/structural-loss'
import { LINEAR_COMPONENTS, type Task } from '@/lib/kinematics/task'
import { begin, type Begun, readPose, taskOf } from './begin'
import { includedFields, inOrder, pick } from './included'
import { pausing } from './pausing'
import { readObjectives } from './read-objectives'
import { type Kind, type SiReader, TWIST_KINDS } from './si'
import { withRecords } from './with-records'

const DEFAULT_GAIN = 1

function readInverse(question: InverseQuestion | undefined, read: SiReader): Inverse {
  if (question === undefined) return DEFAULT_INVERSE
  const si = (value: number, name: string) => read.number(value, null, `/inverse/${name}`)
  switch (question.method) {
    case 'truncated':
      return { method: 'truncated', tolerance: question.tolerance ?? RANK_TOLERANCE }
    case 'damped':
      return { method: 'damped', damping: si(question.damping, 'damping') }
    case 'adaptive-damped':
      return {
        method: 'adaptive-damped',
        threshold: si(question.threshold ?? DEFAULT_INVERSE.threshold, 'threshold'),
        maxDamping: si(question.maxDamping ?? DEFAULT_INVERSE.maxDamping, 'maxDamping'),
      }
    case 'filtered':
      return { method: 'filtered', threshold: si(question.threshold, 'threshold'), damping: si(question.damping, 'damping') }
  }
}

const readTwist = (read: SiReader, twist: readonly number[], pointer: string) => read.list(twist, TWIST_KINDS, pointer, 'a twist')

function readReference(read: SiReader, reference: NonNullable<JointRatesQuestion['references']>[number], pointer: string): Reference {
  const gain = (name: 'position' | 'orientation') => read.number(reference.gains?.[name] ?? DEFAULT_GAIN, null, `${pointer}/gains/${name}`)
  return {
    baseFromGoal: readPose(read, reference.pose, `${pointer}/pose`),
    ...(reference.twist === undefined ? {} : { twist: readTwist(read, reference.twist, `${pointer}/twist`) }),
    positionGain: gain('position'),
    orientationGain: gain('orientation'),
  }
}

/** Accelerations convert as their joint's rate does; null stays unknown. */
const readAccelerations = (read: SiReader, accelerations: readonly (number | null)[], kinds: readonly Kind[]): (number | null)[] => {
  const si = read.list(accelerations.map((value) => value ?? 0), kinds, '/limits/accelerations', 'the chain')
  return si.map((value, i) => (accelerations[i] === null ? null : value))
}

const readLimits = (limits: JointRatesQuestion['limits'], { read, kinds }: Begun): RateLimits => ({
  rates: limits?.rates ?? 'scale',
  derating: limits?.derating ?? 1,
  ...(limits?.accelerations && { accelerations: readAccelerations(read, limits.accelerations, kinds) }),
  ...(limits?.dt !== undefined && { dt: limits.dt }),
})

/** The larger of the gains that the task has components for. */
const largestGain = ({ positionGain, orientationGain }: Reference, { rows }: Task): number =>
  Math.max(...rows.map((row) => (row < LINEAR_COMPONENTS ? positionGain : orientationGain)))

/** Every entry of a list, read in slices; none where there is no list. */
async function readEach<T, R>(list: readonly T[] | undefined, readOne: (entry: T, index: number) => R): Promise<R[]> {
  const entries: R[] = []
  await inSlices(list?.length ?? 0, (i) => entries.push(readOne(list![i]!, i)))
  return entries
}

/** The n-th of a list that has one entry for each configuration, or one for all. */
const nth = <T>(list: readonly T[], index: number): T => list[list.length === 1 ? 0 : index]!

/** Two twists, the singular values, single numbers and what the diagnosis says of the pose. */
const NUMBERS_BESIDE_JOINTS = 6 + 6 + 6 + 22
/** How many numbers a joint takes in a field: a name as much as one, what the diagnosis may say of it as much as four. */
const PER_JOINT = [['rates', 1], ['primaryRates', 1], ['secondaryRates', 1], ['saturated', 1], ['diagnosis', 4]] as const

/** Joint rates that move the tool as asked at each configuration, and what became of the wish. */
export const answerJointRates: UseCase<'jointRates'> = withRecords('jointRates', async (caller, { at, body }) => {
  const begun = await begin(caller, at, body)
  const { chain, work, configurations, tipFromTool, kinds, read, write, sizesOf, envelope } = begun
  const count = configurations.length
  const task = taskOf(body.task)
  const inverse = readInverse(body.inverse, read)
  const secondary = readObjectives(body.secondary, begun)
  const limits = readLimits(body.limits, begun)
  const jointWeights = body.jointWeights && read.list(body.jointWeights, kinds.map(() => null), '/jointWeights', 'the chain')
  const previous = await readEach(body.limits?.previousRates, (rates, i) => read.list(rates, kinds, `/limits/previousRates/${i}`, 'the chain'))
  const twists = await readEach(body.twists, (twist, i) => readTwist(read, twist, `/twists/${i}`))
  const references = await readEach(body.references, (reference, i) => readReference(read, reference, `/references/${i}`))
  if (body.limits?.previousRates !== undefined) read.matched(previous.length, count, '/limits/previousRates')
  if (body.twists !== undefined) read.matched(twists.length, count, '/twists')
  if (body.references !== undefined) read.matched(references.length, count, '/references')
  read.finish()
  const wanted = includedFields(JOINT_RATES_FIELDS, body.include)
  const numbersAJoint = PER_JOINT.reduce((sum, [field, numbers]) => sum + (wanted.has(field) ? numbers : 0), 0)

  function* steps(): Generator<z.infer<typeof JointRatesResult> | undefined, void> {
    const policy: RatePolicy = {
      task,
      inverse,
      secondary,
      limits,
      ...(jointWeights && { jointWeights }),
      structural: yield* pausing(structuralLossInSteps(chain, task, { tolerance: rankTolerance(inverse), ...(tipFromTool && { tipFromTool }) })),
    }
    for (const [index, q] of configurations.entries()) {
      forwardKinematics(chain, q, work, tipFromTool)
      const reference = references.length === 0 ? undefined : nth(references, index)
      const twist = reference === undefined ? nth(twists, index) : closedLoopTwist(work, reference, task.frame)
      const outcome = resolveRates(chain, work, twist, policy, {
        ...(previous.length > 0 && { previousRates: nth(previous, index) }),
        ...(reference && { gain: largestGain(reference, task) }),
      })
      yield pick<z.infer<typeof JointRatesResult>>(wanted, {
        rates: () => write.list(outcome.rates, kinds),
        primaryRates: () => write.list(outcome.primaryRates, kinds),
        secondaryRates: () => write.list(outcome.secondaryRates, kinds),
        scale: () => outcome.scale,
        secondaryScale: () => outcome.secondaryScale,
        achievedTwist: () => write.list(outcome.achievedTwist, TWIST_KINDS),
        residual: () => write.list(outcome.residual, TWIST_KINDS),
        singularValues: () => outcome.singularValues,
        rank: () => outcome.rank,
        nullity: () => outcome.nullity,
        damping: () => outcome.damping,
        saturated: () => outcome.saturated,
        manipulability: () => outcome.manipulability,
        toolSpeed: () => write.number(outcome.toolSpeed, 'length'),
        diagnosis: () =>
          outcome.diagnosis.map(({ code, detail, direction, joint }) => ({
            code,
            detail,
            ...(direction === undefined ? {} : { direction }),
            ...(joint === undefined ? {} : { joint }),
          })),
      })
    }
  }
  const results = {
    count,
    of: 'configurations',
    fields: inOrder(JOINT_RATES_FIELDS, wanted),
    sizes: sizesOf(task),
    numbersEach: NUMBERS_BESIDE_JOINTS + numbersAJoint * kinds.length,
    steps,
  } as const
  return { body: { ...envelope, results } }
})
