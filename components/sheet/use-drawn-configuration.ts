'use client'

import { useQueryState } from 'nuqs'
import { useCallback, useMemo } from 'react'
import type { Chain } from '@/lib/kinematics/chain'
import { addressOfConfiguration, configurationOfAddress } from './configuration-text'

/** The configuration that a sheet draws: what its address says (`q`, degrees and millimetres), else the resting one. */
export function useDrawnConfiguration(chain: Chain, resting: readonly number[]) {
  const [text, setText] = useQueryState('q', { history: 'replace', scroll: false })
  const q = useMemo(() => (text === null ? null : configurationOfAddress(chain.joints, text)) ?? resting, [chain, resting, text])
  const draw = useCallback(
    (next: readonly number[] | null) => void setText(next === null ? null : addressOfConfiguration(chain.joints, next)),
    [chain, setText],
  )
  return { q, isResting: q === resting, draw }
}
