'use client'
import clsx from 'clsx'
import { Num } from '@/components/ui/num'
import { RangeSlider } from '@/components/ui/range-slider'
import type { Chain } from '@/lib/kinematics/chain'
import { degFromRad, radFromDeg } from '@/lib/units'
import { wayLeft } from './bench-reading'

/** Way to a limit from which the number turns amber, rad. */
const NEAR_LIMIT = radFromDeg(7)

interface JointSlidersProps {
  readonly chain: Chain
  readonly q: readonly number[]
  readonly onJoint: (index: number, value: number) => void
}

/** One line a joint: its range, where it stands, and how much way is left. */
export function JointSliders({ chain, q, onJoint }: JointSlidersProps) {
  return (
    <ul>
      {chain.joints.map((joint, i) => {
        const value = q[i]!
        const left = wayLeft(joint, value)
        const isNear = left !== null && left < NEAR_LIMIT
        return (
          <li key={joint.name} className="grid grid-cols-[6.5rem_1fr_4rem] items-center gap-x-2.5 border-b border-hair px-5 py-0.5 tablet:grid-cols-[6.5rem_1fr_4rem_4.75rem]">
            <span className="num">{joint.name}</span>
            <RangeSlider
              aria-label={joint.name}
              aria-valuetext={`${degFromRad(value).toFixed(1)} degrees`}
              min={degFromRad(joint.lower ?? -Math.PI)}
              max={degFromRad(joint.upper ?? Math.PI)}
              step={0.1}
              value={degFromRad(value)}
              ends={joint.lower !== null}
              tick={0}
              onValue={(degrees) => onJoint(i, radFromDeg(degrees))}
            />
            <Num value={degFromRad(value)} digits={2} className={clsx('text-right', isNear && 'text-amber')} />
            <span className={clsx('label hidden tablet:block', isNear && 'text-amber')}>{left === null ? 'endless' : `${degFromRad(left).toFixed(1)} free`}</span>
          </li>
        )
      })}
    </ul>
  )
}
