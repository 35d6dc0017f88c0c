import Link from 'next/link'
import type { ReactNode } from 'react'

interface DeskLineProps {
  readonly href: string
  /** What can be done there, in a few words; read out with the line. */
  readonly title: ReactNode
  readonly children: ReactNode
  readonly aside?: ReactNode
  /** What has links and buttons of its own, under the text. */
  readonly more?: ReactNode
}

/** One line of the desk: an action. The whole line is the link. */
export function DeskLine({ href, title, children, aside, more }: DeskLineProps) {
  return (
    <li className="relative flex flex-wrap items-baseline gap-x-4 gap-y-0.5 border-b border-hair px-2 py-2 hover:bg-wash">
      <div className="min-w-0 grow basis-56">
        <Link
          href={href}
          className="font-semibold break-words text-blue after:absolute after:inset-0 hover:underline focus-visible:outline-none focus-visible:after:outline-2 focus-visible:after:-outline-offset-2 focus-visible:after:outline-blue"
        >
          {title}
        </Link>
        <p className="break-words text-soft">{children}</p>
        {more === undefined ? null : <div className="relative z-1 mt-0.5 flex w-fit flex-wrap items-baseline gap-x-4">{more}</div>}
      </div>
      {aside}
    </li>
  )
}
