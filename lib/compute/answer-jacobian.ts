import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { JacobianResult } from '@/lib/contract/kinematic-answers'
import { JACOBIAN_FIELDS } from '@/lib/contract/kinematic-questions'
import { inSlices } from '@/lib/in-slices'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { type Measures, measures } from '@/lib/kinematics/measures'
import { begin, checkAnswerSize, taskOf } from './begin'
import { includedFields, pick } from './included'

const NUMBERS_OF_MEASURES = 10

/** The geometric Jacobian and its measures at each configuration. */
export const answerJacobian: UseCase<'jacobian'> = async (caller, { at, body }) => {
  const { chain, work, configurations, tipFromTool, kinds, characteristicLength, read, write, envelope } = await begin(caller, at, body)
  read.finish()
  const task = taskOf(body.task)
  const wanted = includedFields(JACOBIAN_FIELDS, body.include)
  checkAnswerSize(configurations.length, NUMBERS_OF_MEASURES + (wanted.has('jacobian') ? 6 * kinds.length : 0))

  const results: z.infer<typeof JacobianResult>[] = []
  await inSlices(configurations.length, (index) => {
    forwardKinematics(chain, configurations[index]!, work, tipFromTool)
    // Written before the measures, which reuse the workspace.
    const matrix = wanted.has('jacobian') ? write.jacobian(jacobian(chain, work, body.frame), kinds) : []
    let known: Measures | undefined
    const measured = () => (known ??= measures(chain, work, task, { characteristicLength }))
    results.push(
      pick<z.infer<typeof JacobianResult>>(wanted, {
        jacobian: () => matrix,
        singularValues: () => measured().singularValues,
        rank: () => measured().rank,
        manipulability: () => measured().manipulability,
        conditionNumber: () => measured().conditionNumber,
      }),
    )
  })
  return { body: { ...envelope, results } }
}
