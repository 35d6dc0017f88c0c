'use client'

import { CopyButton } from '@/components/ui/copy-button'
import { TextLink } from '@/components/ui/text-link'
import { useUnits } from '@/components/ui/units-context'
import type { ChainJoint } from '@/lib/kinematics/chain'
import { forwardKinematicsCurl } from './request-text'
import { useDrawnConfiguration } from './use-drawn-configuration'

interface RequestPanelProps {
  readonly joints: readonly ChainJoint[]
  /** Left out of the request when it is the default one. */
  readonly chain?: { readonly base: string; readonly tip: string } | undefined
  readonly resting: readonly number[]
  readonly site: string
  readonly path: string
  readonly fingerprint: string
}

/** The request that gives the pose of the tip in the configuration drawn, ready to be pasted. */
export function RequestPanel({ joints, chain, resting, site, path, fingerprint }: RequestPanelProps) {
  const { units } = useUnits()
  const { q } = useDrawnConfiguration(joints, resting)
  const text = forwardKinematicsCurl({ site, path, fingerprint, chain, joints, q, units })
  return (
    <section aria-labelledby="sheet-request" data-screen-only>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-request">Ask this revision</h2>
        <CopyButton text={text} what="request" />
      </div>
      <p className="mt-1 text-soft">
        Where the tip is at the configuration drawn, in the units chosen. With If-Match only this fingerprint answers. A key comes from an
        administrator of the team; see{' '}
        <TextLink inline href="/docs">
          the first call
        </TextLink>
        .
      </p>
      <pre className="mt-2 overflow-x-auto border border-hair bg-sheet p-3 text-12" tabIndex={0} role="region" aria-label="Request">
        <code>{text}</code>
      </pre>
    </section>
  )
}
