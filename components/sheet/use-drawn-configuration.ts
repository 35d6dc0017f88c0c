'use client'

import { useQueryState } from 'nuqs'
import { useCallback, useMemo } from 'react'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { addressOfConfiguration, configurationOfAddress } from './configuration-text'

/** The configuration that a sheet draws: what its address says (`q`, degrees and millimetres), else the resting one. */
export function useDrawnConfiguration(joints: readonly ChainJoint[], resting: readonly number[]) {
  const [text, setText] = useQueryState('q', { history: 'replace', scroll: false })
  const q = useMemo(() => (text === null ? null : configurationOfAddress(joints, text)) ?? resting, [joints, resting, text])
  const draw = useCallback(
    (next: readonly number[] | null) => void setText(next === null ? null : addressOfConfiguration(joints, next)),
    [joints, setText],
  )
  return { q, isResting: q === resting, draw }
}
