import type { ReactNode } from 'react'
import { Logo } from './logo'

interface ProblemPageProps {
  /** What failed. */
  readonly title: string
  /** Whether anything was lost. */
  readonly children: ReactNode
  /** The next step. */
  readonly actions: ReactNode
  /** What whoever runs the installation can look up in the log. */
  readonly reference?: string
}

/** A page that could not be shown: what failed, whether anything was lost, and the next step. */
export function ProblemPage({ title, children, actions, reference }: ProblemPageProps) {
  return (
    <div className="frame mx-auto mt-6 w-full max-w-xl p-6">
      <Logo className="size-8 text-soft" />
      <h1 className="mt-3">{title}</h1>
      <div className="mt-2 max-w-prose text-15">{children}</div>
      <div className="mt-5 flex flex-wrap gap-3">{actions}</div>
      {reference === undefined ? null : (
        <p className="label mt-5">
          Reference <span className="num">{reference}</span>
        </p>
      )}
    </div>
  )
}
