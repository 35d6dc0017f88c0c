import clsx from 'clsx'
import type { ReactNode } from 'react'

/** The content of a page. narrow: one column of text or one form. */
export function Main({ narrow = false, className, children }: { readonly narrow?: boolean; readonly className?: string; readonly children: ReactNode }) {
  return (
    <main id="main" tabIndex={-1} className={clsx('w-full px-4 pt-3 pb-10 outline-none desk:px-6', narrow && 'mx-auto max-w-3xl', className)}>
      {children}
    </main>
  )
}
