'use client'
import { ProblemPage } from '@/components/shell/problem-page'
import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'

interface ErrorPageProps {
  readonly error: Error & { readonly digest?: string }
  readonly reset: () => void
}

export default function ErrorPage({ error, reset }: ErrorPageProps) {
  return (
    <main id="main" className="px-4 pb-10">
      <title>Page not shown · Elbowroom</title>
      <ProblemPage
        title="This page could not be shown"
        {...(error.digest === undefined ? {} : { reference: error.digest })}
        actions={
          <>
            <Button variant="primary" onClick={reset}>
              Try again
            </Button>
            <ButtonLink href="/teams">Open your desk</ButtonLink>
          </>
        }
      >
        <p role="alert">
          Something failed while the page was being made. What was stored before is unharmed; what you had typed into a form and not yet stored may have to
          be typed again. If it stays like this, give the reference to whoever runs this installation.
        </p>
      </ProblemPage>
    </main>
  )
}
