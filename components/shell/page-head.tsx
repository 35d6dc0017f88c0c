import type { ReactNode } from 'react'
import { Breadcrumb, type Crumb } from './breadcrumb'

interface PageHeadProps {
  readonly title: string
  readonly crumbs?: readonly Crumb[]
  /** Stands beside the title: a status, a fingerprint. */
  readonly status?: ReactNode
  /** A few words in secondary ink. */
  readonly detail?: ReactNode
  readonly actions?: ReactNode
}

/** Where the reader is, what state it is in, and what can be done with it. */
export function PageHead({ title, crumbs, status, detail, actions }: PageHeadProps) {
  return (
    <div className="mb-4">
      {crumbs === undefined ? null : <Breadcrumb crumbs={crumbs} />}
      <div className="mt-1 flex flex-wrap items-center gap-x-4 gap-y-2">
        <h1 className="min-w-0 [overflow-wrap:anywhere]">{title}</h1>
        {status}
        {detail === undefined ? null : <span dir="auto" className="label min-w-0 [overflow-wrap:anywhere]">{detail}</span>}
        {actions === undefined ? null : (
          <div data-screen-only className="ml-auto flex flex-wrap gap-3">
            {actions}
          </div>
        )}
      </div>
    </div>
  )
}
