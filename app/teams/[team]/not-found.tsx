'use client'

import { useParams } from 'next/navigation'
import { Main } from '@/components/shell/main'
import { ProblemPage } from '@/components/shell/problem-page'
import { ButtonLink } from '@/components/ui/button-link'

export default function TeamNotFound() {
  const { team } = useParams<{ team: string }>()
  return (
    <Main>
      <ProblemPage
        title="Nothing at this address"
        actions={
          <>
            <ButtonLink href={`/teams/${team}/models`} variant="primary">
              To the register
            </ButtonLink>
            <ButtonLink href={`/teams/${team}`}>To the desk</ButtonLink>
          </>
        }
      >
        This team has no page, model or revision of that name, or no revision is in force where the address says “released”. Names are looked up in the
        register.
      </ProblemPage>
    </Main>
  )
}
