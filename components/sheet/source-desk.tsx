'use client'

import { useQuery } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { addressOf } from '@/components/api/address'
import { refusalFrom, sentenceOf, unreachable } from '@/components/api/refusal'
import { countFindings, findingCountText, findingOfLine } from '@/components/import/findings-by-line'
import { FindingsList } from '@/components/import/findings-list'
import { lineOfAnchor } from '@/components/import/place'
import type { Place } from '@/components/import/place'
import { sourceText } from '@/components/import/source-text'
import { SourceView } from '@/components/import/source-view'
import { Notice } from '@/components/shell/notice'
import { Button } from '@/components/ui/button'
import { buttonLook } from '@/components/ui/button-look'
import { Skeleton } from '@/components/ui/skeleton'
import type { Finding } from '@/lib/contract/description'

interface SourceDeskProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly fileName: string
  readonly findings: readonly Finding[]
}

async function readSourceText(address: string, signal: AbortSignal): Promise<string> {
  const response = await fetch(address, { signal }).catch((error: unknown) => {
    throw signal.aborted ? error : unreachable()
  })
  if (!response.ok) throw refusalFrom(response.status, await response.text())
  return sourceText(new Uint8Array(await response.arrayBuffer()))
}

/** The stored file with the findings beside it. The address follows the line that is shown: …/source#L112. */
export function SourceDesk({ path, fileName, findings }: SourceDeskProps) {
  const address = addressOf('getSource', path)
  const shown = addressOf('getSource', path, { part: 'description' })
  const { data: text, error, refetch } = useQuery({ queryKey: ['source', shown], queryFn: ({ signal }) => readSourceText(shown, signal), staleTime: Infinity })
  const [chosen, setChosen] = useState<{ index: number | null; place: Place } | null>(null)

  useEffect(() => {
    const follow = () => {
      const line = lineOfAnchor(window.location.hash)
      if (line === null) return
      setChosen(findingOfLine(findings, line))
    }
    follow()
    window.addEventListener('hashchange', follow)
    return () => window.removeEventListener('hashchange', follow)
  }, [findings])

  const show = (place: Place, index: number | null) => {
    // Without an entry in the history, and without the browser's own jump.
    window.history.replaceState(window.history.state, '', `#L${place.line}`)
    setChosen({ index, place })
  }

  return (
    <div className="grid gap-6 desk:grid-cols-[minmax(0,1fr)_minmax(0,1.6fr)]">
      <section aria-labelledby="source-findings" className="min-w-0 space-y-2">
        <div className="flex flex-wrap items-baseline justify-between gap-x-4">
          <h2 id="source-findings">Findings</h2>
          <span className="label">{findingCountText(countFindings(findings))}</span>
        </div>
        {findings.length === 0 ? (
          <p className="text-soft">The importer had nothing to say about this file.</p>
        ) : (
          <FindingsList findings={findings} chosen={chosen?.index ?? null} onChoose={(index) => show({ line: findings[index]!.line, column: findings[index]!.column }, index)} />
        )}
        <p className="pt-2">
          <a href={address} download={fileName} className={buttonLook('plain')}>
            Download the file as uploaded
          </a>
        </p>
      </section>
      <div className="min-w-0">
        {error !== null ? (
          <Notice title="The source could not be read" tone="error" actions={<Button onClick={() => void refetch()}>Try again</Button>}>
            {sentenceOf(error)}
          </Notice>
        ) : text === undefined ? (
          <div role="status">
            <span className="sr-only">Loading the source</span>
            <Skeleton className="h-[70vh] w-full desk:h-[calc(100dvh-11rem)]" />
          </div>
        ) : (
          <SourceView
            text={text}
            fileName={fileName}
            findings={findings}
            place={chosen?.place ?? null}
            onLine={(line) => {
              const { place, index } = findingOfLine(findings, line)
              show(place, index)
            }}
            className="h-[70vh] desk:sticky desk:top-16 desk:h-[calc(100dvh-11rem)]"
          />
        )}
      </div>
    </div>
  )
}
