'use client'
import { RangeSlider } from '@/components/ui/range-slider'
import { mmFromM } from '@/lib/units'
import { MOST_STEPS, type SelfMotionPoint } from './self-motion'

interface SelfMotionControlProps {
  readonly point: SelfMotionPoint
  /** How far the tool is from where it was, m. */
  readonly drift: number
  readonly onStep: (step: number) => void
}

/** Moves the arm along its null space, and shows that the tool stands still. */
export function SelfMotionControl({ point: { step, stop }, drift, onStep }: SelfMotionControlProps) {
  const sign = step < 0 ? '−' : step > 0 ? '+' : ''
  return (
    <div className="border-t border-hair px-5 pt-2 pb-3">
      <div className="flex flex-wrap items-center gap-x-4">
        <label htmlFor="self-motion" className="font-semibold">
          Self-motion
        </label>
        <RangeSlider
          id="self-motion"
          className="min-w-40 grow"
          min={-MOST_STEPS}
          max={MOST_STEPS}
          step={1}
          tick={0}
          value={step}
          aria-valuetext={`${step} degrees of joint travel`}
          onValue={onStep}
        />
        <span className="num w-12 text-right">
          {sign}
          {Math.abs(step)}°
        </span>
        <span className="label w-32">
          tool drift <span className="num text-ink">{mmFromM(drift).toFixed(3)} mm</span>
        </span>
      </div>
      <p className="label min-h-5" role="status">
        {stop === null ? 'Moves the elbow along the null space; the tool stands still.' : `It goes no further: ${stop}.`}
      </p>
    </div>
  )
}
