import Link from 'next/link'
import type { ReactNode } from 'react'
import { Main } from '@/components/shell/main'
import { DOCS_PAGES, type DocsPageEntry } from './docs-pages'

interface DocsPageProps {
  readonly title: string
  /** One sentence under the title. */
  readonly lead?: ReactNode
  /** Where this page stands in the reading order; left out on a page of a list. */
  readonly href?: string
  /** Above the title: the way back to the list. */
  readonly above?: ReactNode
  readonly children: ReactNode
}

/** A page of the docs: title, text, and the pages before and after it. */
export function DocsPage({ title, lead, href, above, children }: DocsPageProps) {
  return (
    <Main className="min-w-0 pt-5">
      {above}
      <h1>{title}</h1>
      {lead === undefined ? null : <p className="mt-1 max-w-[44rem] text-15 text-soft">{lead}</p>}
      <div className="prose">{children}</div>
      {href === undefined ? null : <Neighbours href={href} />}
    </Main>
  )
}

/** The pages before and after one, at the foot of it. */
export function Neighbours({ href }: { readonly href: string }) {
  const place = DOCS_PAGES.findIndex((page) => page.href === href)
  const before = DOCS_PAGES[place - 1]
  const after = DOCS_PAGES[place + 1]
  const step = (page: DocsPageEntry | undefined, word: string, align: string) =>
    page === undefined ? (
      <span />
    ) : (
      <Link href={page.href} className={`group block min-h-11 ${align}`}>
        <span className="label block">{word}</span>
        <span className="font-semibold text-blue group-hover:underline">{page.title}</span>
      </Link>
    )
  return (
    <nav aria-label="Previous and next page" data-screen-only className="mt-10 flex max-w-[44rem] justify-between gap-6 border-t border-ink pt-3">
      {step(before, 'Before', 'text-left')}
      {step(after, 'Next', 'text-right')}
    </nav>
  )
}
