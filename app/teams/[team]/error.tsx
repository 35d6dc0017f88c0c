'use client'

import { useParams } from 'next/navigation'
import { Main } from '@/components/shell/main'
import { ProblemPage } from '@/components/shell/problem-page'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'

interface TeamErrorProps {
  readonly error: Error & { readonly digest?: string }
  readonly reset: () => void
}

export default function TeamError({ error, reset }: TeamErrorProps) {
  const { team } = useParams<{ team: string }>()
  return (
    <Main>
      <ProblemPage
        title="This page could not be shown"
        {...(error.digest === undefined ? {} : { reference: error.digest })}
        actions={
          <>
            <Button variant="primary" onClick={reset}>
              Try again
            </Button>
            <ButtonLink href={`/teams/${team}`}>To the desk</ButtonLink>
          </>
        }
      >
        Something failed while it was made. What is stored is not affected. If it stays so, give the reference below to whoever runs this installation.
      </ProblemPage>
    </Main>
  )
}
