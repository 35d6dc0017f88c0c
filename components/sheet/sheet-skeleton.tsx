import { Main } from '@/components/shell/main'
import { Skeleton, SkeletonRows } from '@/components/ui/skeleton'
import { SheetFrame } from './sheet-frame'

/** The ruled sheet before its content is there, in its final size. */
export function SheetSkeleton() {
  return (
    <Main>
      <div className="mb-4">
        <Skeleton className="h-4 w-60" />
        <Skeleton className="mt-2 h-8 w-80 max-w-full" />
      </div>
      <SheetFrame drawing={<div className="min-h-80 desk:min-h-[47rem]" />} titleBlock={<Skeleton className="h-48 w-full" />}>
        <SkeletonRows rows={8} />
        <SkeletonRows rows={4} />
      </SheetFrame>
    </Main>
  )
}
