import { Caution } from '@/components/shell/caution'

/** In place of a drawing: why there is none. */
export function NoDrawing({ reason, joints }: { readonly reason: string | undefined; readonly joints: number }) {
  return (
    <div className="flex h-full min-h-80 flex-col justify-between gap-6 px-7 py-6">
      <div className="max-w-prose">
        <p className="text-15 font-semibold">No drawing</p>
        <p className="mt-1 text-soft">
          {reason ?? `This chain has ${joints} joints; chains of up to 150 are drawn. Choose a shorter one below. Everything else on this sheet is complete.`}
        </p>
      </div>
      <Caution className="max-w-xl" />
    </div>
  )
}
