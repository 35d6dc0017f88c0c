import { z } from 'zod'
import { Matrix, Pose } from './kinematic-quantities'
import { Digest } from './scalars'

/** How many a revision has, and what they are drawn from. */
export const CHECK_VECTORS = 24
export const CHECK_SEED = 1

export const CheckVectorsQuery = z.strictObject({
  base: z.string().max(1000).optional().meta({ description: 'The root when left out.' }),
  tip: z.string().max(1000).optional().meta({ description: 'That of the default chain when left out.' }),
  format: z.enum(['json', 'csv']).optional().meta({ description: 'For a link that cannot send Accept.' }),
})

export const CheckVector = z.strictObject({
  configuration: z.array(z.number()),
  pose: Pose,
  jacobian: Matrix.meta({ description: '6 x n, base axes, reference point at the tip.' }),
  singularValues: z.array(z.number()).meta({ description: 'Of the whole Jacobian, characteristic length 1 m.' }),
})

/** A revision's own numbers, to be met by the real controller. All SI. They never change, so the status is not among them. */
export const CheckVectors = z
  .strictObject({
    model: z.strictObject({ team: z.string(), model: z.string(), revision: z.int(), fingerprint: Digest }),
    chain: z.strictObject({ base: z.string(), tip: z.string(), joints: z.array(z.string()), types: z.array(z.enum(['revolute', 'continuous', 'prismatic'])) }),
    seed: z.int(),
    vectors: z.array(CheckVector),
  })
  .meta({ id: 'CheckVectors' })
export type CheckVectors = z.infer<typeof CheckVectors>
