import { z } from 'zod'
import { checkRateLimits, ForwardKinematicsQuestion, Gains, InverseKinematicsQuestion, JacobianQuestion, JointRatesQuestion, NullSpaceQuestion } from './kinematic-questions'
import type { RecordForm } from './record-form'

const CONFIGURATION = { configuration: ['configuration'] } as const

const { configurations: _forward, ...forwardKinematics } = ForwardKinematicsQuestion.shape
const { configurations: _jacobian, ...jacobian } = JacobianQuestion.shape
const { configurations: _null, ...nullSpace } = NullSpaceQuestion.shape
const { configurations: _rates, twists: _twists, references: _references, ...jointRates } = JointRatesQuestion.shape
const { targets: _targets, ...inverseKinematics } = InverseKinematicsQuestion.shape

const RATE_RECORDS = {
  twist: ['configuration', 'twist'],
  pose: ['configuration', 'position', 'quaternion'],
  'pose-and-twist': ['configuration', 'position', 'quaternion', 'twist'],
} as const
const TARGET_RECORDS = { 'target-and-seed': ['position', 'quaternion', 'seed'], target: ['position', 'quaternion'] } as const

const namesOf = <T extends object>(records: T) => Object.keys(records) as [keyof T & string, ...(keyof T & string)[]]

/** What stands beside binary records of joint rates. */
const JointRatesBeside = z
  .strictObject({
    ...jointRates,
    record: z.enum(namesOf(RATE_RECORDS)).optional().meta({ description: 'What each record holds after the configuration; twist when left out.' }),
    gains: Gains.optional().meta({ description: '1/s, of every reference pose; 1 when left out.' }),
  })
  .superRefine((question, context) => {
    if (question.gains !== undefined && (question.record ?? 'twist') === 'twist') {
      context.addIssue({ code: 'custom', path: ['gains'], message: 'goes with records that hold a pose: "record": "pose" or "pose-and-twist"' })
    }
    checkRateLimits(question.limits, context)
  })

/** What stands beside binary records of inverse kinematics. */
const InverseKinematicsBeside = z
  .strictObject({
    ...inverseKinematics,
    record: z.enum(namesOf(TARGET_RECORDS)).optional().meta({ description: 'target-and-seed when left out.' }),
  })
  .superRefine((question, context) => {
    if (question.seeds !== undefined && question.record !== 'target') {
      context.addIssue({ code: 'custom', path: ['seeds'], message: 'goes with records that hold no seed: "record": "target"' })
    }
  })

/** How each kinematics operation takes binary records. */
export const RECORD_FORMS = {
  forwardKinematics: { question: z.strictObject(forwardKinematics), records: CONFIGURATION, list: 'configurations' },
  jacobian: { question: z.strictObject(jacobian), records: CONFIGURATION, list: 'configurations' },
  nullSpace: { question: z.strictObject(nullSpace), records: CONFIGURATION, list: 'configurations' },
  jointRates: { question: JointRatesBeside, records: RATE_RECORDS, list: 'configurations' },
  inverseKinematics: { question: InverseKinematicsBeside, records: TARGET_RECORDS, list: 'targets' },
} as const satisfies Record<string, RecordForm>
