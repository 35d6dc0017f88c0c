import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { NullSpaceResult } from '@/lib/contract/kinematic-answers'
import { NULL_SPACE_FIELDS } from '@/lib/contract/kinematic-questions'
import { finishInSlices, inSlices } from '@/lib/in-slices'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { RANK_TOLERANCE } from '@/lib/kinematics/measures'
import { nullSpace } from '@/lib/kinematics/null-space'
import { structuralLossInSteps } from '@/lib/kinematics/structural-loss'
import { begin, checkAnswerSize, taskOf } from './begin'
import { includedFields, pick } from './included'
import type { SiReader } from './si'

/** A lost direction has 6 numbers, and at most 6 are lost. */
const NUMBERS_BESIDE = 6 + 6 * 6

/** Checks that a basis is n rows of the same length; its columns need not be orthonormal. */
function readBasis(read: SiReader, basis: readonly (readonly number[])[], n: number): void {
  if (basis.length !== n) read.mismatch('/alignTo', `has ${basis.length} rows; the chain has ${n} joints`)
  const width = basis[0]?.length ?? 0
  basis.forEach((row, i) => {
    if (row.length !== width) read.mismatch(`/alignTo/${i}`, `has ${row.length} entries; the first row has ${width}`)
    row.forEach((value, k) => read.number(value, null, `/alignTo/${i}`, k))
  })
}

/** The joint rates that leave a task untouched, and the directions that are lost, at each configuration. */
export const answerNullSpace: UseCase<'nullSpace'> = async (caller, { at, body }) => {
  const { chain, work, configurations, tipFromTool, characteristicLength, read, envelope } = await begin(caller, at, body)
  const n = chain.joints.length
  if (body.alignTo !== undefined) readBasis(read, body.alignTo, n)
  read.finish()
  const task = taskOf(body.task)
  const wanted = includedFields(NULL_SPACE_FIELDS, body.include, ['projector'])
  const withProjector = wanted.has('projector')
  const withBasis = wanted.has('basis')
  checkAnswerSize(configurations.length, NUMBERS_BESIDE + (withBasis ? n * n : 0) + (withProjector ? n * n : 0))
  const options = { characteristicLength, tolerance: body.tolerance ?? RANK_TOLERANCE }
  const structural = await finishInSlices(structuralLossInSteps(chain, task, { ...options, ...(tipFromTool && { tipFromTool }) }))

  // Turning the basis changes nothing else of an answer.
  let before = withBasis ? body.alignTo : undefined
  const results: z.infer<typeof NullSpaceResult>[] = []
  await inSlices(configurations.length, (index) => {
    forwardKinematics(chain, configurations[index]!, work, tipFromTool)
    const space = nullSpace(chain, work, task, structural, {
      ...options,
      withProjector,
      withBasis,
      ...(before && { alignTo: before }),
    })
    if (before !== undefined) before = space.basis
    results.push(
      pick<z.infer<typeof NullSpaceResult>>(wanted, {
        rank: () => space.rank,
        nullity: () => space.nullity,
        singularValues: () => space.singularValues,
        basis: () => space.basis,
        lostDirections: () => space.lostDirections,
        projector: () => space.projector,
      }),
    )
  })
  return { body: { ...envelope, results } }
}
