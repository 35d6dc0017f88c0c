import type { Metadata } from 'next'
import { PosesFacts } from '@/components/evidence/poses-facts'
import { PosesOutcome } from '@/components/evidence/poses-outcome'
import { PosesTable } from '@/components/evidence/poses-table'
import { revisionHref } from '@/components/import/revision-href'
import { PrintButton } from '@/components/sheet/print-button'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { Fingerprint } from '@/components/ui/fingerprint'
import { Timestamp } from '@/components/ui/timestamp'
import { getReferencePoses } from '@/lib/compute/get-reference-poses'
import type { ReferencePoses } from '@/lib/contract/reference-poses'
import { visit } from '@/lib/http/visit'
import { reading } from '../../../../../../../reading'
import { rowHrefs } from './row-hrefs'

interface PosesPageProps {
  readonly params: Promise<{ team: string; model: string; revision: string; set: string }>
}

export async function generateMetadata({ params }: PosesPageProps): Promise<Metadata> {
  const { at } = await visit('getReferencePoses', await params)
  return { title: `Reference poses ${at.set.number} of ${at.model.model.name}, revision ${at.revision.number}` }
}

export default async function PosesPage({ params }: PosesPageProps) {
  const { caller, at } = await visit('getReferencePoses', await params)
  const { body } = await getReferencePoses(caller, reading(at))
  const set = body as ReferencePoses
  const team = caller.team.slug
  const { slug, name } = at.model.model
  const { number } = at.revision
  const sheet = revisionHref(team, slug, number)
  return (
    <Main>
      <PageHead
        title={`Reference poses ${set.number}`}
        crumbs={[
          { label: 'Register', href: `/teams/${team}/models` },
          { label: name, href: `/teams/${team}/models/${slug}` },
          { label: `Revision ${number}`, href: sheet },
          { label: `Reference poses ${set.number}` },
        ]}
        status={<Fingerprint value={set.fingerprint} />}
        actions={<PrintButton />}
      />
      <div className="space-y-6">
        <PosesOutcome outcome={set} />
        <p className="flex flex-wrap gap-x-3">
          <bdi className="break-words">{set.by}</bdi>
          <Timestamp at={set.at} className="text-soft" />
        </p>
        {set.note === undefined ? null : (
          <p className="max-w-prose break-words whitespace-pre-line" dir="auto">
            {set.note}
          </p>
        )}
        <PosesFacts statement={set} />
        <PosesTable result={set} hrefs={rowHrefs(sheet, set)} />
        <details data-screen-only>
          <summary className="font-semibold">The table as it was sent</summary>
          <pre className="mt-2 max-h-96 overflow-auto border border-hair bg-sheet p-3 text-12" tabIndex={0} role="region" aria-label="Table as sent">
            <code>{set.table}</code>
          </pre>
        </details>
      </div>
    </Main>
  )
}
