import Link from 'next/link'

export interface Crumb {
  readonly label: string
  /** Left out for the page itself. */
  readonly href?: string
}

/** The way from the register down to this page. */
export function Breadcrumb({ crumbs }: { readonly crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Breadcrumb" data-screen-only>
      <ol className="flex flex-wrap gap-x-1 text-soft">
        {crumbs.map((crumb, place) => (
          <li key={`${place} ${crumb.label}`} className="min-w-0 [overflow-wrap:anywhere]">
            {place > 0 ? <span aria-hidden>/ </span> : null}
            {crumb.href === undefined ? (
              <bdi aria-current="page">{crumb.label}</bdi>
            ) : (
              <Link href={crumb.href} className="hover:text-ink hover:underline">
                <bdi>{crumb.label}</bdi>
              </Link>
            )}
          </li>
        ))}
      </ol>
    </nav>
  )
}
