import type { Metadata } from 'next'
import { RolePanel } from '@/components/desk/role-panel'
import { Keys } from '@/components/keys/keys'
import { NewKeyDialog } from '@/components/keys/new-key-dialog'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { siteUrl } from '@/lib/env'
import { visit } from '@/lib/http/visit'
import { listKeys } from '@/lib/keys/list-keys'
import { reading } from '../../reading'
import { requestTime } from '../../request-time'
import { findTrialModel } from './trial-model'

export const metadata: Metadata = { title: 'Keys' }

export default async function KeysPage({ params }: { readonly params: Promise<{ team: string }> }) {
  const { team } = await params
  const { caller, at, allowed, requiredRole } = await visit('listKeys', { team })
  if (!allowed) {
    return (
      <Main>
        <RolePanel team={team} role={caller.role} requiredRole={requiredRole} />
      </Main>
    )
  }
  const [{ body }, trialModel] = await Promise.all([listKeys(caller, reading(at, { limit: 200 })), findTrialModel(caller, team)])
  return (
    <Main>
      <PageHead
        title="Keys"
        detail={`for gateways and scripts of ${caller.team.name}`}
        actions={<NewKeyDialog team={team} site={siteUrl()} trialModel={trialModel} />}
      />
      <Keys team={team} initial={body.nextCursor === undefined ? body.items : undefined} now={requestTime()} />
    </Main>
  )
}
