import { z } from 'zod'
import { Frame, Inverse, PoseQuestion, Secondary, Task, Twist, UnitsQuestion } from './kinematic-quantities'

export const MOST_CONFIGURATIONS = 10_000

const Configurations = z
  .array(z.array(z.number()))
  .min(1, 'send at least one configuration')
  .max(MOST_CONFIGURATIONS, `at most ${MOST_CONFIGURATIONS} configurations at once`)
  .meta({ description: 'Joint values in the order of chain.joints.', example: [[0, -0.6, 0, 1.2, 0, 0.8, 0]] })

/** The fields of every kinematics question. */
const common = {
  chain: z
    .strictObject({ base: z.string().optional(), tip: z.string().optional() })
    .optional()
    .meta({ description: 'Two links; the default chain when left out.' }),
  units: UnitsQuestion.optional(),
  tool: PoseQuestion.optional().meta({ description: "From the tip link to the tool's reference point." }),
  // As far below 1 as the largest input is above it, so that what is divided by it stays finite.
  characteristicLength: z
    .number()
    .min(1e-9, 'must be at least 1e-9')
    .optional()
    .meta({ description: 'm, 1 when left out; divides the linear rows for singular values and what follows from them.' }),
  configurations: Configurations,
  matrices: z.boolean().optional().meta({ description: 'Poses also carry a 4 x 4 matrix.' }),
}

const include = <const F extends readonly [string, ...string[]]>(fields: F) =>
  z
    .array(z.enum(fields))
    .min(1)
    .max(64)
    .optional()
    .meta({ description: 'The result fields wanted: exactly these are answered. Left out: all but projector.' })

const Gains = z.strictObject({ position: z.number().min(0).optional(), orientation: z.number().min(0).optional() })
  .meta({ description: '1/s; 1 when left out.' })

export const FORWARD_KINEMATICS_FIELDS = ['pose', 'links', 'withinLimits', 'violations'] as const
export const JACOBIAN_FIELDS = ['jacobian', 'singularValues', 'rank', 'manipulability', 'conditionNumber'] as const
export const NULL_SPACE_FIELDS = ['rank', 'nullity', 'singularValues', 'basis', 'lostDirections', 'projector'] as const
export const JOINT_RATES_FIELDS = [
  'rates', 'primaryRates', 'secondaryRates', 'scale', 'secondaryScale', 'achievedTwist', 'residual', 'singularValues',
  'rank', 'nullity', 'damping', 'saturated', 'manipulability', 'toolSpeed', 'diagnosis',
] as const

export const ForwardKinematicsQuestion = z.strictObject({
  ...common,
  links: z.array(z.string()).max(500).optional().meta({ description: 'Links wanted besides the tip.' }),
  include: include(FORWARD_KINEMATICS_FIELDS),
})

export const JacobianQuestion = z.strictObject({
  ...common,
  frame: Frame.optional().meta({ description: 'Axes that the Jacobian is written in.' }),
  task: Task.optional().meta({ description: 'What the measures are of; the matrix stays 6 x n.' }),
  include: include(JACOBIAN_FIELDS),
})

export const NullSpaceQuestion = z.strictObject({
  ...common,
  task: Task.optional(),
  tolerance: z.number().gt(0).max(1).optional().meta({ description: 'Relative to the largest singular value; 1e-9 when left out.' }),
  include: include(NULL_SPACE_FIELDS),
})

export const JointRatesQuestion = z
  .strictObject({
    ...common,
    task: Task.optional(),
    twists: z.array(Twist).min(1).max(MOST_CONFIGURATIONS).optional()
      .meta({ description: 'In task.frame: one for each configuration, or one for all.' }),
    references: z
      .array(z.strictObject({ pose: PoseQuestion, twist: Twist.optional(), gains: Gains.optional() }))
      .min(1)
      .max(MOST_CONFIGURATIONS)
      .optional()
      .meta({ description: 'Closed loop: pose in the base link, feed-forward twist in task.frame.' }),
    inverse: Inverse.optional(),
    secondary: z.array(Secondary).max(16).optional().meta({ description: 'What spare freedom is spent on; gains add up.' }),
    limits: z
      .strictObject({
        rates: z.enum(['scale', 'report']).optional(),
        derating: z.number().gt(0, 'must be greater than 0').max(1, 'at most 1').optional(),
      })
      .optional()
      .meta({ description: 'scale (the default) keeps every known rate limit; report changes nothing.' }),
    include: include(JOINT_RATES_FIELDS),
  })
  .superRefine((question, context) => {
    if ((question.twists === undefined) === (question.references === undefined)) {
      context.addIssue({ code: 'custom', path: [], message: 'send exactly one of "twists" and "references"' })
    }
  })

export type ForwardKinematicsQuestion = z.infer<typeof ForwardKinematicsQuestion>
export type JacobianQuestion = z.infer<typeof JacobianQuestion>
export type NullSpaceQuestion = z.infer<typeof NullSpaceQuestion>
export type JointRatesQuestion = z.infer<typeof JointRatesQuestion>
