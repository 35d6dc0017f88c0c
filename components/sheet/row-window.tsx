'use client'

import { useVirtualizer } from '@tanstack/react-virtual'
import { useRef } from 'react'
import type { RefObject } from 'react'

/** Shorter tables are simply there, and so are printed and found by the browser's search. */
const MOST_PLAIN = 150
const ROW_HEIGHT_PX = 33

export interface RowWindow {
  readonly scroller: RefObject<HTMLDivElement | null>
  /** True when only the rows in sight exist, inside a box that scrolls. */
  readonly isLong: boolean
  /** Indices of the rows to draw. */
  readonly indices: readonly number[]
  /** Heights in px that stand for the rows before and after them. */
  readonly before: number
  readonly after: number
}

/** Which rows of a table exist: all of a short one, those in sight of a long one. */
export function useRowWindow(count: number): RowWindow {
  const scroller = useRef<HTMLDivElement>(null)
  const isLong = count > MOST_PLAIN
  // eslint-disable-next-line react-hooks/incompatible-library -- its functions are called here and never handed on
  const virtual = useVirtualizer({
    count: isLong ? count : 0,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT_PX,
    overscan: 20,
    initialRect: { width: 800, height: 600 },
  })
  const items = virtual.getVirtualItems()
  return {
    scroller,
    isLong,
    indices: isLong ? items.map((item) => item.index) : Array.from({ length: count }, (_, index) => index),
    before: items[0]?.start ?? 0,
    after: virtual.getTotalSize() - (items.at(-1)?.end ?? 0),
  }
}

/** Stands for the rows that are not drawn. */
export function RowGap({ height, columns }: { readonly height: number; readonly columns: number }) {
  return height > 0 ? (
    <tr aria-hidden>
      <td colSpan={columns} style={{ height, padding: 0 }} />
    </tr>
  ) : null
}
