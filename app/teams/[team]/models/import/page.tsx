import type { Metadata } from 'next'
import { RolePanel } from '@/components/desk/role-panel'
import { ImportDesk } from '@/components/import/import-desk'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { visit } from '@/lib/http/visit'

export const metadata: Metadata = { title: 'Import' }

interface ImportPageProps {
  readonly params: Promise<{ team: string }>
  readonly searchParams: Promise<{ model?: string | string[] }>
}

export default async function ImportPage({ params, searchParams }: ImportPageProps) {
  const { team } = await params
  const { model } = await searchParams
  const { caller, allowed, requiredRole } = await visit('checkImport', { team })
  return (
    <Main>
      {allowed ? (
        <>
          <PageHead
            title="Import"
            crumbs={[{ label: 'Register', href: `/teams/${team}/models` }, { label: 'Import' }]}
            detail="check a URDF, then store it as a model or a further revision"
          />
          <ImportDesk team={team} model={typeof model === 'string' ? model : null} />
        </>
      ) : (
        <RolePanel team={team} role={caller.role} requiredRole={requiredRole} />
      )}
    </Main>
  )
}
