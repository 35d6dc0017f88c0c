import { mFromMm, radFromDeg, type Units } from '@/lib/units'

const PLAIN = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i

/** A typed minus may be the true one, and the degree sign stands for deg. */
const spelled = (text: string): string => text.trim().replaceAll('−', '-').replace(/\s*°$/, ' deg')

/** The SI value (rad or m) of what a person typed: a bare number counts in the units shown, and a unit may be added, as
 *  in "170 deg" or "2.97 rad". null when it cannot be read. */
export async function readQuantity(text: string, kind: 'angle' | 'length', units: Units): Promise<number | null> {
  const typed = spelled(text)
  if (!PLAIN.test(typed)) return (await import('./unit-reader')).siFromText(typed, kind)
  const value = Number(typed)
  if (!Number.isFinite(value)) return null
  if (kind === 'angle') return units.angle === 'deg' ? radFromDeg(value) : value
  return units.length === 'mm' ? mFromMm(value) : value
}
