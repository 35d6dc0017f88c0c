import { z } from 'zod'
import { Finding } from './description'
import { Matrix, Pose, Twist, UnitsAnswer } from './kinematic-quantities'
import { Digest, Status } from './scalars'

/** Which description a number was computed from. */
export const ModelReference = z
  .strictObject({ team: z.string(), model: z.string(), revision: z.int(), status: Status, fingerprint: Digest })
  .meta({ id: 'ModelReference' })

const envelope = {
  model: ModelReference,
  chain: z.strictObject({
    base: z.string(),
    tip: z.string(),
    joints: z.array(z.string()).meta({ description: 'The order of configurations, columns and rates.' }),
    types: z.array(z.enum(['revolute', 'continuous', 'prismatic'])),
  }),
  units: UnitsAnswer,
  characteristicLength: z.number(),
  warnings: z.array(Finding).optional().meta({ description: "The revision's findings that touch this chain." }),
}

const Values = z.array(z.number())

export const ForwardKinematicsResult = z.strictObject({
  pose: Pose.optional(),
  links: z.array(z.strictObject({ link: z.string(), pose: Pose })).optional().meta({ description: 'The links asked for, in that order.' }),
  withinLimits: z.boolean().optional(),
  violations: z
    .array(z.strictObject({ joint: z.string(), value: z.number(), lower: z.number().nullable(), upper: z.number().nullable() }))
    .optional(),
})

export const JacobianResult = z.strictObject({
  jacobian: Matrix.optional().meta({ description: '6 x n, rows in twist order.' }),
  singularValues: Values.optional(),
  translationalSingularValues: Values.optional().meta({
    description:
      'Of the linear components of the task by themselves, whatever the characteristic length: m/s of the tool for a unit of joint rates ' +
      '(m/rad for turning joints, 1 for sliding ones). Empty where the task has no linear component.',
  }),
  rotationalSingularValues: Values.optional().meta({
    description: 'Of the angular components of the task by themselves: rad/s of the tool for a unit of joint rates. Empty where the task has no angular component.',
  }),
  rank: z.int().optional(),
  manipulability: z.number().nullable().optional().meta({ description: 'Product of the singular values.' }),
  conditionNumber: z.number().nullable().optional().meta({ description: 'First singular value over the last; null at a singular pose.' }),
})

export const NullSpaceResult = z.strictObject({
  rank: z.int().optional(),
  nullity: z.int().optional(),
  singularValues: Values.optional(),
  basis: Matrix.optional().meta({ description: 'n x nullity, orthonormal columns.' }),
  lostDirections: z
    .array(z.strictObject({ direction: Twist, structural: z.boolean() }))
    .optional()
    .meta({ description: 'Unit twists that no joint rates produce; structural: at no pose.' }),
  projector: Matrix.optional().meta({ description: 'n x n; only when named in "include".' }),
})

export const DIAGNOSIS_CODES = [
  'direction-lost', 'near-singular', 'rate-limited', 'secondary-starved', 'at-limit', 'outside-limits',
  'gain-too-high',
] as const

export const JointRatesResult = z.strictObject({
  rates: Values.optional(),
  primaryRates: Values.optional(),
  secondaryRates: Values.optional(),
  scale: z.number().optional(),
  secondaryScale: z.number().optional(),
  achievedTwist: Twist.optional(),
  residual: Twist.optional().meta({ description: 'Achieved less asked; 0 in components outside the task.' }),
  singularValues: Values.optional(),
  rank: z.int().optional(),
  nullity: z.int().optional(),
  damping: z.number().optional().meta({ description: 'lambda' }),
  saturated: z.array(z.string()).optional().meta({ description: 'Joints held at a bound while the others do their part of the task, or braking.' }),
  manipulability: z.number().nullable().optional(),
  toolSpeed: z.number().optional().meta({ description: "Speed of the tool's reference point, in the length unit per second." }),
  diagnosis: z
    .array(
      z.strictObject({
        code: z.enum(DIAGNOSIS_CODES),
        detail: z.string(),
        direction: Twist.optional(),
        joint: z.string().optional(),
      }),
    )
    .optional(),
})

export const INVERSE_KINEMATICS_REASONS = ['unreachable', 'at-limits', 'stalled'] as const

export const InverseKinematicsResult = z.strictObject({
  converged: z.boolean().optional(),
  configuration: Values.optional().meta({ description: 'Within the joint limits; the best that was found where none reaches the target.' }),
  positionError: z.number().optional().meta({ description: 'Of the components that count.' }),
  orientationError: z.number().optional(),
  iterations: z.int().optional().meta({ description: 'Over all attempts.' }),
  attempts: z.int().optional(),
  reason: z.enum(INVERSE_KINEMATICS_REASONS).optional().meta({ description: 'Left out where it converged.' }),
})

const answerOf = <T extends z.ZodType>(item: T) => z.strictObject({ ...envelope, results: z.array(item) })

export const ForwardKinematicsAnswer = answerOf(ForwardKinematicsResult).meta({ id: 'ForwardKinematicsAnswer' })
export const JacobianAnswer = answerOf(JacobianResult).meta({ id: 'JacobianAnswer' })
export const NullSpaceAnswer = answerOf(NullSpaceResult).meta({ id: 'NullSpaceAnswer' })
export const JointRatesAnswer = answerOf(JointRatesResult).meta({ id: 'JointRatesAnswer' })
export const InverseKinematicsAnswer = answerOf(InverseKinematicsResult).meta({ id: 'InverseKinematicsAnswer' })
