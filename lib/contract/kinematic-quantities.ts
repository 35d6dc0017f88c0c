import { z } from 'zod'
import { ANGLE_UNITS, LENGTH_UNITS } from '@/lib/units'

/** How far from 1 the norm of a quaternion may be and still be normalised. */
const QUATERNION_SLACK = 1e-3

export const UnitsQuestion = z
  .strictObject({ length: z.enum(LENGTH_UNITS).optional(), angle: z.enum(ANGLE_UNITS).optional() })
  .meta({ id: 'UnitsQuestion', description: 'Converts request and reply; m and rad when left out.' })

export const UnitsAnswer = z.strictObject({ length: z.enum(LENGTH_UNITS), angle: z.enum(ANGLE_UNITS) }).meta({ id: 'Units' })

const Position = z.array(z.number()).length(3).meta({ description: '[x, y, z]', example: [0.4, 0, 0.6] })

export const NOT_UNIT = 'the norm of a quaternion [x, y, z, w] must be within 0.001 of 1'

/** Whether a quaternion can be normalised without guessing. */
export const isNearlyUnit = (q: readonly number[]): boolean => Math.abs(Math.sqrt(q.reduce((sum, part) => sum + part * part, 0)) - 1) <= QUATERNION_SLACK

const Quaternion = z
  .array(z.number())
  .length(4)
  .refine(isNearlyUnit, { message: NOT_UNIT })
  .meta({ description: '[x, y, z, w]; a norm within 0.001 of 1 is normalised.', example: [0, 0, 0, 1] })

/** A pose as a caller sends it. */
export const PoseQuestion = z.strictObject({ position: Position, quaternion: Quaternion }).meta({ id: 'PoseQuestion' })
export type PoseQuestion = z.infer<typeof PoseQuestion>

const Row = z.array(z.number())

/** A pose as the service answers it. */
export const Pose = z
  .strictObject({
    position: z.array(z.number()).length(3),
    quaternion: z.array(z.number()).length(4).meta({ description: '[x, y, z, w]; the first of w, x, y, z beyond 1e-9 is positive.' }),
    matrix: z.array(Row).optional().meta({ description: '4 x 4, row by row; only with "matrices": true.' }),
  })
  .meta({ id: 'Pose' })
export type Pose = z.infer<typeof Pose>

export const Twist = z.array(z.number()).length(6).meta({ description: '[vx, vy, vz, wx, wy, wz]' })

export const FRAMES = ['base', 'tip'] as const
export const Frame = z.enum(FRAMES).meta({ description: 'base: the base link; tip: the tip link with "tool" applied.' })

export const COMPONENTS = ['vx', 'vy', 'vz', 'wx', 'wy', 'wz'] as const

export const Task = z
  .strictObject({
    components: z
      .array(z.enum(COMPONENTS))
      .min(1)
      .max(COMPONENTS.length, 'name each component once')
      .refine((names) => new Set(names).size === names.length, 'name each component once')
      .optional()
      .meta({ description: 'The twist components that matter; all six when left out.' }),
    frame: Frame.optional(),
  })
  .meta({ id: 'Task', description: 'What the tool has to do. A symmetric tool leaves out wz in the tip frame.' })

export const Matrix = z.array(Row)

const nonNegative = z.number().min(0)
const positive = z.number().gt(0, 'must be greater than 0')

export const Inverse = z
  .discriminatedUnion('method', [
    z.strictObject({ method: z.literal('truncated'), tolerance: positive.max(1, 'at most 1: it is relative to the largest singular value').optional() }),
    z.strictObject({ method: z.literal('damped'), damping: nonNegative }),
    z.strictObject({ method: z.literal('adaptive-damped'), threshold: positive.optional(), maxDamping: positive.optional() }),
    z.strictObject({ method: z.literal('filtered'), threshold: positive, damping: nonNegative }),
  ])
  .meta({ id: 'Inverse', description: 'adaptive-damped with threshold 0.02 and maxDamping 0.05 when left out; all SI.' })
export type Inverse = z.infer<typeof Inverse>

export const Secondary = z
  .discriminatedUnion('objective', [
    z.strictObject({
      objective: z.literal('posture'),
      posture: z.array(z.number()).meta({ description: 'A configuration.' }),
      gain: nonNegative.meta({ description: '1/s' }),
    }),
    z.strictObject({ objective: z.literal('mid-range'), gain: nonNegative }),
    z.strictObject({ objective: z.literal('manipulability'), gain: nonNegative }),
  ])
  .meta({ id: 'Secondary' })
export type Secondary = z.infer<typeof Secondary>
