import { z } from 'zod'
import { Pose, PoseQuestion, UnitsAnswer } from './kinematic-quantities'
import { ROTATION_CONVENTION_NAMES } from './rotation-conventions'
import { Digest, Instant, Note } from './scalars'
import { ANGLE_UNITS, LENGTH_UNITS } from '@/lib/units'

export const MOST_POSES = 1000
const MOST_CHARACTERS = 1_000_000

const positive = z.number().gt(0, 'must be greater than 0')

const Tolerance = z.strictObject({
  position: positive.meta({ description: 'In the length unit.' }),
  orientation: positive.meta({ description: 'In the angle unit.' }),
})

/** Joint values with the tool poses that were measured there. Nothing of how they are to be read has a default. */
export const ReferencePosesQuestion = z
  .strictObject({
    table: z
      .string()
      .min(1, 'is empty: send the rows as CSV')
      .max(MOST_CHARACTERS, `at most ${MOST_CHARACTERS} characters`)
      .refine((text) => !/(?![\n\r\t])[\p{Cc}\p{Cs}\p{Cn}]/u.test(text), 'control characters are not allowed')
      .meta({ description: `CSV (RFC 4180), one measured pose a row, at most ${MOST_POSES}: the joint values in the order of chain.joints, x, y, z, and the orientation. With a head line the columns may stand in any order.` }),
    units: z
      .strictObject({ length: z.enum(LENGTH_UNITS), angle: z.enum(ANGLE_UNITS) })
      .meta({ description: 'Of the table, of tool and of tolerance; to be stated.' }),
    rotation: z.enum(ROTATION_CONVENTION_NAMES).meta({ description: 'How the orientations are written; to be stated.' }),
    tool: PoseQuestion.nullable().meta({ description: 'From the tip link to what was measured; null: the tip link itself was.' }),
    tolerance: Tolerance,
    chain: z.strictObject({ base: z.string().optional(), tip: z.string().optional() }).optional().meta({ description: 'Two links; the default chain when left out.' }),
    note: Note.optional().meta({ description: 'How and with what it was measured.' }),
  })
  .meta({ id: 'ReferencePosesQuestion' })
export type ReferencePosesQuestion = z.infer<typeof ReferencePosesQuestion>

const Deviation = z.strictObject({ max: z.number(), mean: z.number() })

const resultFields = {
  fingerprint: Digest.meta({ description: 'Of the revision that the poses were held against.' }),
  chain: z.strictObject({ base: z.string(), tip: z.string(), joints: z.array(z.string()), types: z.array(z.enum(['revolute', 'continuous', 'prismatic'])) }),
  units: UnitsAnswer,
  rotation: z.enum(ROTATION_CONVENTION_NAMES),
  tool: Pose.nullable(),
  tolerance: z.strictObject({ position: z.number(), orientation: z.number() }),
  decimalMark: z.enum(['.', ',']).meta({ description: 'As met in the table.' }),
  poses: z.int().meta({ description: 'How many rows.' }),
  failed: z.int().meta({ description: 'How many of them are beyond the tolerance.' }),
  passed: z.boolean().meta({ description: 'No row is beyond the tolerance.' }),
  position: Deviation.meta({ description: 'In the length unit.' }),
  orientation: Deviation.meta({ description: 'In the angle unit.' }),
}

/** One measured pose held against the model. */
export const ReferencePoseRow = z.strictObject({
  row: z.int().meta({ description: 'Its line in the table.' }),
  configuration: z.array(z.number()),
  measured: Pose,
  computed: Pose,
  positionError: z.number().meta({ description: 'Distance between the two, in the length unit.' }),
  orientationError: z.number().meta({ description: 'Angle between the two, in the angle unit.' }),
  withinLimits: z.boolean().meta({ description: 'Whether the model lets the joints stand there.' }),
  passed: z.boolean(),
})
export type ReferencePoseRow = z.infer<typeof ReferencePoseRow>

/** What comes out, before anything is stored. */
export const ReferencePosesResult = z.strictObject({ ...resultFields, rows: z.array(ReferencePoseRow) }).meta({ id: 'ReferencePosesResult' })
export type ReferencePosesResult = z.infer<typeof ReferencePosesResult>

const storedFields = {
  number: z.int().min(1).meta({ description: 'Counts from 1 within the revision.' }),
  by: z.string(),
  at: Instant,
  note: z.string().optional(),
}

/** A stored set in a list: without its rows. */
export const ReferencePosesSummary = z.strictObject({ ...storedFields, ...resultFields }).meta({ id: 'ReferencePosesSummary' })
export type ReferencePosesSummary = z.infer<typeof ReferencePosesSummary>

/** A stored set with its rows and the table as it was sent. */
export const ReferencePoses = z
  .strictObject({ ...storedFields, ...resultFields, rows: z.array(ReferencePoseRow), table: z.string().meta({ description: 'As it was sent.' }) })
  .meta({ id: 'ReferencePoses' })
export type ReferencePoses = z.infer<typeof ReferencePoses>
