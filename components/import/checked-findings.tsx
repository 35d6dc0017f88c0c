'use client'

import { countFindings, findingCountText } from './findings-by-line'
import { FindingsList } from './findings-list'
import type { Finding } from '@/lib/contract/description'

interface CheckedFindingsProps {
  readonly findings: readonly Finding[]
  readonly isReadable: boolean
  readonly chosen: number | null
  readonly onChoose: (index: number) => void
}

/** The verdict on a file in a sentence, then every finding. */
export function CheckedFindings({ findings, isReadable, chosen, onChoose }: CheckedFindingsProps) {
  const counts = countFindings(findings)
  const verdict =
    findings.length === 0
      ? 'The importer has nothing to say: the file can be stored as it is.'
      : isReadable
        ? 'The file can be stored. What follows was noticed; choose a place to see it in the source.'
        : 'The file cannot be stored until its errors are mended. Choose a place to see it in the source.'
  return (
    <section aria-labelledby="import-findings" className="space-y-2">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 id="import-findings">Findings</h2>
        <span className="label" role="status">
          {findingCountText(counts)}
        </span>
      </div>
      <p className={isReadable ? undefined : 'font-medium text-verm'}>{verdict}</p>
      {findings.length === 0 ? null : <FindingsList findings={findings} chosen={chosen} onChoose={onChoose} />}
    </section>
  )
}
