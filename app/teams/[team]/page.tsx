import type { Metadata } from 'next'
import { DeskDrafts } from '@/components/desk/desk-drafts'
import { DeskKeys } from '@/components/desk/desk-keys'
import { DeskLatest } from '@/components/desk/desk-latest'
import { DeskReviews } from '@/components/desk/desk-reviews'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { ButtonLink } from '@/components/ui/button-link'
import { EmptyState } from '@/components/ui/empty-state'
import { may } from '@/lib/access/permissions'
import { includesRole } from '@/lib/access/roles'
import { visit } from '@/lib/http/visit'
import { getDesk } from '@/lib/teams/get-desk'
import { requestTime } from '../request-time'

export const metadata: Metadata = { title: 'Desk' }

export default async function DeskPage({ params }: { readonly params: Promise<{ team: string }> }) {
  const { team } = await params
  const { caller } = await visit('listModels', { team })
  const desk = await getDesk(caller)
  const mayImport = may(caller, 'createModel')
  const { models, released } = desk.counts
  const importLink = mayImport ? (
    <ButtonLink href={`/teams/${team}/models/import`} variant="primary">
      Import a URDF
    </ButtonLink>
  ) : undefined
  return (
    <Main>
      <PageHead
        title="Desk"
        detail={`${caller.team.name}: ${models} ${models === 1 ? 'model' : 'models'}, ${released} with a revision in force. You are ${caller.role}.`}
        actions={models === 0 ? undefined : importLink}
      />
      {models === 0 ? (
        <EmptyState title="Nothing waits, because nothing is here yet" action={importLink}>
          The work begins with a supplier’s URDF. It is checked, imported as a draft, reviewed by a second person and released; from then on its numbers
          can be asked for by name.
        </EmptyState>
      ) : (
        <div className="grid items-start gap-x-8 gap-y-8 desk:grid-cols-2">
          <div className="grid gap-8">
            <DeskReviews team={team} queue={desk.queue} now={requestTime()} mayRelease={includesRole(caller.role, 'approver')} fourEyes={caller.team.fourEyes} />
            {mayImport ? <DeskDrafts team={team} drafts={desk.drafts} /> : null}
            {may(caller, 'listKeys') ? <DeskKeys team={team} keys={desk.keys} now={requestTime()} /> : null}
          </div>
          <DeskLatest team={team} latest={desk.latest} />
        </div>
      )}
    </Main>
  )
}
