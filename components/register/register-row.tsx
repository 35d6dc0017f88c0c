import clsx from 'clsx'
import Link from 'next/link'
import { StatusMark } from '@/components/ui/status-mark'
import { Timestamp } from '@/components/ui/timestamp'
import type { Model } from '@/lib/contract/model'

/** The columns of the register; on a phone a row is two lines. */
export const COLUMNS = 'tablet:grid tablet:grid-cols-[minmax(0,1fr)_minmax(0,11rem)_7rem_6.5rem_4rem_8.5rem] tablet:gap-x-4'

interface RegisterRowProps {
  readonly team: string
  readonly model: Model
  /** Marks the link that the arrow keys move between. */
  readonly index: number
}

/** One model: the whole row leads to the sheet of the revision in force, else of the newest. */
export function RegisterRow({ team, model, index }: RegisterRowProps) {
  const { slug, name, note, latest, released, changedAt } = model
  return (
    <div role="row" aria-rowindex={index + 2} className="relative border-b border-hair px-2 py-2 hover:bg-wash has-focus-visible:bg-wash">
      <div className={clsx('flex flex-wrap items-baseline gap-x-4 gap-y-0.5', COLUMNS)}>
        <div role="cell" className="min-w-0 basis-full tablet:basis-auto">
          <Link
            href={`/teams/${team}/models/${slug}`}
            data-index={index}
            prefetch={false}
            className="block font-semibold [overflow-wrap:anywhere] text-blue after:absolute after:inset-0 hover:underline focus-visible:outline-none focus-visible:after:outline-2 focus-visible:after:-outline-offset-2 focus-visible:after:outline-blue"
          >
            <bdi>{name}</bdi>
          </Link>
          <p data-excerpt className="label line-clamp-2 [overflow-wrap:anywhere]" dir="auto">
            {note?.split('\n', 1)[0] ?? '\u00a0'}
          </p>
        </div>
        <div role="cell" className="num min-w-0 break-all text-soft">
          {slug}
        </div>
        <div role="cell">
          <StatusMark status={latest.status} />
        </div>
        <div role="cell">
          <span className="label tablet:hidden">in force </span>
          {released === undefined ? (
            <span className="text-soft">none</span>
          ) : (
            <>
              <span className="num">{released}</span>
              <span className="label"> of {model.revisions}</span>
            </>
          )}
        </div>
        <div role="cell" className="tablet:text-right">
          <span className="num">{latest.independent}</span>
          <span className="label tablet:hidden"> joints</span>
        </div>
        <div role="cell" className="tablet:text-right">
          <Timestamp at={changedAt} />
        </div>
      </div>
    </div>
  )
}
