import type { Metadata } from 'next'
import { PosesForm } from '@/components/evidence/poses-form'
import { revisionHref } from '@/components/import/revision-href'
import { RolePanel } from '@/components/desk/role-panel'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { Fingerprint } from '@/components/ui/fingerprint'
import { TextLink } from '@/components/ui/text-link'
import { visit } from '@/lib/http/visit'
import { drawnChain } from '../../drawn-chain'

interface NewPosesPageProps {
  readonly params: Promise<{ team: string; model: string; revision: string }>
}

export async function generateMetadata({ params }: NewPosesPageProps): Promise<Metadata> {
  const { at } = await visit('addReferencePoses', await params)
  return { title: `Add reference poses to ${at.model.model.name}, revision ${at.revision.number}` }
}

export default async function NewPosesPage({ params }: NewPosesPageProps) {
  const { caller, at, allowed, requiredRole } = await visit('addReferencePoses', await params)
  const { chain } = await drawnChain(caller, at, {})
  const team = caller.team.slug
  const { slug, name } = at.model.model
  const { number, fingerprint } = at.revision
  if (!allowed) {
    return (
      <Main>
        <RolePanel team={team} role={caller.role} requiredRole={requiredRole} />
      </Main>
    )
  }
  return (
    <Main>
      <PageHead
        title="Add reference poses"
        crumbs={[
          { label: 'Register', href: `/teams/${team}/models` },
          { label: name, href: `/teams/${team}/models/${slug}` },
          { label: `Revision ${number}`, href: revisionHref(team, slug, number) },
          { label: 'Add reference poses' },
        ]}
        status={<Fingerprint value={fingerprint} />}
      />
      <p className="mb-4 max-w-prose text-soft">
        Joint values read from the controller, and the tool pose measured there. The model&rsquo;s own poses are held against them, and what comes out is kept with the
        revision.{' '}
        <TextLink inline href="/docs/evidence">
          How to measure and write them
        </TextLink>
        .
      </p>
      <PosesForm path={{ team, model: slug, revision: number }} joints={chain?.joints.map((joint) => joint.name) ?? []} />
    </Main>
  )
}
