'use client'
import clsx from 'clsx'
import Link, { useLinkStatus } from 'next/link'
import { usePathname } from 'next/navigation'
import type { ReactNode } from 'react'

interface NavLinkProps {
  readonly href: string
  /** Only this very page is current, not what lies below it. */
  readonly exact?: boolean
  readonly className?: string
  readonly currentClassName: string
  readonly otherClassName: string
  readonly children: ReactNode
}

/** A link of a navigation, marked when the reader is there. */
export function NavLink({ href, exact = false, className, currentClassName, otherClassName, children }: NavLinkProps) {
  const path = usePathname()
  const isHere = path === href
  const isCurrent = isHere || (!exact && path.startsWith(`${href}/`))
  return (
    <Link href={href} aria-current={isHere ? 'page' : isCurrent ? 'true' : undefined} className={clsx(className, isCurrent ? currentClassName : otherClassName)}>
      {children}
      <Pending />
    </Link>
  )
}

/** Appears beside the link while the page that it leads to is being made. Its place is always kept, so nothing moves. */
function Pending() {
  const { pending } = useLinkStatus()
  return (
    <span role="status" className="ml-1 inline-block w-3 text-soft">
      {pending ? (
        <>
          <span aria-hidden>…</span>
          <span className="sr-only">Loading</span>
        </>
      ) : null}
    </span>
  )
}
