import type { KeyboardEvent } from 'react'

const STEPS: Readonly<Record<string, number>> = { ArrowDown: 1, ArrowUp: -1, PageDown: 10, PageUp: -10, Home: -Infinity, End: Infinity }

/** Which row an arrow key leads to from the focused one; null when the key means something else or focus is elsewhere. */
export function rowToFocus(event: KeyboardEvent<HTMLElement>, count: number): number | null {
  const step = STEPS[event.key]
  const from = Number((event.target as HTMLElement).dataset.index ?? Number.NaN)
  if (step === undefined || Number.isNaN(from) || event.altKey || event.ctrlKey || event.metaKey) return null
  return Math.min(count - 1, Math.max(0, from + step))
}
