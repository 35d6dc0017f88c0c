import { norm } from '@/lib/math/norm'
import type { DraftJoint } from '@/lib/urdf/read-joint'
import type { Report } from '@/lib/urdf/report'

/** A rotation never needs more than half a turn; so much is far from any way of writing it in rad. */
const ROTATION_RAD = 10
/** Almost five turns from the middle: a joint that turns so far is continuous. Beyond the second, 'no limit' is meant. rad. */
const FAR_RAD = 30
const NO_LIMIT_RAD = 1000
/** Between two joints of a robot, as the middle one of all distances; no machine has it in m. */
const LONG_M = 30
/** A slide that is both so long and so fast: a long gantry is slow, and a fast axis is short. */
const STROKE_M = 10
const SLIDE_M_PER_S = 20
/** Beyond it, 'no limit' is meant. */
const NO_LIMIT_M = 1e5

/** Warns of values that look like degrees or millimetres, at most once for each kind of value. No number gives itself away alone (a
 *  gantry is long, a cable drum turns often, a gripper is small), so each kind is judged over the whole file. Common practice. */
export function checkUnits(report: Report, joints: readonly DraftJoint[]): void {
  warnOfRotations(report, joints)
  warnOfTurns(report, joints)
  warnOfDistances(report, joints)
  warnOfStrokes(report, joints)
}

/** A part of rpy beyond 10 that is not a multiple of a quarter turn in rad. */
function warnOfRotations(report: Report, joints: readonly DraftJoint[]): void {
  const isOdd = (angle: number): boolean => Math.abs(angle) >= ROTATION_RAD && Math.abs(angle / (Math.PI / 2) - Math.round(angle / (Math.PI / 2))) > 1e-3
  const met = joints.filter(({ origin }) => 'rpy' in origin && origin.rpy.some(isOdd))
  const [first] = met
  if (first === undefined) return
  const angle = 'rpy' in first.origin ? first.origin.rpy.find(isOdd) : undefined
  warn(report, first, first.places.rpy!, `${place(met.length)} rpy beyond ${ROTATION_RAD} rad, here ${angle}. It looks like degrees; it is read as rad.`)
}

/** Bounds between 30 and 1000 on more than half of the revolute joints, and on two at least. */
function warnOfTurns(report: Report, joints: readonly DraftJoint[]): void {
  const bounded = joints.filter(({ type, limits }) => type === 'revolute' && limits !== null)
  const reach = ({ limits }: DraftJoint): number => Math.max(Math.abs(limits!.lower ?? 0), Math.abs(limits!.upper ?? 0))
  const met = bounded.filter((joint) => reach(joint) >= FAR_RAD && reach(joint) < NO_LIMIT_RAD && joint.places.bound !== undefined)
  if (met.length < 2 || 2 * met.length <= bounded.length) return
  const first = met[0]!
  warn(report, first, first.places.bound!, `${place(met.length)} limits such as ${reach(first)}. They look like degrees; they are read as rad.`)
}

/** The middle distance of 30 or more between joints further out than the first, of two at least: the first may stand anywhere on a site. */
function warnOfDistances(report: Report, joints: readonly DraftJoint[]): void {
  const children = new Set(joints.flatMap(({ child }) => child?.value ?? []))
  const met = joints.filter(({ parent, origin, places }) => parent && children.has(parent.value) && places.xyz !== undefined && norm(origin.xyz) > 0)
  const lengths = met.map(({ origin }) => norm(origin.xyz)).sort((a, b) => a - b)
  if (lengths.length < 2 || lengths[(lengths.length - 1) >> 1]! < LONG_M) return
  const first = met.find(({ origin }) => norm(origin.xyz) >= LONG_M)!
  const long = lengths.filter((length) => length >= LONG_M).length
  const where = `origins further than ${LONG_M} m from the one before`
  warn(report, first, first.places.xyz!, `${place(long)} ${where}. They look like millimetres; they are read as m.`)
}

/** A stroke of 10 or more and a rate of 20 or more on one slide. */
function warnOfStrokes(report: Report, joints: readonly DraftJoint[]): void {
  const stroke = ({ limits }: DraftJoint): number => Math.max(Math.abs(limits?.lower ?? 0), Math.abs(limits?.upper ?? 0))
  const isLong = (joint: DraftJoint): boolean => stroke(joint) >= STROKE_M && stroke(joint) < NO_LIMIT_M
  const met = joints.filter((joint) => joint.type === 'prismatic' && joint.places.bound !== undefined && isLong(joint) && (joint.limits?.rate ?? 0) >= SLIDE_M_PER_S)
  const [first] = met
  if (first === undefined) return
  const what = `a stroke such as ${stroke(first)} and a rate such as ${first.limits!.rate}`
  warn(report, first, first.places.bound!, `${place(met.length)} ${what}. They look like millimetres; they are read as m and m/s.`)
}

const warn = (report: Report, { label }: DraftJoint, at: number, message: string): void => report.add('unit-suspect', at, message, { element: label })

const place = (count: number): string => (count === 1 ? 'A joint has' : `${count} joints have`)
