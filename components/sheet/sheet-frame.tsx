import type { ReactNode } from 'react'

interface SheetFrameProps {
  readonly drawing: ReactNode
  /** Bottom right, as on every drawing. */
  readonly titleBlock: ReactNode
  /** Tables above the title block. */
  readonly children: ReactNode
}

/** The ruled sheet: the drawing on the left, tables and title block on the right; on a narrow screen one under the other. */
export function SheetFrame({ drawing, titleBlock, children }: SheetFrameProps) {
  return (
    <div className="frame grid break-inside-avoid print:[zoom:0.88] desk:grid-cols-[minmax(0,1fr)_minmax(0,34.5rem)] print:grid-cols-[minmax(0,1fr)_minmax(0,30rem)]">
      <div className="min-w-0 border-b border-ink desk:border-r desk:border-b-0 print:border-r print:border-b-0">
        <div className="h-full desk:sticky desk:top-12 desk:h-auto desk:min-h-full print:static print:h-full">{drawing}</div>
      </div>
      <div className="flex min-w-0 flex-col">
        <div className="space-y-5 px-4 py-4 tablet:px-5">{children}</div>
        <div className="mt-auto">{titleBlock}</div>
      </div>
    </div>
  )
}
