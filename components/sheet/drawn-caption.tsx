'use client'

import { useUnits } from '@/components/ui/units-context'
import type { Chain } from '@/lib/kinematics/chain'
import { textOfConfiguration } from './configuration-text'

/** What the drawing shows, in one sentence with its numbers. */
export function DrawnCaption({ chain, q }: { readonly chain: Chain; readonly q: readonly number[] }) {
  const { units } = useUnits()
  const slides = chain.joints.filter((joint) => joint.type === 'prismatic').length
  const unit = slides === 0 ? units.angle : slides === chain.joints.length ? units.length : `${units.angle}, slides in ${units.length}`
  return (
    <p className="label max-w-xl break-words">
      Chain <code className="mx-0.5 text-ink"><bdi>{chain.base}</bdi></code> to <code className="mx-0.5 text-ink"><bdi>{chain.tip}</bdi></code>.
      {chain.joints.length === 0 ? null : (
        // On the screen the field below says so.
        <span className="hidden print:inline">
          {' '}
          Drawn at <span className="num">{textOfConfiguration(chain.joints, q, units).replaceAll('-', '−')}</span> {unit}.
        </span>
      )}
    </p>
  )
}
