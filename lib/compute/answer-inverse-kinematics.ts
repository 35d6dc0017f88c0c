import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { InverseKinematicsResult } from '@/lib/contract/kinematic-answers'
import { INVERSE_KINEMATICS_FIELDS } from '@/lib/contract/kinematic-questions'
import { fail } from '@/lib/errors'
import { inSlices } from '@/lib/in-slices'
import { inverseKinematicsInSteps } from '@/lib/kinematics/inverse-kinematics'
import { DEFAULT_SEARCH, type FoundPose, type PoseSearch } from '@/lib/kinematics/pose-search'
import { begin, readPose, taskOf } from './begin'
import { includedFields, inOrder, pick } from './included'
import { pausing } from './pausing'
import { readObjectives } from './read-objectives'
import { withRecords } from './with-records'

/** Computing time that one request is given. */
const BUDGET_MS = 10_000
const NUMBERS_BESIDE = 4

/** The same steps, given up with budget-exceeded once they have computed for longer than the budget; waiting for others does not count. */
function* withinBudget<T>(steps: Generator<T, void>): Generator<T, void> {
  for (let spent = 0; ; ) {
    const started = performance.now()
    const step = steps.next()
    spent += performance.now() - started
    if (step.done === true) return
    if (spent > BUDGET_MS) fail('budget-exceeded')
    yield step.value
  }
}

/** A configuration for each target pose, or the best that was found and why no better. */
export const answerInverseKinematics: UseCase<'inverseKinematics'> = withRecords('inverseKinematics', async (caller, { at, body }) => {
  const begun = await begin(caller, at, body)
  const { chain, work, tipFromTool, kinds, read, write, sizesOf, envelope } = begun
  const targets: Float64Array[] = []
  await inSlices(body.targets.length, (i) => targets.push(readPose(read, body.targets[i]!, `/targets/${i}`)))
  const seeds: number[][] = []
  await inSlices(body.seeds?.length ?? 0, (i) => seeds.push(read.list(body.seeds![i]!, kinds, `/seeds/${i}`, 'the chain')))
  if (body.seeds !== undefined) read.matched(seeds.length, targets.length, '/seeds', 'targets')
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
  function* searchAll(): Generator<z.infer<typeof InverseKinematicsResult> | undefined, void> {
    for (const [index, target] of targets.entries()) {
      const seed = seeds[seeds.length === 1 ? 0 : index]
      yield present(yield* pausing(inverseKinematicsInSteps(chain, work, target, search, seed)))
    }
  }
  const results = {
    count: targets.length,
    of: 'targets',
    fields: inOrder(INVERSE_KINEMATICS_FIELDS, wanted),
    sizes: sizesOf(search.task),
    numbersEach: NUMBERS_BESIDE + (wanted.has('configuration') ? kinds.length : 0),
    steps: () => withinBudget(searchAll()),
  } as const
  return { body: { ...envelope, results } }
})
