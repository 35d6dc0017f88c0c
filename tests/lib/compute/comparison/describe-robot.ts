import type { Description } from '@/lib/urdf/description'
import { parseUrdf } from '@/lib/urdf/parse-urdf'

interface Joint {
  readonly name: string
  readonly parent: string
  readonly child: string
  readonly type?: string
  /** Place, m. */
  readonly xyz?: string
  readonly axis?: string
  readonly lower?: number
  readonly upper?: number
  readonly velocity?: number
  readonly effort?: number
  readonly mimic?: string
}

const jointText = ({ name, parent, child, type = 'revolute', xyz = '0 0 0', axis = '0 0 1', lower = -2, upper = 2, velocity = 1, effort = 10, mimic = '' }: Joint) =>
  `<joint name="${name}" type="${type}"><parent link="${parent}"/><child link="${child}"/><origin xyz="${xyz}"/><axis xyz="${axis}"/>` +
  `<limit lower="${lower}" upper="${upper}" velocity="${velocity}" effort="${effort}"/>${mimic}</joint>`

/** The description of a robot made of these joints. */
export function robotOf(joints: readonly Joint[], name = 'robot'): Description {
  const links = [...new Set(joints.flatMap(({ parent, child }) => [parent, child]))]
  const text = `<robot name="${name}">${links.map((link) => `<link name="${link}"/>`).join('')}${joints.map(jointText).join('')}</robot>`
  const { description, findings } = parseUrdf(Buffer.from(text))
  if (description === null) throw new Error(JSON.stringify(findings))
  return description
}

/** A planar arm: its links lie along x and turn about z. lengths in m; the last one leads to the tip. */
export function planarArm(lengths: readonly number[], more: (joint: number) => Partial<Joint> = () => ({})): Description {
  const turning = lengths.map((_length, i) => ({ name: `j${i + 1}`, parent: `l${i}`, child: `l${i + 1}`, xyz: `${i === 0 ? 0 : lengths[i - 1]} 0 0`, ...more(i + 1) }))
  return robotOf([...turning, { name: 'tip_joint', type: 'fixed', parent: `l${lengths.length}`, child: 'tip', xyz: `${lengths.at(-1)} 0 0` }])
}
