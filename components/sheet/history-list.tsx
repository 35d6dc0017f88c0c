import { StatusMark } from '@/components/ui/status-mark'
import { Timestamp } from '@/components/ui/timestamp'
import type { Revision } from '@/lib/contract/model'

/** Every status the revision has had, oldest first, with who, when and why. */
export function HistoryList({ history }: { readonly history: Revision['history'] }) {
  return (
    <section aria-labelledby="sheet-history">
      <h2 id="sheet-history">History</h2>
      <ol className="mt-1 border-t border-ink">
        {history.map((entry, i) => (
          <li key={i} className="grid grid-cols-[8rem_minmax(0,1fr)] items-baseline gap-x-4 border-b border-hair px-2 py-1.5">
            <StatusMark status={entry.status} />
            <span className="flex min-w-0 flex-wrap gap-x-3">
              <bdi className="break-words">{entry.by}</bdi>
              <Timestamp at={entry.at} className="text-soft" />
            </span>
            {entry.comment === undefined ? null : (
              <p className="col-start-2 break-words whitespace-pre-line text-soft" dir="auto">
                {entry.comment}
              </p>
            )}
          </li>
        ))}
      </ol>
    </section>
  )
}
