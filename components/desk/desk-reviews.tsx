import { comparisonHref } from '@/components/comparison/comparison-href'
import { revisionHref } from '@/components/import/revision-href'
import { Fingerprint } from '@/components/ui/fingerprint'
import { TextLink } from '@/components/ui/text-link'
import { Timestamp } from '@/components/ui/timestamp'
import { DeskLine } from './desk-line'
import { DeskSection } from './desk-section'
import { waitingTime } from './waiting-time'
import { waitsFor } from './waits-for'
import { whatChanged } from './what-changed'

interface Review {
  readonly model: string
  readonly name: string
  readonly revision: number
  readonly fingerprint: string
  readonly independent: number
  readonly submittedBy: string
  readonly at: string
  /** What the reader had to do with it. */
  readonly own: readonly ('imported' | 'submitted')[]
  readonly releasers: readonly string[]
  readonly inForce?: { readonly revision: number; readonly independent: number; readonly sameNumbers: boolean }
}

interface DeskReviewsProps {
  readonly team: string
  readonly queue: { readonly reviews: readonly Review[]; readonly total: number }
  readonly mayRelease: boolean
  readonly fourEyes: boolean
  /** ms since the epoch. */
  readonly now: number
}

/** The review queue, the longest waiting first: for an approver an action, for everyone else where things stand. */
export function DeskReviews({ team, queue, mayRelease, fourEyes, now }: DeskReviewsProps) {
  const { reviews, total } = queue
  return (
    <DeskSection
      title={mayRelease ? 'Reviews to decide' : 'In review'}
      count={total}
      empty={mayRelease ? 'No revision waits for a decision. An engineer submits one from its sheet.' : 'No revision is in review.'}
    >
      {reviews.map((review) => (
        <ReviewLine key={`${review.model} ${review.revision}`} team={team} review={review} mayRelease={mayRelease} fourEyes={fourEyes} now={now} />
      ))}
      {total > reviews.length ? (
        <li className="px-2 py-2">
          The {reviews.length} longest waiting are shown. <TextLink href={`/teams/${team}/models?status=in-review`}>All models with a revision in review</TextLink>
        </li>
      ) : null}
    </DeskSection>
  )
}

interface ReviewLineProps extends Omit<DeskReviewsProps, 'queue'> {
  readonly review: Review
}

function ReviewLine({ team, review, mayRelease, fourEyes, now }: ReviewLineProps) {
  const { model, name, revision, own, inForce } = review
  const isBarred = own.length > 0 && fourEyes
  return (
    <DeskLine
      href={revisionHref(team, model, revision)}
      title={
        <>
          {mayRelease && !isBarred ? 'Decide on' : 'Look at'} <bdi>{name}</bdi>, revision {revision}
        </>
      }
      aside={
        <span className="text-soft">
          waits for <span className="num whitespace-nowrap">{waitingTime(review.at, now)}</span>
        </span>
      }
      more={
        <>
          <Fingerprint value={review.fingerprint} />
          {inForce === undefined ? null : (
            <TextLink href={comparisonHref(team, model, inForce.revision, revision)}>
              Compare with revision {inForce.revision}
              <span className="sr-only"> of {name}</span>
            </TextLink>
          )}
        </>
      }
    >
      {whatChanged(review)} Submitted by <bdi>{review.submittedBy}</bdi> at <Timestamp at={review.at} />; waits for <bdi>{waitsFor(review.releasers)}</bdi>.
      {isBarred && mayRelease ? ` You ${own.join(' and ')} it, so under four eyes somebody else releases it.` : ''}
    </DeskLine>
  )
}
