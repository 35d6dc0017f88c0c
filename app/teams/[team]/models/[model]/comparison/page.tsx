import type { Metadata } from 'next'
import { ChangeTable } from '@/components/comparison/change-table'
import { ComparisonChooser } from '@/components/comparison/comparison-chooser'
import { comparisonHref } from '@/components/comparison/comparison-href'
import { ComparisonTitleBlock } from '@/components/comparison/comparison-title-block'
import { EffectSentence } from '@/components/comparison/effect-sentence'
import { EffectTable } from '@/components/comparison/effect-table'
import { HeldJoints } from '@/components/comparison/held-joints'
import { LimitChanges } from '@/components/comparison/limit-changes'
import { WorstConfigurations } from '@/components/comparison/worst-configurations'
import { revisionHref } from '@/components/import/revision-href'
import { PrintButton } from '@/components/sheet/print-button'
import { PrintStyle } from '@/components/sheet/print-style'
import { Main } from '@/components/shell/main'
import { Notice } from '@/components/shell/notice'
import { PageHead } from '@/components/shell/page-head'
import { ButtonLink } from '@/components/ui/button-link'
import { UnitSwitch } from '@/components/ui/unit-switch'
import { listRevisions } from '@/lib/catalog/list-revisions'
import { visit } from '@/lib/http/visit'
import { reading } from '../../../../reading'
import { compared } from './compared'

interface ComparisonPageProps {
  readonly params: Promise<{ team: string; model: string }>
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>
}

export async function generateMetadata({ params }: ComparisonPageProps): Promise<Metadata> {
  const { at } = await visit('compareRevisions', await params)
  return { title: `Comparison of revisions of ${at.model.model.name}` }
}

const MOST_REVISIONS = 200

export default async function ComparisonPage({ params, searchParams }: ComparisonPageProps) {
  const { caller, at } = await visit('compareRevisions', await params)
  const [{ body: revisions }, found] = await Promise.all([listRevisions(caller, reading(at, { limit: MOST_REVISIONS })), compared(caller, at, await searchParams)])
  const team = caller.team.slug
  const { slug, name } = at.model.model
  const { asked, comparison } = found
  const href = (revision: number) => revisionHref(team, slug, revision)
  const chain = { base: asked.base, tip: asked.tip }

  return (
    <Main>
      <PrintStyle />
      <PageHead
        title={`Revision ${asked.from} to ${asked.to}`}
        crumbs={[{ label: 'Register', href: `/teams/${team}/models` }, { label: name, href: `/teams/${team}/models/${slug}` }, { label: 'Comparison' }]}
        detail={name}
        actions={
          <>
            <PrintButton />
            <ButtonLink href={comparisonHref(team, slug, asked.to, asked.from, chain)}>Swap</ButtonLink>
          </>
        }
      />
      <ComparisonChooser action={`/teams/${team}/models/${slug}/comparison`} revisions={revisions.items} from={asked.from} to={asked.to} base={asked.base ?? ''} tip={asked.tip ?? ''} />
      {comparison === null ? (
        <Notice title="These cannot be compared" tone="error">
          {found.refusal}
        </Notice>
      ) : (
        <div className="frame">
          <div className="grid desk:grid-cols-[minmax(0,1fr)_minmax(0,34.5rem)] print:grid-cols-[minmax(0,1fr)_minmax(0,26rem)]">
            <div className="min-w-0 space-y-5 px-4 py-4 tablet:px-5">
              <section aria-labelledby="comparison-effect" className="space-y-3">
                <div className="flex flex-wrap items-baseline justify-between gap-x-4">
                  <h2 id="comparison-effect">Effect at the tip</h2>
                  <span data-screen-only>
                    <UnitSwitch />
                  </span>
                </div>
                <EffectSentence comparison={comparison} />
                {comparison.sameKinematics ? null : <EffectTable effect={comparison.effect} />}
              </section>
              <HeldJoints comparison={comparison} />
              <LimitChanges limits={comparison.limits} />
            </div>
            <div className="flex min-w-0 flex-col border-t border-ink desk:border-t-0 desk:border-l print:border-t-0 print:border-l">
              <div className="px-4 py-4 tablet:px-5">
                <WorstConfigurations comparison={comparison} moves={found.moves} turns={found.turns} />
              </div>
              <div className="mt-auto">
                <ComparisonTitleBlock modelName={name} comparison={comparison} href={href} />
              </div>
            </div>
          </div>
          <div className="border-t border-ink px-4 py-4 tablet:px-5">
            <ChangeTable comparison={comparison} />
          </div>
        </div>
      )}
    </Main>
  )
}
