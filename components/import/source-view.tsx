'use client'

import { useVirtualizer } from '@tanstack/react-virtual'
import clsx from 'clsx'
import { useEffect, useMemo, useRef } from 'react'
import { Mark } from '@/components/ui/marks'
import type { Finding } from '@/lib/contract/description'
import { severityByLine } from './findings-by-line'
import type { Place } from './place'
import { sourceRows } from './source-rows'
import { VisibleText } from './visible-text'

const ROW_HEIGHT_PX = 20
const COLOURS = { error: 'text-verm', warning: 'text-amber', note: 'text-soft' } as const

interface SourceViewProps {
  readonly text: string
  readonly fileName: string
  readonly findings: readonly Finding[]
  /** What to show and mark; a new object asks again, even for the same place. */
  readonly place: Place | null
  /** Called with the line whose number was pressed. */
  readonly onLine?: (line: number) => void
  readonly className?: string
}

/** A source with line numbers, drawn only where it is looked at, so that megabytes scroll. */
export function SourceView({ text, fileName, findings, place, onLine, className }: SourceViewProps) {
  const scroller = useRef<HTMLDivElement>(null)
  const rows = useMemo(() => sourceRows(text), [text])
  const severities = useMemo(() => severityByLine(findings), [findings])
  const marked = useMemo(() => (place === null ? null : { line: place.line, ...rows.find(place.line, place.column) }), [place, rows])
  // eslint-disable-next-line react-hooks/incompatible-library -- its functions are called here and never handed on
  const virtual = useVirtualizer({
    count: rows.count,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT_PX,
    overscan: 20,
    initialRect: { width: 600, height: 600 },
  })
  useEffect(() => {
    if (marked === null) return
    virtual.scrollToIndex(marked.row, { align: 'center' })
    if (isOutOfSight(scroller.current)) scroller.current?.scrollIntoView({ block: 'start' })
    // A place far to the right comes into view too.
    const frame = requestAnimationFrame(() => {
      scroller.current?.querySelector('[data-place]')?.scrollIntoView({ block: 'nearest', inline: 'nearest' })
    })
    return () => cancelAnimationFrame(frame)
  }, [marked, virtual])
  const digits = String(rows.lines).length

  return (
    <figure className={clsx('flex min-h-0 flex-col', className)}>
      <div
        ref={scroller}
        role="region"
        aria-label={`Source of ${fileName}`}
        tabIndex={0}
        className="min-h-0 grow scroll-mt-14 overflow-auto border border-soft bg-sheet font-mono text-12 leading-5 focus-visible:-outline-offset-2"
        style={{ direction: 'ltr' }}
      >
        <div className="relative" style={{ height: virtual.getTotalSize() }}>
          {virtual.getVirtualItems().map((item) => {
            const line = rows.lineOf(item.index)
            const startsLine = rows.startsLine(item.index)
            const severity = startsLine ? severities.get(line) : undefined
            const isMarked = marked?.line === line
            return (
              <div
                key={item.key}
                className={clsx('absolute left-0 flex h-5 w-max min-w-full', isMarked && 'bg-wash')}
                style={{ transform: `translateY(${item.start}px)` }}
                aria-current={isMarked || undefined}
              >
                <span className={clsx('sticky left-0 flex shrink-0 items-center border-r border-hair pr-2 select-none', isMarked ? 'bg-wash' : 'bg-sheet')}>
                  <span className={clsx('w-5 pl-1', severity && COLOURS[severity])}>
                    {severity === undefined ? null : (
                      <>
                        <Mark name={severity} className="size-3" />
                        <span className="sr-only">{severity}</span>
                      </>
                    )}
                  </span>
                  <LineNumber line={startsLine ? line : null} digits={digits} isMarked={isMarked} onLine={onLine} />
                </span>
                <span className="px-3 whitespace-pre" style={{ unicodeBidi: 'isolate', tabSize: 4 }}>
                  <RowText text={rows.textOf(item.index)} at={marked?.row === item.index && marked.at >= 0 ? marked.at : null} />
                </span>
              </div>
            )
          })}
        </div>
      </div>
      {rows.isCut ? <figcaption className="label mt-1">The view ends at line {rows.lines}. The whole file is in the download.</figcaption> : null}
    </figure>
  )
}

/** On a phone the view stands under the findings, off the screen. */
function isOutOfSight(element: Element | null): boolean {
  if (element === null) return false
  const { top, bottom } = element.getBoundingClientRect()
  return top > 0.7 * window.innerHeight || bottom < 0.3 * window.innerHeight
}

interface LineNumberProps {
  readonly line: number | null
  readonly digits: number
  readonly isMarked: boolean
  readonly onLine: ((line: number) => void) | undefined
}

function LineNumber({ line, digits, isMarked, onLine }: LineNumberProps) {
  const style = { width: `${digits}ch` }
  const look = clsx('text-right', isMarked ? 'font-bold text-ink' : 'text-soft')
  if (line === null) return <span className={look} style={style} aria-hidden />
  if (onLine === undefined) {
    return (
      <span className={look} style={style}>
        {line}
      </span>
    )
  }
  return (
    <button type="button" tabIndex={-1} className={clsx(look, 'hover:text-blue')} style={style} onClick={() => onLine(line)} aria-label={`Line ${line}`}>
      {line}
    </button>
  )
}

/** A row of source; the character at `at` is boxed. */
function RowText({ text, at }: { readonly text: string; readonly at: number | null }) {
  if (at === null) return <VisibleText text={text} />
  const size = (text.codePointAt(at) ?? 0) > 0xffff ? 2 : 1
  return (
    <>
      <VisibleText text={text.slice(0, at)} />
      <mark data-place className="scroll-mx-24 bg-transparent font-bold text-blue outline-2 outline-blue">
        {at < text.length ? <VisibleText text={text.slice(at, at + size)} /> : ' '}
      </mark>
      <VisibleText text={text.slice(at + size)} />
    </>
  )
}
