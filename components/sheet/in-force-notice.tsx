import { Notice } from '@/components/shell/notice'
import { TextLink } from '@/components/ui/text-link'
import type { Status } from '@/lib/contract/scalars'

interface InForceNoticeProps {
  readonly status: Status
  readonly revision: number
  /** The revision in force; undefined when none is. */
  readonly released: number | undefined
  readonly href: (revision: number) => string
}

const TITLES: Record<Exclude<Status, 'released'>, string> = {
  draft: 'Draft',
  'in-review': 'In review',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
}

/** On a sheet that is not the one in force: says so, and leads to the one that is. */
export function InForceNotice({ status, revision, released, href }: InForceNoticeProps) {
  if (status === 'released') return null
  const isOut = status === 'withdrawn'
  return (
    <div className="mb-4">
      <Notice title={TITLES[status]} tone={isOut ? 'error' : status === 'superseded' ? 'warning' : 'plain'}>
        {isOut ? `Revision ${revision} must not be used any more. ` : status === 'superseded' ? `Revision ${revision} is no longer in force. ` : `Revision ${revision} is not released. `}
        {released === undefined ? (
          'No revision of this model is in force.'
        ) : (
          <>
            <TextLink inline href={href(released)}>
              Revision {released}
            </TextLink>{' '}
            is in force.
          </>
        )}
      </Notice>
    </div>
  )
}
