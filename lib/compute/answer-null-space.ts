import type { z } from 'zod'
import type { UseCase } from '@/lib/access/use-case'
import type { NullSpaceResult } from '@/lib/contract/kinematic-answers'
import { NULL_SPACE_FIELDS } from '@/lib/contract/kinematic-questions'
import { inSlices } from '@/lib/in-slices'
import { forwardKinematics } from '@/lib/kinematics/forward-kinematics'
import { RANK_TOLERANCE } from '@/lib/kinematics/measures'
import { nullSpace } from '@/lib/kinematics/null-space'
import { structuralLossInSteps } from '@/lib/kinematics/structural-loss'
import { begin, taskOf } from './begin'
import { includedFields, inOrder, pick } from './included'
import type { SiReader } from './si'
import { pausing } from './pausing'
import { withRecords } from './with-records'

/** A lost direction has 6 numbers, and at most 6 are lost. */
const NUMBERS_BESIDE = 6 + 6 * 6

/** Checks that a basis is n rows of the same length; its columns need not be orthonormal. */
async function readBasis(read: SiReader, basis: readonly (readonly number[])[], n: number): Promise<void> {
  if (basis.length !== n) read.mismatch('/alignTo', `has ${basis.length} rows; the chain has ${n} joints`)
  const width = basis[0]?.length ?? 0
  await inSlices(basis.length, (i) => {
    const row = basis[i]!
    if (row.length !== width) read.mismatch(`/alignTo/${i}`, `has ${row.length} entries; the first row has ${width}`)
    row.forEach((value, k) => read.number(value, null, `/alignTo/${i}`, k))
  })
}

/** The joint rates that leave a task untouched, and the directions that are lost, at each configuration. */
export const answerNullSpace: UseCase<'nullSpace'> = withRecords('nullSpace', async (caller, { at, body }) => {
  const { chain, work, configurations, tipFromTool, characteristicLength, read, sizesOf, envelope } = await begin(caller, at, body)
  const n = chain.joints.length
  if (body.alignTo !== undefined) await readBasis(read, body.alignTo, n)
  read.finish()
  const task = taskOf(body.task)
  const wanted = includedFields(NULL_SPACE_FIELDS, body.include, ['projector'])
  const withProjector = wanted.has('projector')
  const withBasis = wanted.has('basis')
  const options = { characteristicLength, tolerance: body.tolerance ?? RANK_TOLERANCE }

  function* steps(): Generator<z.infer<typeof NullSpaceResult> | undefined, void> {
    const structural = yield* pausing(structuralLossInSteps(chain, task, { ...options, ...(tipFromTool && { tipFromTool }) }))
    // Turning the basis changes nothing else of an answer.
    let before = withBasis ? body.alignTo : undefined
    for (const q of configurations) {
      forwardKinematics(chain, q, work, tipFromTool)
      const space = nullSpace(chain, work, task, structural, { ...options, withProjector, withBasis, ...(before && { alignTo: before }) })
      if (before !== undefined) before = space.basis
      yield pick<z.infer<typeof NullSpaceResult>>(wanted, {
        rank: () => space.rank,
        nullity: () => space.nullity,
        singularValues: () => space.singularValues,
        basis: () => space.basis,
        lostDirections: () => space.lostDirections,
        projector: () => space.projector,
      })
    }
  }
  const results = {
    count: configurations.length,
    of: 'configurations',
    fields: inOrder(NULL_SPACE_FIELDS, wanted),
    sizes: sizesOf(task),
    numbersEach: NUMBERS_BESIDE + (withBasis ? n * n : 0) + (withProjector ? n * n : 0),
    steps,
  } as const
  return { body: { ...envelope, results } }
})
