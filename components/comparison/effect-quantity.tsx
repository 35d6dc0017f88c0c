'use client'
import { Num } from '@/components/ui/num'
import { useUnits } from '@/components/ui/units-context'
import { degFromRad, mmFromM } from '@/lib/units'

interface EffectQuantityProps {
  /** SI, not negative. */
  readonly value: number
  readonly kind: 'length' | 'angle'
  /** Within a sentence: "by up to …". */
  readonly inSentence?: boolean
}

const SHOWN = {
  length: { mm: { convert: mmFromM, digits: 3 }, m: { convert: Number, digits: 6 } },
  angle: { deg: { convert: degFromRad, digits: 4 }, rad: { convert: Number, digits: 6 } },
} as const

/** How far something moved or turned, with its unit. What is too small for the digits shown is not passed off as 0. */
export function EffectQuantity({ value, kind, inSentence = false }: EffectQuantityProps) {
  const { units } = useUnits()
  const { convert, digits } = kind === 'length' ? SHOWN.length[units.length] : SHOWN.angle[units.angle]
  const least = 10 ** -digits
  const shown = convert(value)
  const unit = kind === 'length' ? units.length : units.angle === 'deg' ? '°' : 'rad'
  return shown > 0 && shown < least / 2 ? (
    <span className="whitespace-nowrap">
      {inSentence ? 'by less than' : 'under'} <Num value={least} digits={digits} unit={unit} />
    </span>
  ) : (
    <>
      {inSentence ? 'by up to ' : ''}
      <Num value={shown} digits={digits} unit={unit} />
    </>
  )
}
