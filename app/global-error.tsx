'use client'
import './globals.css'
import { ProblemPage } from '@/components/shell/problem-page'
import { Button } from '@/components/ui/button'

interface GlobalErrorProps {
  readonly error: Error & { readonly digest?: string }
  readonly reset: () => void
}

/** Stands in for the layout itself when that fails, so it brings its own document. */
export default function GlobalError({ error, reset }: GlobalErrorProps) {
  return (
    <html lang="en">
      <body>
        <title>Page not shown · Elbowroom</title>
        <main className="px-4">
          <ProblemPage
            title="Elbowroom could not show this page"
            {...(error.digest === undefined ? {} : { reference: error.digest })}
            actions={
              <Button variant="primary" onClick={reset}>
                Try again
              </Button>
            }
          >
            <p role="alert">
              The service met a fault of its own, or its database cannot be reached. What was stored is unharmed. If it stays like this, give the reference
              to whoever runs this installation.
            </p>
          </ProblemPage>
        </main>
      </body>
    </html>
  )
}
