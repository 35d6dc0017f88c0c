import type { DescribedJoint, Description } from '@/lib/urdf/description'

type Row = readonly number[]
/** Row-major 4 x 4. */
export type Matrix = readonly Row[]

/** A witness that shares no code with the chain compiler: walks up from a link to the root with full 4 x 4 matrices, Rodrigues'
 *  formula and mimics looked up one by one (METHODS.md section 1). `q` gives the independent joints by name. */
function rootFromLink(description: Description, link: string, q: ReadonlyMap<string, number>): Matrix {
  const joint = description.joints.find(({ child }) => child === link)
  if (!joint) return translation([0, 0, 0])
  return multiply(rootFromLink(description, joint.parent, q), multiply(origin(joint), motion(joint, valueOf(description, joint, q))))
}

export const baseFromTip = (description: Description, base: string, tip: string, q: ReadonlyMap<string, number>): Matrix =>
  multiply(inverse(rootFromLink(description, base, q)), rootFromLink(description, tip, q))

function valueOf(description: Description, joint: DescribedJoint, q: ReadonlyMap<string, number>): number {
  if (joint.type === 'fixed') return 0
  const { mimic } = joint
  if (!mimic) return q.get(joint.name)!
  return mimic.multiplier * valueOf(description, description.joints.find(({ name }) => name === mimic.joint)!, q) + mimic.offset
}

function motion({ type, axis }: DescribedJoint, value: number): Matrix {
  if (type === 'fixed') return translation([0, 0, 0])
  const length = Math.sqrt(axis.reduce((sum, part) => sum + part * part, 0))
  const [x, y, z] = axis.map((part) => part / length) as [number, number, number]
  if (type === 'prismatic') return translation([x * value, y * value, z * value])
  const cross = [[0, -z, y], [z, 0, -x], [-y, x, 0]]
  const square = cross.map((row) => [0, 1, 2].map((column) => row.reduce((sum, part, k) => sum + part * cross[k]![column]!, 0)))
  const rotation = cross.map((row, i) => row.map((part, j) => (i === j ? 1 : 0) + Math.sin(value) * part + (1 - Math.cos(value)) * square[i]![j]!))
  return [...rotation.map((row) => [...row, 0]), [0, 0, 0, 1]]
}

function origin({ origin: written }: DescribedJoint): Matrix {
  const move = translation(written.xyz)
  if ('quaternion' in written) {
    const length = Math.sqrt(written.quaternion.reduce((sum, part) => sum + part * part, 0))
    const [x, y, z, w] = written.quaternion.map((part) => part / length) as [number, number, number, number]
    const angle = 2 * Math.atan2(Math.sqrt(x * x + y * y + z * z), w)
    return angle === 0 ? move : multiply(move, motion({ type: 'continuous', axis: [x, y, z] } as unknown as DescribedJoint, angle))
  }
  const about = (axis: readonly number[], angle: number): Matrix => motion({ type: 'continuous', axis } as unknown as DescribedJoint, angle)
  const [roll, pitch, yaw] = written.rpy
  return multiply(move, multiply(about([0, 0, 1], yaw), multiply(about([0, 1, 0], pitch), about([1, 0, 0], roll))))
}

const translation = (p: readonly number[]): Matrix => [[1, 0, 0, p[0]!], [0, 1, 0, p[1]!], [0, 0, 1, p[2]!], [0, 0, 0, 1]]

const multiply = (a: Matrix, b: Matrix): Matrix =>
  a.map((row) => [0, 1, 2, 3].map((column) => row.reduce((sum, part, k) => sum + part * b[k]![column]!, 0)))

/** Of a rigid transform. */
const inverse = (m: Matrix): Matrix => {
  const turned = [0, 1, 2].map((i) => [0, 1, 2].map((j) => m[j]![i]!))
  return [...turned.map((row) => [...row, -row.reduce((sum, part, k) => sum + part * m[k]![3]!, 0)]), [0, 0, 0, 1]]
}
