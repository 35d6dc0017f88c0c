import type { ReactNode } from 'react'

/** A formula on its own line, written in text. */
export function Formula({ children }: { readonly children: ReactNode }) {
  return (
    <p className="num scroll-x border-l-2 border-hair py-1 pl-4 text-15 leading-6 whitespace-pre" tabIndex={0} role="group" aria-label="Formula">
      {children}
    </p>
  )
}
