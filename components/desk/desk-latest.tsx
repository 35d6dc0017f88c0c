import { revisionHref } from '@/components/import/revision-href'
import { StatusMark } from '@/components/ui/status-mark'
import { Timestamp } from '@/components/ui/timestamp'
import type { Status } from '@/lib/contract/scalars'
import { DeskLine } from './desk-line'
import { DeskSection } from './desk-section'

interface Change {
  readonly model: string
  readonly name: string
  readonly revision: number
  readonly status: Status
  readonly by: string
  readonly at: string
  readonly comment?: string
}

/** What happened to the team's revisions lately, newest first. */
export function DeskLatest({ team, latest }: { readonly team: string; readonly latest: readonly Change[] }) {
  return (
    <DeskSection title="Latest changes" count={latest.length} showsCount={false} empty="Nothing has happened yet. Imports, reviews, releases and withdrawals appear here.">
      {latest.map((change, i) => (
        <DeskLine
          key={i}
          href={revisionHref(team, change.model, change.revision)}
          title={
            <>
              <bdi>{change.name}</bdi>, revision {change.revision}
            </>
          }
          aside={
            <span className="flex items-baseline gap-4">
              <StatusMark status={change.status} />
              <Timestamp at={change.at} className="text-soft" />
            </span>
          }
        >
          <bdi>{change.by}</bdi>
          {change.comment === undefined ? null : (
            <>
              : <bdi>{change.comment}</bdi>
            </>
          )}
        </DeskLine>
      ))}
    </DeskSection>
  )
}
