import { Timestamp } from '@/components/ui/timestamp'
import type { KeyUse } from '@/lib/contract/used-by'

const STATES = { active: '', expired: 'expired', revoked: 'revoked' } as const

interface UsedByPanelProps {
  /** The latest first. */
  readonly uses: readonly KeyUse[]
  readonly hasMore: boolean
}

/** Which keys have called the model and when they last did, so that nobody is surprised when it changes. */
export function UsedByPanel({ uses, hasMore }: UsedByPanelProps) {
  return (
    <section aria-labelledby="sheet-used-by">
      <h2 id="sheet-used-by">Used by</h2>
      {uses.length === 0 ? (
        <p className="mt-1 border-t border-ink py-1.5 text-soft">No key has called this model yet.</p>
      ) : (
        <ul aria-label="Keys that called the model" className="mt-1 border-t border-ink">
          {uses.map(({ key, revision, lastUsedAt }) => (
            <li key={`${key.prefix} ${revision}`} className="grid grid-cols-[6.5rem_minmax(0,1fr)] items-baseline gap-x-4 border-b border-hair px-2 py-1.5">
              <span className="whitespace-nowrap">
                Revision <span className="num">{revision}</span>
              </span>
              <span className="flex min-w-0 flex-wrap items-baseline gap-x-3">
                <bdi className="break-words">{key.label}</bdi>
                {STATES[key.state] === '' ? null : <span className="label">{STATES[key.state]}</span>}
                <Timestamp at={lastUsedAt} className="text-soft" />
              </span>
            </li>
          ))}
        </ul>
      )}
      {hasMore ? <p className="label mt-1">The latest {uses.length}; more are in the API.</p> : null}
    </section>
  )
}
