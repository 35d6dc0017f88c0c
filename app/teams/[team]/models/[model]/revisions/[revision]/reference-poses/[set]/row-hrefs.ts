import { addressOfConfiguration } from '@/components/sheet/configuration-text'
import { toSi } from '@/lib/compute/si'
import type { ReferencePoses } from '@/lib/contract/reference-poses'

/** For each row of a set the address of its revision's sheet, drawn at the joint values that were measured. */
export function rowHrefs(sheet: string, { chain, units, rows }: Pick<ReferencePoses, 'chain' | 'units' | 'rows'>): string[] {
  const joints = chain.joints.map((name, i) => ({ name, type: chain.types[i]!, lower: null, upper: null, rate: null }))
  return rows.map(({ configuration }) => {
    const q = configuration.map((value, i) => toSi(value, chain.types[i] === 'prismatic' ? 'length' : 'angle', units))
    return `${sheet}?${new URLSearchParams({ base: chain.base, tip: chain.tip, q: addressOfConfiguration(joints, q) })}`
  })
}
