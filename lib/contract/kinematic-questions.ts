import { z } from 'zod'
import { Frame, Inverse, PoseQuestion, Secondary, Task, Twist, UnitsQuestion } from './kinematic-quantities'

export const MOST_CONFIGURATIONS = 10_000

const Configurations = z
  .array(z.array(z.number()))
  .min(1, 'send at least one configuration')
  .max(MOST_CONFIGURATIONS, `at most ${MOST_CONFIGURATIONS} configurations at once`)
  .meta({ description: 'Joint values in the order of chain.joints.', example: [[0, -0.6, 0, 1.2, 0, 0.8, 0]] })

/** Bounded, because a name that no link has is repeated in the answer. */
const LinkName = z.string().max(1000)

/** The fields of every kinematics question. */
const common = {
  chain: z
    .strictObject({ base: LinkName.optional(), tip: LinkName.optional() })
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

export const Gains = z.strictObject({ position: z.number().min(0).optional(), orientation: z.number().min(0).optional() })
  .meta({ description: '1/s; 1 when left out.' })

export const FORWARD_KINEMATICS_FIELDS = ['pose', 'links', 'withinLimits', 'violations'] as const
export const JACOBIAN_FIELDS = [
  'jacobian', 'singularValues', 'translationalSingularValues', 'rotationalSingularValues', 'rank', 'manipulability', 'conditionNumber',
] as const
export const NULL_SPACE_FIELDS = ['rank', 'nullity', 'singularValues', 'basis', 'lostDirections', 'projector'] as const
export const JOINT_RATES_FIELDS = [
  'rates', 'primaryRates', 'secondaryRates', 'scale', 'secondaryScale', 'achievedTwist', 'residual', 'singularValues',
  'rank', 'nullity', 'damping', 'saturated', 'manipulability', 'toolSpeed', 'diagnosis',
] as const

export const INVERSE_KINEMATICS_FIELDS = ['converged', 'configuration', 'positionError', 'orientationError', 'iterations', 'attempts', 'reason'] as const

export const ForwardKinematicsQuestion = z.strictObject({
  ...common,
  links: z.array(LinkName).max(500).optional().meta({ description: 'Links wanted besides the tip.' }),
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
  alignTo: z
    .array(z.array(z.number()))
    .optional()
    .meta({ description: 'A basis (n x k) that the first result is turned to; each further result is turned to the one before.' }),
  include: include(NULL_SPACE_FIELDS),
})

/** Weights further apart than this, as a ratio, leave the lighter joints no digits. */
const WIDEST_WEIGHTS = 1e12

/** Single weights out of range are told of one by one. */
function areComparable(weights: readonly number[]): boolean {
  const least = weights.reduce((a, b) => Math.min(a, b), WIDEST_WEIGHTS)
  const most = weights.reduce((a, b) => Math.max(a, b), 0)
  return least < 1 / WIDEST_WEIGHTS || most > WIDEST_WEIGHTS || most <= WIDEST_WEIGHTS * least
}

/** What of the rate limits needs what else of them. */
export function checkRateLimits(
  limits: { readonly accelerations?: unknown; readonly previousRates?: unknown; readonly dt?: unknown } | undefined,
  context: z.RefinementCtx,
): void {
  const { accelerations, previousRates, dt } = limits ?? {}
  if (accelerations !== undefined && dt === undefined) {
    context.addIssue({ code: 'custom', path: ['limits', 'dt'], message: 'is missing: acceleration limits need the period' })
  }
  if (previousRates !== undefined && accelerations === undefined) {
    context.addIssue({ code: 'custom', path: ['limits', 'accelerations'], message: 'is missing: previous rates do nothing without acceleration limits' })
  }
}

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
    jointWeights: z
      .array(z.number().min(1 / WIDEST_WEIGHTS, 'must be at least 1e-12').max(WIDEST_WEIGHTS, 'at most 1e12'))
      .refine(areComparable, 'the largest may be 1e12 times the smallest at most')
      .optional()
      .meta({ description: 'What a unit of each rate costs, squared; SI. The projector is then I − J_W⁺J.' }),
    secondary: z.array(Secondary).max(16).optional().meta({ description: 'What spare freedom is spent on; gains add up.' }),
    limits: z
      .strictObject({
        rates: z.enum(['scale', 'saturate', 'report']).optional(),
        derating: z.number().gt(0, 'must be greater than 0').max(1, 'at most 1').optional(),
        accelerations: z
          .array(z.number().gt(0, 'must be greater than 0').nullable())
          .optional()
          .meta({ description: 'One for each joint; null where unknown. Needs dt.' }),
        previousRates: z
          .array(z.array(z.number()))
          .min(1)
          .max(MOST_CONFIGURATIONS)
          .optional()
          .meta({ description: 'The rates commanded a period ago: one entry for each configuration, or one for all. Needs accelerations.' }),
        dt: z.number().min(1e-6, 'must be at least 1e-6').max(1000, 'at most 1000').optional().meta({ description: 'The period, s.' }),
      })
      .optional()
      .meta({
        description:
          'scale (the default) keeps every known limit by slowing down; saturate lets other joints take over first; report changes nothing.',
      }),
    include: include(JOINT_RATES_FIELDS),
  })
  .superRefine((question, context) => {
    if ((question.twists === undefined) === (question.references === undefined)) {
      context.addIssue({ code: 'custom', path: [], message: 'send exactly one of "twists" and "references"' })
    }
    checkRateLimits(question.limits, context)
  })

export const MOST_ATTEMPTS = 64

// Far below what binary64 can tell apart at the size of an arm, and still not 0 when divided by a thousand.
const tolerance = z.number().min(1e-12, 'must be at least 1e-12')

const { configurations: _configurations, ...withoutConfigurations } = common

export const InverseKinematicsQuestion = z.strictObject({
  ...withoutConfigurations,
  targets: z
    .array(PoseQuestion)
    .min(1, 'send at least one target')
    .max(MOST_CONFIGURATIONS, `at most ${MOST_CONFIGURATIONS} targets at once`)
    .meta({ description: 'Poses of the tool in the base link.' }),
  seeds: z
    .array(z.array(z.number()))
    .min(1)
    .max(MOST_CONFIGURATIONS)
    .optional()
    .meta({ description: 'Where each search starts: one for each target, or one for all; the middle of the ranges when left out.' }),
  task: Task.optional(),
  positionTolerance: tolerance.optional().meta({ description: 'In the length unit; 1e-6 m when left out.' }),
  orientationTolerance: tolerance.optional().meta({ description: 'In the angle unit; 1e-6 rad when left out.' }),
  attempts: z.int().min(1).max(MOST_ATTEMPTS).optional().meta({ description: 'Starting points tried at the most; 8 when left out.' }),
  secondary: z.array(Secondary).max(16).optional().meta({ description: 'What spare freedom is spent on once the pose is reached.' }),
  include: include(INVERSE_KINEMATICS_FIELDS),
})

export type InverseKinematicsQuestion = z.infer<typeof InverseKinematicsQuestion>
export type ForwardKinematicsQuestion = z.infer<typeof ForwardKinematicsQuestion>
export type JacobianQuestion = z.infer<typeof JacobianQuestion>
export type NullSpaceQuestion = z.infer<typeof NullSpaceQuestion>
export type JointRatesQuestion = z.infer<typeof JointRatesQuestion>
