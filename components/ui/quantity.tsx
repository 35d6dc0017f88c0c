'use client'
import { degFromRad, mmFromM, type Units } from '@/lib/units'
import { Num } from './num'
import { useUnits } from './units-context'

export type QuantityKind = 'angle' | 'length' | 'angle-rate' | 'length-rate'

const SHOWN: Record<QuantityKind, Record<string, { convert: (si: number) => number; unit: string; digits: number }>> = {
  angle: { deg: { convert: degFromRad, unit: '°', digits: 2 }, rad: { convert: Number, unit: 'rad', digits: 4 } },
  length: { mm: { convert: mmFromM, unit: 'mm', digits: 3 }, m: { convert: Number, unit: 'm', digits: 6 } },
  'angle-rate': { deg: { convert: degFromRad, unit: '°/s', digits: 1 }, rad: { convert: Number, unit: 'rad/s', digits: 3 } },
  'length-rate': { mm: { convert: mmFromM, unit: 'mm/s', digits: 1 }, m: { convert: Number, unit: 'm/s', digits: 4 } },
}

const shownIn = (kind: QuantityKind, units: Units) => SHOWN[kind][kind.startsWith('angle') ? units.angle : units.length]!

/** The unit in which a quantity is shown now, for the head of a column. */
export function UnitOf({ kind }: { readonly kind: QuantityKind }) {
  return <>{shownIn(kind, useUnits().units).unit}</>
}

interface QuantityProps {
  /** SI: rad, m, rad/s, m/s. null: none, shown as a dash. */
  readonly value: number | null | undefined
  readonly kind: QuantityKind
  /** Digits behind the point, where the usual ones do not fit. */
  readonly digits?: number | undefined
  /** Shows the unit behind the number; leave it out where the head of the column has it. */
  readonly withUnit?: boolean
  readonly className?: string
}

/** A physical quantity in the units chosen on the page. */
export function Quantity({ value, kind, digits, withUnit = false, className }: QuantityProps) {
  const shown = shownIn(kind, useUnits().units)
  const number = value === null || value === undefined ? null : shown.convert(value)
  return <Num value={number} digits={digits ?? shown.digits} {...(withUnit ? { unit: shown.unit } : {})} {...(className ? { className } : {})} />
}
