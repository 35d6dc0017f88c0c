import { revisionHref } from '@/components/import/revision-href'
import { Timestamp } from '@/components/ui/timestamp'
import { DeskLine } from './desk-line'
import { DeskSection } from './desk-section'

interface DeskDraftsProps {
  readonly team: string
  readonly drafts: readonly { readonly model: string; readonly name: string; readonly revision: number; readonly importedAt: string }[]
}

/** The reader's own drafts: imported and not yet submitted. */
export function DeskDrafts({ team, drafts }: DeskDraftsProps) {
  return (
    <DeskSection title="Your drafts" count={drafts.length} empty="You have no draft. What you import starts as one.">
      {drafts.map((draft) => (
        <DeskLine
          key={`${draft.model} ${draft.revision}`}
          href={revisionHref(team, draft.model, draft.revision)}
          title={
            <>
              Check and submit <bdi>{draft.name}</bdi>, revision {draft.revision}
            </>
          }
          aside={<Timestamp at={draft.importedAt} className="text-soft" />}
        >
          Imported, not submitted for review.
        </DeskLine>
      ))}
    </DeskSection>
  )
}
