import type { Metadata } from 'next'
import { revisionHref } from '@/components/import/revision-href'
import { SourceDesk } from '@/components/sheet/source-desk'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { Fingerprint } from '@/components/ui/fingerprint'
import { getFindings } from '@/lib/catalog/get-findings'
import { visit } from '@/lib/http/visit'
import { reading } from '../../../../../../reading'

interface SourcePageProps {
  readonly params: Promise<{ team: string; model: string; revision: string }>
}

export async function generateMetadata({ params }: SourcePageProps): Promise<Metadata> {
  const { at } = await visit('getSource', await params)
  return { title: `Source of ${at.model.model.name}, revision ${at.revision.number}` }
}

export default async function SourcePage({ params }: SourcePageProps) {
  const { caller, at } = await visit('getSource', await params)
  const { body } = await getFindings(caller, reading(at))
  const team = caller.team.slug
  const { slug, name } = at.model.model
  const { number, fileName, fingerprint } = at.revision
  return (
    <Main>
      <PageHead
        title="Source"
        crumbs={[
          { label: 'Register', href: `/teams/${team}/models` },
          { label: name, href: `/teams/${team}/models/${slug}` },
          { label: `Revision ${number}`, href: revisionHref(team, slug, number) },
          { label: 'Source' },
        ]}
        status={<Fingerprint value={fingerprint} />}
        detail={fileName}
      />
      <SourceDesk path={{ team, model: slug, revision: number }} fileName={fileName} findings={body.items} />
    </Main>
  )
}
