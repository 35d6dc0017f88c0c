'use client'

import { Button } from '@/components/ui/button'
import { TransitionDialog } from './transition-dialog'
import { TRANSITION_LOOKS } from './transition-looks'
import type { TransitionTo } from './transition-looks'

interface RevisionActionsProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly modelName: string
  /** What this person may do with the revision now. */
  readonly possible: readonly TransitionTo[]
  /** Why a release by this person will be refused. */
  readonly barred?: string | undefined
}

/** Order on the page: the act that leads on stands last, and is the one filled with the working colour. */
const ORDER: readonly TransitionTo[] = ['withdrawn', 'draft', 'in-review', 'released']

/** The changes of status that a person can make here. */
export function RevisionActions({ path, modelName, possible, barred }: RevisionActionsProps) {
  const acts = ORDER.filter((to) => possible.includes(to))
  const leading = acts.findLast((to) => (to === 'released' && barred === undefined) || to === 'in-review')
  return acts.map((to) => (
    <TransitionDialog
      key={to}
      path={path}
      to={to}
      {...(to === 'withdrawn' ? { confirmName: modelName } : {})}
      caution={to === 'released' ? barred : undefined}
      trigger={<Button variant={to === leading ? 'primary' : to === 'withdrawn' ? 'danger' : 'plain'}>{TRANSITION_LOOKS[to].label}</Button>}
    />
  ))
}
