import { ButtonLink } from '@/components/ui/button-link'
import { buttonLook } from '@/components/ui/button-look'
import { TextLink } from '@/components/ui/text-link'
import { Timestamp } from '@/components/ui/timestamp'
import type { ReferencePosesSummary } from '@/lib/contract/reference-poses'
import { checkVectorsHref, posesHref } from './evidence-href'
import { StatedQuantity } from './stated-quantity'
import { Verdict } from './verdict'

interface EvidencePanelProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  /** The newest ones, newest first. */
  readonly sets: readonly ReferencePosesSummary[]
  /** Whether there are more than these. */
  readonly hasMore: boolean
  readonly mayAdd: boolean
  readonly wasReleased: boolean
  /** Whether the team releases only what was measured. */
  readonly isRequired: boolean
}

/** What shows that the model is the real arm: measured poses held against it, and numbers for the controller to meet. */
export function EvidencePanel({ path, sets, hasMore, mayAdd, wasReleased, isRequired }: EvidencePanelProps) {
  return (
    <section aria-labelledby="sheet-evidence">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-evidence">Evidence</h2>
        {isRequired ? <span className="label">a release needs the newest reference poses to pass</span> : null}
      </div>
      {sets.length === 0 ? (
        <p className="mt-1 border-t border-ink py-1.5 text-soft">No reference poses yet: joint values and tool poses that were measured on the real arm show whether this is its model.</p>
      ) : (
        <ul aria-label="Reference poses" className="mt-1 border-t border-ink">
          {sets.map((set) => (
            <li key={set.number} className="grid grid-cols-[4rem_minmax(0,1fr)] items-baseline gap-x-4 border-b border-hair px-2 py-1.5">
              <Verdict passed={set.passed} />
              <div className="min-w-0">
                <span className="flex flex-wrap items-baseline gap-x-3">
                  <TextLink href={posesHref(path, set.number)}>
                    Reference poses <span className="num">{set.number}</span>
                  </TextLink>
                  <bdi className="break-words">{set.by}</bdi>
                  <Timestamp at={set.at} className="text-soft" />
                </span>
                <span className="block text-soft">
                  {set.poses} {set.poses === 1 ? 'pose' : 'poses'}
                  {set.failed === 0 ? '' : `, ${set.failed} beyond tolerance`}; largest error <StatedQuantity value={set.position.max} kind="length" units={set.units} /> and{' '}
                  <StatedQuantity value={set.orientation.max} kind="angle" units={set.units} />, tolerance <StatedQuantity value={set.tolerance.position} kind="length" units={set.units} /> and{' '}
                  <StatedQuantity value={set.tolerance.orientation} kind="angle" units={set.units} />
                </span>
              </div>
            </li>
          ))}
        </ul>
      )}
      {hasMore ? <p className="label mt-1">The newest {sets.length}; older ones are in the API.</p> : null}
      <p className="mt-2">
        {wasReleased
          ? '24 check vectors: configurations with the pose, Jacobian and singular values that the controller must answer as well.'
          : 'Check vectors come with the release.'}
      </p>
      <div data-screen-only className="mt-3 flex flex-wrap gap-3">
        {mayAdd ? <ButtonLink href={posesHref(path, 'new')}>Add reference poses</ButtonLink> : null}
        {wasReleased
          ? (['csv', 'json'] as const).map((format) => (
              <a key={format} href={checkVectorsHref(path, format)} download className={buttonLook('plain')}>
                Check vectors, {format.toUpperCase()}
              </a>
            ))
          : null}
      </div>
    </section>
  )
}
