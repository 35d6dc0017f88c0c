'use client'
import clsx from 'clsx'
import Link from 'next/link'
import { usePathname } from 'next/navigation'
import { DOCS_PAGES } from './docs-pages'

/** The pages of the docs: down the side, or on a narrow screen in a line that scrolls. */
export function DocsNav() {
  const path = usePathname()
  return (
    <nav aria-label="Docs" data-screen-only className="scroll-x border-b border-hair px-4 desk:sticky desk:top-12 desk:h-fit desk:w-56 desk:shrink-0 desk:border-b-0 desk:px-6 desk:pt-6">
      <ol className="flex gap-5 desk:block">
        {DOCS_PAGES.map((page) => {
          const isHere = path === page.href
          const isCurrent = isHere || (page.covers !== undefined && path.startsWith(page.covers))
          return (
            <li key={page.href}>
              <Link
                href={page.href}
                aria-current={isHere ? 'page' : isCurrent ? 'true' : undefined}
                className={clsx(
                  'flex min-h-11 items-center border-b-2 font-medium whitespace-nowrap desk:min-h-8 desk:border-b-0 desk:border-l-2 desk:pl-3',
                  isCurrent ? 'border-blue' : 'border-transparent text-soft hover:text-ink desk:border-hair',
                )}
              >
                {page.title}
              </Link>
            </li>
          )
        })}
      </ol>
    </nav>
  )
}
