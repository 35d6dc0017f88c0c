'use client'
import clsx from 'clsx'
import { useUnits, type UnitPair } from './units-context'

const PAIRS: readonly { pair: UnitPair; text: string; spoken: string }[] = [
  { pair: 'deg-mm', text: 'deg · mm', spoken: 'degrees and millimetres' },
  { pair: 'rad-m', text: 'rad · m', spoken: 'radians and metres' },
]

/** Chooses the units of every number on the page; remembered. */
export function UnitSwitch() {
  const { pair, choose } = useUnits()
  return (
    <span role="group" aria-label="Units" className="inline-flex gap-2">
      {PAIRS.map((option) => (
        <button
          key={option.pair}
          type="button"
          aria-pressed={option.pair === pair}
          onClick={() => choose(option.pair)}
          className={clsx(
            'label min-h-6 px-1 pointer-coarse:min-h-11',
            option.pair === pair ? 'text-ink underline decoration-2 underline-offset-4' : 'text-blue hover:underline',
          )}
        >
          <span aria-hidden>{option.text}</span>
          <span className="sr-only">{option.spoken}</span>
        </button>
      ))}
    </span>
  )
}
