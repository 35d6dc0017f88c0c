import type { Metadata } from 'next'
import { questionOf } from '@/components/register/question'
import { Register } from '@/components/register/register'
import { Main } from '@/components/shell/main'
import { PageHead } from '@/components/shell/page-head'
import { ButtonLink } from '@/components/ui/button-link'
import { may } from '@/lib/access/permissions'
import { listModels } from '@/lib/catalog/list-models'
import { visit } from '@/lib/http/visit'
import { reading } from '../../reading'

export const metadata: Metadata = { title: 'Register' }

interface RegisterPageProps {
  readonly params: Promise<{ team: string }>
  readonly searchParams: Promise<Record<string, string | string[] | undefined>>
}

export default async function RegisterPage({ params, searchParams }: RegisterPageProps) {
  const { team } = await params
  const { caller, at } = await visit('listModels', { team })
  const question = questionOf(await searchParams)
  const { body } = await listModels(caller, reading(at, { ...question, limit: 100 }))
  const mayImport = may(caller, 'createModel')
  return (
    <Main>
      <PageHead
        title="Register"
        detail={`the models of ${caller.team.name}`}
        actions={
          mayImport ? (
            <ButtonLink href={`/teams/${team}/models/import`} variant="primary">
              Import a URDF
            </ButtonLink>
          ) : undefined
        }
      />
      <Register team={team} start={{ question, page: body }} mayImport={mayImport} />
    </Main>
  )
}
