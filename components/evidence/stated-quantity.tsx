import { Num } from '@/components/ui/num'
import type { Units } from '@/lib/units'

interface StatedQuantityProps {
  /** In the units that the evidence states: it is shown as it was given. */
  readonly value: number
  readonly kind: 'length' | 'angle'
  readonly units: Units
  readonly withUnit?: boolean
}

const DIGITS = { mm: 3, m: 6, deg: 3, rad: 5 } as const
const WORDS = { mm: 'mm', m: 'm', deg: '°', rad: 'rad' } as const

/** The unit of a stated quantity, for the head of a column. */
export const statedUnit = (kind: 'length' | 'angle', units: Units): string => WORDS[units[kind]]

/** A quantity of the evidence, in the units in which it was measured. */
export function StatedQuantity({ value, kind, units, withUnit = true }: StatedQuantityProps) {
  return <Num value={value} digits={DIGITS[units[kind]]} {...(withUnit ? { unit: statedUnit(kind, units) } : {})} />
}
