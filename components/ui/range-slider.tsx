'use client'
import clsx from 'clsx'
import type { ComponentProps } from 'react'

interface RangeSliderProps extends Omit<ComponentProps<'input'>, 'type' | 'value' | 'onChange' | 'min' | 'max'> {
  readonly value: number
  readonly min: number
  readonly max: number
  readonly onValue: (value: number) => void
  /** Draws the two ends of the way; leave out where it has none. */
  readonly ends?: boolean
  /** Where the middle line stands, in the unit of value. */
  readonly tick?: number
}

/** A value moved along a line, drawn as a dimension between two ticks; a native slider, so every key works. */
export function RangeSlider({ value, min, max, onValue, ends = true, tick, className, ...rest }: RangeSliderProps) {
  const place = tick === undefined || max <= min ? undefined : (tick - min) / (max - min)
  return (
    <span className={clsx('slider relative block h-6', className)}>
      <span aria-hidden className={clsx('absolute inset-x-[5px] top-1.5 bottom-1.5', ends && 'border-x border-soft')}>
        <span className="absolute inset-x-0 top-1/2 border-t border-soft" />
        {place === undefined || place < 0 || place > 1 ? null : (
          <span className="absolute inset-y-0 border-l border-soft" style={{ left: `${place * 100}%` }} />
        )}
      </span>
      <input
        {...rest}
        type="range"
        min={min}
        max={max}
        value={value}
        onChange={(event) => onValue(event.target.valueAsNumber)}
        className="relative h-full w-full cursor-pointer appearance-none bg-transparent"
      />
    </span>
  )
}
