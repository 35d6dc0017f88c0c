import type { Metadata } from 'next'
import { Main } from '@/components/shell/main'
import { ProblemPage } from '@/components/shell/problem-page'
import { ButtonLink } from '@/components/ui/button-link'
import { PublicShell } from './public-shell'

export const metadata: Metadata = { title: 'Nothing here' }

export default function NotFound() {
  return (
    <PublicShell>
      <Main>
        <ProblemPage
          title="There is nothing at this address"
          actions={
            <>
              <ButtonLink href="/teams" variant="primary">
                Open your desk
              </ButtonLink>
              <ButtonLink href="/">Front page</ButtonLink>
            </>
          }
        >
          <p>
            The address may be mistyped, or it leads to something that your team does not have. Nothing was lost: models and revisions that were once
            released are never deleted.
          </p>
        </ProblemPage>
      </Main>
    </PublicShell>
  )
}
