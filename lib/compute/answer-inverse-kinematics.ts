import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { InverseKinematicsResult } from '@/lib/contract/kinematic-answers'
import { INVERSE_KINEMATICS_FIELDS } from '@/lib/contract/kinematic-questions'
import { fail } from '@/lib/errors'
import { finishInSlices, inSlices } from '@/lib/in-slices'
import { inverseKinematicsInSteps } from '@/lib/kinematics/inverse-kinematics'
import { DEFAULT_SEARCH, type FoundPose, type PoseSearch } from '@/lib/kinematics/pose-search'
import { begin, checkAnswerSize, readPose, taskOf } from './begin'
import { includedFields, pick } from './included'
import { readObjectives } from './read-objectives'

/** Computing time that one request is given. */
const BUDGET_MS = 10_000
const NUMBERS_BESIDE = 4

/** The same steps, given up with budget-exceeded once they have computed for longer than the budget; waiting for others does not count. */
function* withinBudget<T>(steps: Generator<void, T>): Generator<void, T> {
  for (let spent = 0; ; ) {
    const started = performance.now()
    const step = steps.next()
    spent += performance.now() - started
    if (step.done === true) return step.value
    if (spent > BUDGET_MS) fail('budget-exceeded')
    yield
  }
}

/** A configuration for each target pose, or the best that was found and why no better. */
export const answerInverseKinematics: UseCase<'inverseKinematics'> = async (caller, { at, body }) => {
  const begun = await begin(caller, at, body)
  const { chain, work, tipFromTool, kinds, read, write, envelope } = begun
  const targets: Float64Array[] = []
  await inSlices(body.targets.length, (i) => targets.push(readPose(read, body.targets[i]!, `/targets/${i}`)))
  const seeds = body.seeds?.map((seed, i) => read.list(seed, kinds, `/seeds/${i}`, 'the chain'))
  if (seeds !== undefined) read.matched(seeds.length, targets.length, '/seeds', 'targets')
  const tolerance = (value: number | undefined, kind: 'length' | 'angle', pointer: string) =>
    value === undefined ? undefined : read.number(value, kind, pointer)
  const search: PoseSearch = {
    ...DEFAULT_SEARCH,
    task: taskOf(body.task),
    ...(tipFromTool && { tipFromTool }),
    positionTolerance: tolerance(body.positionTolerance, 'length', '/positionTolerance') ?? DEFAULT_SEARCH.positionTolerance,
    orientationTolerance: tolerance(body.orientationTolerance, 'angle', '/orientationTolerance') ?? DEFAULT_SEARCH.orientationTolerance,
    attempts: body.attempts ?? DEFAULT_SEARCH.attempts,
    secondary: readObjectives(body.secondary, begun),
  }
  read.finish()
  const wanted = includedFields(INVERSE_KINEMATICS_FIELDS, body.include)
  checkAnswerSize(targets.length, NUMBERS_BESIDE + (wanted.has('configuration') ? kinds.length : 0), 'targets')

  const results: z.infer<typeof InverseKinematicsResult>[] = []
  const present = (found: FoundPose) =>
    pick<z.infer<typeof InverseKinematicsResult>>(wanted, {
      converged: () => found.converged,
      configuration: () => write.list(found.configuration, kinds),
      positionError: () => write.number(found.positionError, 'length'),
      orientationError: () => write.number(found.orientationError, 'angle'),
      iterations: () => found.iterations,
      attempts: () => found.attempts,
      reason: () => found.reason,
    })
  function* searchAll(): Generator<void, void> {
    for (const [index, target] of targets.entries()) {
      const seed = seeds?.[seeds.length === 1 ? 0 : index]
      results.push(present(yield* inverseKinematicsInSteps(chain, work, target, search, seed)))
      yield
    }
  }
  await finishInSlices(withinBudget(searchAll()))
  return { body: { ...envelope, results } }
}
