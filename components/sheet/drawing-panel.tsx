'use client'

import { ArmDrawing } from '@/components/drawing/arm-drawing'
import { DrawingFrame } from '@/components/drawing/drawing-frame'
import { Caution } from '@/components/shell/caution'
import type { Chain } from '@/lib/kinematics/chain'
import { ConfigurationField } from './configuration-field'
import { DrawnCaption } from './drawn-caption'
import { OutsideLimits } from './outside-limits'
import { useDrawnConfiguration } from './use-drawn-configuration'

interface DrawingPanelProps {
  readonly chain: Chain
  readonly resting: readonly number[]
  readonly name: string
}

/** The drawing field of a sheet: the chain at a configuration that can be typed over, and the caution under it. */
export function DrawingPanel({ chain, resting, name }: DrawingPanelProps) {
  const { q, isResting, draw } = useDrawnConfiguration(chain.joints, resting)
  const label = `${name}, drawn from ${chain.base} to ${chain.tip}; the joints and their limits stand in the table beside it.`
  return (
    <DrawingFrame
      className="h-full"
      foot={
        <>
          <DrawnCaption chain={chain} q={q} />
          <OutsideLimits chain={chain} q={q} />
          <ConfigurationField joints={chain.joints} q={q} isResting={isResting} onDraw={draw} />
          <Caution className="mt-3 max-w-xl" />
        </>
      }
    >
      <ArmDrawing chain={chain} q={q} label={label} />
    </DrawingFrame>
  )
}
