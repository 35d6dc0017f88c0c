import type { ReactNode } from 'react'

/** Nothing here yet: says what belongs here and offers the one next step. */
export function EmptyState({ title, children, action }: { readonly title: string; readonly children: ReactNode; readonly action?: ReactNode }) {
  return (
    <div className="border border-dashed border-soft px-6 py-10 text-center">
      <p className="text-15 font-semibold">{title}</p>
      <div className="mx-auto mt-1 max-w-prose text-soft">{children}</div>
      {action === undefined ? null : <div className="mt-4 flex justify-center">{action}</div>}
    </div>
  )
}
