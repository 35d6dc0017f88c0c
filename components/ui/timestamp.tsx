'use client'
import clsx from 'clsx'
import { useSyncExternalStore } from 'react'

const two = (value: number): string => String(value).padStart(2, '0')
const inUtc = (at: Date): string => `${at.toISOString().slice(0, 10)} ${at.toISOString().slice(11, 16)}`
const inLocal = (at: Date): string =>
  `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())} ${two(at.getHours())}:${two(at.getMinutes())}`

function zoneOf(at: Date): string {
  const minutes = -at.getTimezoneOffset()
  const sign = minutes < 0 ? '−' : '+'
  const name = Intl.DateTimeFormat().resolvedOptions().timeZone
  return `UTC${sign}${two(Math.floor(Math.abs(minutes) / 60))}:${two(Math.abs(minutes) % 60)}, ${name}`
}

const never = () => () => undefined

interface TimestampProps {
  /** RFC 3339. */
  readonly at: string
  /** Shows the day only. */
  readonly dayOnly?: boolean
  readonly className?: string
}

/** A moment as `2026-12-01 14:05` in the reader's zone; the zone and UTC on hover. The server does not know the zone and
 *  writes UTC, which the browser replaces. */
export function Timestamp({ at, dayOnly = false, className }: TimestampProps) {
  const date = new Date(at)
  const isBrowser = useSyncExternalStore(never, () => true, () => false)
  const text = isBrowser ? inLocal(date) : inUtc(date)
  const title = isBrowser ? `${inLocal(date)} ${zoneOf(date)} (${inUtc(date)} UTC)` : `${inUtc(date)} UTC`
  return (
    <time dateTime={at} title={title} className={clsx('num whitespace-nowrap', className)}>
      {dayOnly ? text.slice(0, 10) : text}
    </time>
  )
}
