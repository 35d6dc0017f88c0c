'use client'
import { createContext, useContext, useState, type ReactNode } from 'react'
import type { Units } from '@/lib/units'
import { remember } from './remember'

/** The two pairs of units that a page can be read in, under the word kept in the cookie. */
export const UNIT_PAIRS = {
  'deg-mm': { length: 'mm', angle: 'deg' },
  'rad-m': { length: 'm', angle: 'rad' },
} as const satisfies Record<string, Units>
export type UnitPair = keyof typeof UNIT_PAIRS

interface UnitChoice {
  readonly pair: UnitPair
  readonly units: Units
  readonly choose: (pair: UnitPair) => void
}

const Context = createContext<UnitChoice>({ pair: 'deg-mm', units: UNIT_PAIRS['deg-mm'], choose: () => undefined })

/** The units in which numbers are shown, chosen once for all pages. */
export const useUnits = (): UnitChoice => useContext(Context)

/** Holds the choice. initial: what the cookie says. */
export function UnitsProvider({ initial, children }: { readonly initial: string | undefined; readonly children: ReactNode }) {
  const [pair, setPair] = useState<UnitPair>(initial === 'rad-m' ? 'rad-m' : 'deg-mm')
  const choose = (next: UnitPair) => {
    setPair(next)
    remember('units', next)
  }
  return <Context value={{ pair, units: UNIT_PAIRS[pair], choose }}>{children}</Context>
}
