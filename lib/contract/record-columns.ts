import { DIAGNOSIS_CODES, INVERSE_KINEMATICS_REASONS } from './kinematic-answers'
import type { FORWARD_KINEMATICS_FIELDS, INVERSE_KINEMATICS_FIELDS, JACOBIAN_FIELDS, JOINT_RATES_FIELDS, NULL_SPACE_FIELDS } from './kinematic-questions'

/** What the layout of a binary record depends on: the question and the chain, never what the results hold. */
export interface RecordSizes {
  /** Independent joints of the chain. */
  readonly joints: number
  readonly linearComponents: number
  readonly angularComponents: number
  /** How many links are answered besides the tip. */
  readonly links: number
  /** Poses also carry their 4 x 4 matrix. */
  readonly matrices: boolean
}

/** One column, or several side by side, of a binary record. */
export interface RecordColumn {
  /** Where it stands in a result of the JSON answer; * for every entry of a list, one after the other. */
  readonly path: string
  /** [] for a single number; [n] for a list; [rows, columns] for a matrix, row by row; [planes, rows, columns] for a list of those. */
  readonly size: readonly number[]
  /** numbers: as they are, true as 1, false as 0, NaN for null and for what is not there. code: the place of the word among `words`, from 1;
   *  0 for none. bits: the sum of 2^place, from 0, of the codes in a list. flags: 1 for each joint that is named. sides: -1 for a joint
   *  below its lower limit, 1 for one above its upper, else 0. */
  readonly kind: 'numbers' | 'code' | 'bits' | 'flags' | 'sides'
  readonly words?: readonly string[]
}

type Field =
  | (typeof FORWARD_KINEMATICS_FIELDS)[number]
  | (typeof JACOBIAN_FIELDS)[number]
  | (typeof NULL_SPACE_FIELDS)[number]
  | (typeof JOINT_RATES_FIELDS)[number]
  | (typeof INVERSE_KINEMATICS_FIELDS)[number]

const numbers = (path: string, ...size: number[]): RecordColumn => ({ path, size, kind: 'numbers' })
const single = (path: string) => () => [numbers(path)]
const ofJoints = (path: string) => ({ joints }: RecordSizes) => [numbers(path, joints)]
const ofJointsSquared = (path: string) => ({ joints }: RecordSizes) => [numbers(path, joints, joints)]
const ofTwist = (path: string) => () => [numbers(path, 6)]
const components = ({ linearComponents, angularComponents }: RecordSizes) => linearComponents + angularComponents
const pose = (path: string, { matrices }: RecordSizes, ...each: number[]) => [
  numbers(`${path}.position`, ...each, 3),
  numbers(`${path}.quaternion`, ...each, 4),
  ...(matrices ? [numbers(`${path}.matrix`, ...each, 4, 4)] : []),
]

/** The columns of each result field in a binary record. Text is left out or becomes a number; a list of changing length has room for the
 *  longest it can be. */
export const FIELD_COLUMNS: Readonly<Record<Field, (sizes: RecordSizes) => readonly RecordColumn[]>> = {
  pose: (sizes) => pose('pose', sizes),
  links: (sizes) => pose('links.*.pose', sizes, sizes.links),
  withinLimits: single('withinLimits'),
  violations: ({ joints }) => [{ path: 'violations', size: [joints], kind: 'sides' }],
  jacobian: ({ joints }) => [numbers('jacobian', 6, joints)],
  singularValues: (sizes) => [numbers('singularValues', Math.min(components(sizes), sizes.joints))],
  translationalSingularValues: ({ linearComponents, joints }) => [numbers('translationalSingularValues', Math.min(linearComponents, joints))],
  rotationalSingularValues: ({ angularComponents, joints }) => [numbers('rotationalSingularValues', Math.min(angularComponents, joints))],
  rank: single('rank'),
  nullity: single('nullity'),
  manipulability: single('manipulability'),
  conditionNumber: single('conditionNumber'),
  basis: ofJointsSquared('basis'),
  lostDirections: (sizes) => [numbers('lostDirections.*.direction', components(sizes), 6), numbers('lostDirections.*.structural', components(sizes))],
  projector: ofJointsSquared('projector'),
  rates: ofJoints('rates'),
  primaryRates: ofJoints('primaryRates'),
  secondaryRates: ofJoints('secondaryRates'),
  scale: single('scale'),
  secondaryScale: single('secondaryScale'),
  achievedTwist: ofTwist('achievedTwist'),
  residual: ofTwist('residual'),
  damping: single('damping'),
  saturated: ({ joints }) => [{ path: 'saturated', size: [joints], kind: 'flags' }],
  toolSpeed: single('toolSpeed'),
  diagnosis: () => [{ path: 'diagnosis', size: [], kind: 'bits', words: DIAGNOSIS_CODES }],
  converged: single('converged'),
  configuration: ofJoints('configuration'),
  positionError: single('positionError'),
  orientationError: single('orientationError'),
  iterations: single('iterations'),
  attempts: single('attempts'),
  reason: () => [{ path: 'reason', size: [], kind: 'code', words: INVERSE_KINEMATICS_REASONS }],
}

/** The columns of the wanted fields, in the order in which a record has them. A list that can have no entry has none. */
export const columnsOf = (fields: readonly string[], sizes: RecordSizes): RecordColumn[] =>
  fields.flatMap((field) => FIELD_COLUMNS[field as Field](sizes)).filter((column) => countOf(column) > 0)

/** How many numbers a column stands for. */
export const countOf = ({ size }: RecordColumn): number => size.reduce((product, length) => product * length, 1)
