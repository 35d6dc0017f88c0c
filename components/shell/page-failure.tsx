import { Button } from '@/components/ui/button'
import { ButtonLink } from '@/components/ui/button-link'
import { ProblemPage } from './problem-page'

/** What the framework hands to an error page. */
export interface FailedPageProps {
  readonly error: Error & { readonly digest?: string }
  readonly reset: () => void
}

/** What stands in place of a page that failed while it was made. desk: where to go on. */
export function PageFailure({ error, reset, desk }: FailedPageProps & { readonly desk: string }) {
  return (
    <ProblemPage
      title="This page could not be shown"
      {...(error.digest === undefined ? {} : { reference: error.digest })}
      actions={
        <>
          <Button variant="primary" onClick={reset}>
            Try again
          </Button>
          <ButtonLink href={desk}>Open your desk</ButtonLink>
        </>
      }
    >
      <p role="alert">
        Something failed while the page was being made. What was stored before is unharmed; what you had typed into a form and not yet stored may have to be
        typed again. If it stays like this, give the reference to whoever runs this installation.
      </p>
    </ProblemPage>
  )
}
