'use client'

import { useWindowVirtualizer } from '@tanstack/react-virtual'
import clsx from 'clsx'
import { useEffect, useImperativeHandle, useRef, useState } from 'react'
import type { Ref } from 'react'
import type { Model } from '@/lib/contract/model'
import { rowToFocus } from './move-focus'
import { COLUMNS, RegisterRow } from './register-row'

export interface ModelRowsHandle {
  /** Moves the focus to the first row. */
  readonly focusFirst: () => void
}

interface ModelRowsProps {
  readonly ref: Ref<ModelRowsHandle>
  readonly team: string
  readonly models: readonly Model[]
  readonly hasMore: boolean
  /** Called when the end comes into sight. */
  readonly onEnd: () => void
  /** Called when a slash is pressed on a row. */
  readonly onSearch: () => void
}

const HEADS = ['Model', 'Slug', 'Newest', 'In force', 'Joints', 'Last change'] as const

/** The rows of the register: thousands, of which only those in sight exist. Arrow keys move from row to row, and a slash on a row leads
 *  to the search; only there, because a character that acts everywhere is in the way of whoever dictates (WCAG 2.2, 2.1.4). */
export function ModelRows({ ref, team, models, hasMore, onEnd, onSearch }: ModelRowsProps) {
  const body = useRef<HTMLDivElement>(null)
  const [top, setTop] = useState(0)
  const virtual = useWindowVirtualizer({
    count: models.length,
    estimateSize: () => 55,
    overscan: 12,
    scrollMargin: top,
    scrollPaddingStart: 110,
    scrollPaddingEnd: 40,
    initialRect: { width: 1280, height: 900 },
    getItemKey: (index) => models[index]?.slug ?? index,
  })
  useEffect(() => setTop(body.current?.offsetTop ?? 0), [])

  const items = virtual.getVirtualItems()
  const last = items.at(-1)?.index ?? 0
  useEffect(() => {
    if (hasMore && last >= models.length - 20) onEnd()
  }, [hasMore, last, models.length, onEnd])

  const focusRow = (index: number) => {
    virtual.scrollToIndex(index, { align: 'auto' })
    // The row may not exist until the list has moved there.
    const find = (triesLeft: number) => {
      const link = body.current?.querySelector<HTMLElement>(`a[data-index="${index}"]`)
      if (link) link.focus({ preventScroll: true })
      else if (triesLeft > 0) requestAnimationFrame(() => find(triesLeft - 1))
    }
    find(30)
  }

  useImperativeHandle(ref, () => ({ focusFirst: () => focusRow(0) }))

  return (
    <div role="table" aria-label="Models" aria-rowcount={hasMore ? -1 : models.length + 1}>
      <div role="rowgroup" className="sticky top-12 z-10 bg-page">
        <div role="row" aria-rowindex={1} className={clsx('label hidden border-b border-ink px-2 py-1.5 font-semibold', COLUMNS)}>
          {HEADS.map((head, i) => (
            <span key={head} role="columnheader" className={i > 3 ? 'text-right' : undefined}>
              {head}
            </span>
          ))}
        </div>
      </div>
      <div
        ref={body}
        role="rowgroup"
        className="relative border-t border-ink tablet:border-t-0"
        style={{ height: virtual.getTotalSize() }}
        onKeyDown={(event) => {
          if (event.key === '/' && !event.ctrlKey && !event.metaKey && !event.altKey) {
            event.preventDefault()
            return onSearch()
          }
          const index = rowToFocus(event, models.length)
          if (index === null) return
          event.preventDefault()
          focusRow(index)
        }}
      >
        {items.map((item) => (
          <div
            key={item.key}
            role="presentation"
            ref={virtual.measureElement}
            data-index={item.index}
            className="absolute inset-x-0 top-0"
            style={{ transform: `translateY(${item.start - virtual.options.scrollMargin}px)` }}
          >
            <RegisterRow team={team} model={models[item.index]!} index={item.index} />
          </div>
        ))}
      </div>
    </div>
  )
}
