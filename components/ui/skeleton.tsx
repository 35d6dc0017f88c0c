import clsx from 'clsx'

/** The place of a text that is on its way, in its final size. Give it width and height with classes. */
export function Skeleton({ className }: { readonly className?: string }) {
  return <span aria-hidden className={clsx('block bg-hair', className ?? 'h-4 w-full')} />
}

/** Rows that are on their way, and the word for those who do not see them. */
export function SkeletonRows({ rows = 6 }: { readonly rows?: number }) {
  return (
    <div role="status">
      <span className="sr-only">Loading</span>
      {Array.from({ length: rows }, (_, row) => (
        <div key={row} className="flex gap-6 border-b border-hair px-2 py-2.5">
          <Skeleton className="h-3 w-40" />
          <Skeleton className="h-3 grow" />
          <Skeleton className="h-3 w-24" />
        </div>
      ))}
    </div>
  )
}
