import type { ChainJoint } from '@/lib/kinematics/chain'
import { readQuantity } from '@/components/ui/read-quantity'
import { degFromRad, mFromMm, mmFromM, radFromDeg, type Units } from '@/lib/units'

/** Digits that hide the rounding of a unit change and nothing that was typed. */
const tidy = (value: number): string => String(Number(value.toPrecision(12)))

const shown = (joint: ChainJoint, value: number, units: Units): number => {
  if (joint.type === 'prismatic') return units.length === 'mm' ? mmFromM(value) : value
  return units.angle === 'deg' ? degFromRad(value) : value
}

/** A configuration as a line of text in the units shown, with the minus of a keyboard, so that it can be typed over and copied. */
export const textOfConfiguration = (joints: readonly ChainJoint[], q: readonly number[], units: Units): string =>
  joints.map((joint, i) => tidy(shown(joint, q[i] ?? 0, units))).join(', ')

/** Numbers of a configuration in the units shown, for a request. */
export const numbersOfConfiguration = (joints: readonly ChainJoint[], q: readonly number[], units: Units): number[] =>
  joints.map((joint, i) => Number(tidy(shown(joint, q[i] ?? 0, units))))

/** What was typed for a configuration: SI values, or a sentence that says which value to mend. Values are separated by
 *  commas or semicolons; without either, by blanks. */
export async function readConfiguration(joints: readonly ChainJoint[], text: string, units: Units): Promise<readonly number[] | string> {
  const parts = text.trim().split(/[,;]/.test(text) ? /\s*[,;]\s*/ : /\s+/)
  if (parts.length !== joints.length || text.trim() === '') {
    const given = text.trim() === '' ? 0 : parts.length
    return `Type ${joints.length} values separated by commas, one for each joint; there ${given === 1 ? 'is' : 'are'} ${given}.`
  }
  const values: number[] = []
  for (const [i, joint] of joints.entries()) {
    const kind = joint.type === 'prismatic' ? 'length' : 'angle'
    const value = await readQuantity(parts[i]!, kind, units)
    if (value === null) return `“${parts[i]}” is not ${kind === 'angle' ? 'an angle' : 'a length'} for ${joint.name}. Type a number, or one with a unit such as ${kind === 'angle' ? '35 deg' : '120 mm'}.`
    if (Math.abs(value) > 1e9) return `The value for ${joint.name} is too large.`
    values.push(value)
  }
  return values
}

/** The `q` of a sheet's address: degrees and millimetres whatever is shown, because people read and edit addresses. */
export const addressOfConfiguration = (joints: readonly ChainJoint[], q: readonly number[]): string =>
  joints.map((joint, i) => tidy(shown(joint, q[i] ?? 0, { length: 'mm', angle: 'deg' }))).join(',')

/** Reads the `q` of an address; null when it does not fit the chain. */
export function configurationOfAddress(joints: readonly ChainJoint[], text: string): number[] | null {
  const parts = text.split(',')
  if (parts.length !== joints.length) return null
  const values = joints.map((joint, i) => {
    const typed = parts[i]!.trim() === '' ? Number.NaN : Number(parts[i])
    return joint.type === 'prismatic' ? mFromMm(typed) : radFromDeg(typed)
  })
  return values.every((value) => Number.isFinite(value) && Math.abs(value) <= 1e9) ? values : null
}
