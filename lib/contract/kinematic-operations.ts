import {
  ForwardKinematicsAnswer,
  ForwardKinematicsResult,
  InverseKinematicsAnswer,
  InverseKinematicsResult,
  JacobianAnswer,
  JacobianResult,
  JointRatesAnswer,
  JointRatesResult,
  NullSpaceAnswer,
  NullSpaceResult,
} from './kinematic-answers'
import { ForwardKinematicsQuestion, InverseKinematicsQuestion, JacobianQuestion, JointRatesQuestion, NullSpaceQuestion } from './kinematic-questions'
import { operation } from './operation'
import { RECORD_FORMS } from './record-questions'

const REVISION = '/teams/{team}/models/{model}/revisions/{revision}'

const ELBOW_UP = [0, -35, 0, 70, 0, 45, 0]
const SHOP_UNITS = { length: 'mm', angle: 'deg' }

const errors = ['length-mismatch', 'chain-not-found', 'chain-not-computable', 'answer-too-large'] as const

export const KINEMATIC_OPERATIONS = {
  forwardKinematics: operation({
    method: 'POST',
    path: `${REVISION}/forward-kinematics`,
    tag: 'Kinematics',
    summary: 'Where the tool is',
    description: 'Pose of the tip, and of further links, at each configuration.',
    body: ForwardKinematicsQuestion,
    answer: { status: 200, schema: ForwardKinematicsAnswer },
    item: ForwardKinematicsResult,
    records: RECORD_FORMS.forwardKinematics,
    errors: [...errors, 'link-not-determined'],
    pinned: true,
    example: { units: SHOP_UNITS, configurations: [ELBOW_UP] },
  }),
  jacobian: operation({
    method: 'POST',
    path: `${REVISION}/jacobian`,
    tag: 'Kinematics',
    summary: 'How the tool moves with the joints',
    description: 'Geometric Jacobian at each configuration, with its singular values and the measures made of them.',
    body: JacobianQuestion,
    answer: { status: 200, schema: JacobianAnswer },
    item: JacobianResult,
    records: RECORD_FORMS.jacobian,
    errors,
    pinned: true,
    example: { units: SHOP_UNITS, configurations: [ELBOW_UP], frame: 'tip' },
  }),
  nullSpace: operation({
    method: 'POST',
    path: `${REVISION}/null-space`,
    tag: 'Kinematics',
    summary: 'How the joints can move while the tool stands still',
    description: 'Orthonormal basis of the joint rates that leave the task untouched, and the directions that are lost.',
    body: NullSpaceQuestion,
    answer: { status: 200, schema: NullSpaceAnswer },
    item: NullSpaceResult,
    records: RECORD_FORMS.nullSpace,
    errors,
    pinned: true,
    example: { units: { angle: 'deg' }, configurations: [ELBOW_UP] },
  }),
  jointRates: operation({
    method: 'POST',
    path: `${REVISION}/joint-rates`,
    tag: 'Kinematics',
    summary: 'Joint rates that move the tool as asked',
    description:
      'Resolved joint rates, with spare freedom spent on the secondary objectives, rate limits kept, and a diagnosis in words. ' +
      'A missing or late answer means hold.',
    body: JointRatesQuestion,
    answer: { status: 200, schema: JointRatesAnswer },
    item: JointRatesResult,
    records: RECORD_FORMS.jointRates,
    errors,
    pinned: true,
    example: {
      units: SHOP_UNITS,
      configurations: [ELBOW_UP],
      twists: [[50, 0, 0, 0, 0, 0]],
      secondary: [{ objective: 'posture', posture: [0, -35, 20, 70, 0, 45, 0], gain: 0.5 }],
    },
  }),
  inverseKinematics: operation({
    method: 'POST',
    path: `${REVISION}/inverse-kinematics`,
    tag: 'Kinematics',
    summary: 'Joint values that put the tool there',
    description:
      'A configuration within the joint limits for each target, or the best that was found and why no better. ' +
      'Not converging is an answer, not an error. Check every motion between configurations before using it.',
    body: InverseKinematicsQuestion,
    answer: { status: 200, schema: InverseKinematicsAnswer },
    item: InverseKinematicsResult,
    records: RECORD_FORMS.inverseKinematics,
    errors: [...errors, 'budget-exceeded'],
    pinned: true,
    example: {
      units: SHOP_UNITS,
      targets: [{ position: [-400, 0, 500], quaternion: [0, -0.70710678, 0, 0.70710678] }],
      seeds: [ELBOW_UP],
    },
  }),
} as const
