'use client'

import { useVirtualizer } from '@tanstack/react-virtual'
import clsx from 'clsx'
import { useEffect, useRef } from 'react'
import type { Finding } from '@/lib/contract/description'
import { FindingItem } from './finding-item'

/** As many are simply there, and so are found by the browser's search and on paper. */
const MOST_PLAIN = 100

interface FindingsListProps {
  readonly findings: readonly Finding[]
  /** Index of the finding that the source view shows. */
  readonly chosen: number | null
  readonly onChoose: (index: number) => void
  readonly className?: string
}

/** Everything the importer has to say about a file, in the order of its lines; thousands scroll. */
export function FindingsList(props: FindingsListProps) {
  const { findings, chosen, onChoose, className } = props
  const list = useRef<HTMLOListElement>(null)
  useEffect(() => {
    if (chosen !== null) list.current?.children[chosen]?.scrollIntoView({ block: 'nearest' })
  }, [chosen])
  if (findings.length > MOST_PLAIN) return <VirtualFindings {...props} />
  return (
    <ol ref={list} className={clsx('border-t border-hair', className)} aria-label="Findings">
      {findings.map((finding, index) => (
        <li key={index} className="scroll-mt-14">
          <FindingItem finding={finding} isChosen={index === chosen} onChoose={() => onChoose(index)} />
        </li>
      ))}
    </ol>
  )
}

function VirtualFindings({ findings, chosen, onChoose, className }: FindingsListProps) {
  const scroller = useRef<HTMLDivElement>(null)
  // eslint-disable-next-line react-hooks/incompatible-library -- its functions are called here and never handed on
  const virtual = useVirtualizer({
    count: findings.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => 112,
    overscan: 8,
    initialRect: { width: 400, height: 600 },
  })
  useEffect(() => {
    if (chosen !== null) virtual.scrollToIndex(chosen, { align: 'auto' })
  }, [chosen, virtual])
  return (
    <div ref={scroller} className={clsx('overflow-y-auto border border-soft', className ?? 'max-h-[70vh]')} tabIndex={0} role="region" aria-label={`${findings.length} findings`}>
      <ol className="relative" style={{ height: virtual.getTotalSize() }}>
        {virtual.getVirtualItems().map((item) => (
          <li
            key={item.key}
            ref={virtual.measureElement}
            data-index={item.index}
            aria-setsize={findings.length}
            aria-posinset={item.index + 1}
            className="absolute inset-x-0 top-0 px-2"
            style={{ transform: `translateY(${item.start}px)` }}
          >
            <FindingItem finding={findings[item.index]!} isChosen={item.index === chosen} onChoose={() => onChoose(item.index)} />
          </li>
        ))}
      </ol>
    </div>
  )
}
