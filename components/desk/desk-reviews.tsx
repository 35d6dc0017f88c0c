import { revisionHref } from '@/components/import/revision-href'
import { Timestamp } from '@/components/ui/timestamp'
import { DeskLine } from './desk-line'
import { DeskSection } from './desk-section'

interface Review {
  readonly model: string
  readonly name: string
  readonly revision: number
  readonly submittedBy: string
  readonly at: string
  /** The reader imported or submitted it. */
  readonly own: boolean
}

interface DeskReviewsProps {
  readonly team: string
  readonly reviews: readonly Review[]
  readonly mayRelease: boolean
  readonly fourEyes: boolean
}

/** Revisions in review: for an approver an action, for everyone else where things stand. */
export function DeskReviews({ team, reviews, mayRelease, fourEyes }: DeskReviewsProps) {
  return (
    <DeskSection
      title={mayRelease ? 'Reviews to decide' : 'In review'}
      count={reviews.length}
      empty={mayRelease ? 'No revision waits for a decision. An engineer submits one from its sheet.' : 'No revision is in review.'}
    >
      {reviews.map((review) => {
        const isBarred = review.own && fourEyes
        const verb = mayRelease && !isBarred ? 'Decide on' : 'Look at'
        return (
          <DeskLine
            key={`${review.model} ${review.revision}`}
            href={revisionHref(team, review.model, review.revision)}
            title={`${verb} ${review.name}, revision ${review.revision}`}
            aside={<Timestamp at={review.at} className="text-soft" />}
          >
            Submitted by <bdi>{review.submittedBy}</bdi>.
            {isBarred && mayRelease ? ' You imported or submitted it, so under four eyes somebody else releases it.' : ''}
          </DeskLine>
        )
      })}
    </DeskSection>
  )
}
