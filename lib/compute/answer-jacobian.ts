import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { JacobianResult } from '@/lib/contract/kinematic-answers'
import { JACOBIAN_FIELDS } from '@/lib/contract/kinematic-questions'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { jacobian } from '@/lib/kinematics/jacobian'
import { type Measures, measures, type PartMeasures, partMeasures } from '@/lib/kinematics/measures'
import { begin, taskOf } from './begin'
import { includedFields, inOrder, pick } from './included'
import { withRecords } from './with-records'

const NUMBERS_OF_MEASURES = 6 + 6 + 4

/** The geometric Jacobian and its measures at each configuration. */
export const answerJacobian: UseCase<'jacobian'> = withRecords('jacobian', async (caller, { at, body }) => {
  const { chain, work, configurations, tipFromTool, kinds, characteristicLength, read, write, sizesOf, envelope } = await begin(caller, at, body)
  read.finish()
  const task = taskOf(body.task)
  const wanted = includedFields(JACOBIAN_FIELDS, body.include)

  function* steps(): Generator<z.infer<typeof JacobianResult>, void> {
    for (const q of configurations) {
      forwardKinematics(chain, q, work, tipFromTool)
      // Written before the measures, which reuse the workspace.
      const matrix = wanted.has('jacobian') ? write.jacobian(jacobian(chain, work, body.frame), kinds) : []
      let whole: Measures | undefined
      let parts: PartMeasures | undefined
      const measured = () => (whole ??= measures(chain, work, task, { characteristicLength }))
      const inParts = () => (parts ??= partMeasures(chain, work, task))
      yield pick<z.infer<typeof JacobianResult>>(wanted, {
        jacobian: () => matrix,
        singularValues: () => measured().singularValues,
        translationalSingularValues: () => inParts().translational,
        rotationalSingularValues: () => inParts().rotational,
        rank: () => measured().rank,
        manipulability: () => measured().manipulability,
        conditionNumber: () => measured().conditionNumber,
      })
    }
  }
  const results = {
    count: configurations.length,
    of: 'configurations',
    fields: inOrder(JACOBIAN_FIELDS, wanted),
    sizes: sizesOf(task),
    numbersEach: NUMBERS_OF_MEASURES + (wanted.has('jacobian') ? 6 * kinds.length : 0),
    steps,
  } as const
  return { body: { ...envelope, results } }
})
