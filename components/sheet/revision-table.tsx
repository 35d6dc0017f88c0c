import { StatusMark } from '@/components/ui/status-mark'
import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { TextLink } from '@/components/ui/text-link'
import { Timestamp } from '@/components/ui/timestamp'
import { revisionHref } from '@/components/import/revision-href'
import type { RevisionSummary } from '@/lib/contract/model'

interface RevisionTableProps {
  readonly team: string
  /** Newest first. */
  readonly revisions: readonly RevisionSummary[]
  readonly current: number
  /** How many the model has, when the list is shorter. */
  readonly total: number
}

/** The revision table above the title block: what changed, by whom, when, and what became of it. Each line leads to its sheet. */
export function RevisionTable({ team, revisions, current, total }: RevisionTableProps) {
  return (
    <section aria-label="Revisions">
      <Table caption="Revisions, newest first">
        <thead>
          <tr>
            <Th>Rev</Th>
            <Th>Change</Th>
            <Th>By</Th>
            <Th>Date</Th>
            <Th>Status</Th>
          </tr>
        </thead>
        <tbody>
          {revisions.map(({ revision, note, importedBy, importedAt, status, model }) => (
            <tr key={revision} aria-current={revision === current || undefined} className={revision === current ? 'bg-wash' : undefined}>
              <RowHead className="num">
                {revision === current ? (
                  <strong>{revision}</strong>
                ) : (
                  <TextLink href={revisionHref(team, model.slug, revision)} className="-my-2 inline-block px-1 py-2">
                    {revision}
                  </TextLink>
                )}
              </RowHead>
              <Td className="min-w-28">
                {note === undefined ? <span className="label">{revision === 1 ? 'first import' : 'no note'}</span> : <Clamped text={note} />}
              </Td>
              <Td className="max-w-28 break-words">
                <bdi>{importedBy}</bdi>
              </Td>
              <Td>
                <Timestamp at={importedAt} dayOnly />
              </Td>
              <Td>
                <StatusMark status={status} />
              </Td>
            </tr>
          ))}
        </tbody>
      </Table>
      {revisions.length < total ? (
        <p className="label mt-1">
          The newest {revisions.length} of {total} revisions.
        </p>
      ) : null}
    </section>
  )
}

const Clamped = ({ text }: { readonly text: string }) => (
  <span data-excerpt className="line-clamp-2 [overflow-wrap:anywhere] print:line-clamp-none" title={text} dir="auto">
    {text}
  </span>
)
