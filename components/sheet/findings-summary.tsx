import { SeverityMark } from '@/components/ui/severity-mark'
import { TextLink } from '@/components/ui/text-link'
import { findingCountText } from '@/components/import/findings-by-line'
import type { Finding } from '@/lib/contract/description'

const MOST_SHOWN = 8
const GRAVITY = { error: 0, warning: 1, note: 2 } as const

interface FindingsSummaryProps {
  readonly findings: readonly Finding[]
  readonly counts: Record<Finding['severity'], number>
  /** Address of the page that shows every finding beside the source. */
  readonly sourceHref: string
}

/** What the importer had to say, gravest first; each line leads to its place in the source and to the page of its rule. */
export function FindingsSummary({ findings, counts, sourceHref }: FindingsSummaryProps) {
  const shown = findings.toSorted((a, b) => GRAVITY[a.severity] - GRAVITY[b.severity]).slice(0, MOST_SHOWN)
  return (
    <section aria-labelledby="sheet-findings">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="sheet-findings">Findings</h2>
        <span className="label">{findingCountText(counts)}</span>
      </div>
      {shown.length === 0 ? (
        <p className="py-1.5 text-soft">The importer had nothing to say about this file.</p>
      ) : (
        <ul>
          {shown.map((finding, i) => (
            <li key={i} className="grid grid-cols-[5.5rem_minmax(0,1fr)] items-baseline gap-x-2 border-b border-hair px-2 py-1.5">
              <SeverityMark severity={finding.severity} />
              <p className="break-words">
                <TextLink inline href={`${sourceHref}#L${finding.line}`} className="num" aria-label={`Line ${finding.line} of the source`}>
                  L{finding.line}
                </TextLink>{' '}
                {finding.message}{' '}
                <TextLink inline href={`/docs/findings/${finding.rule}`} className="whitespace-nowrap">
                  {finding.rule}
                </TextLink>
              </p>
            </li>
          ))}
        </ul>
      )}
      {findings.length > shown.length ? (
        <p className="pt-1.5">
          <TextLink href={sourceHref}>All {findings.length} findings beside the source</TextLink>
        </p>
      ) : null}
    </section>
  )
}
