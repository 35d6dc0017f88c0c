const HOUR_MS = 3_600_000
const DAY_MS = 24 * HOUR_MS

/** How long something has waited, in words: "less than an hour", "5 hours", "12 days". now: ms since the epoch. */
export function waitingTime(since: string, now: number): string {
  const ms = now - new Date(since).getTime()
  const [count, unit] = ms < 2 * DAY_MS ? [Math.floor(ms / HOUR_MS), 'hour'] : [Math.floor(ms / DAY_MS), 'day']
  if (count < 1) return 'less than an hour'
  return `${count} ${unit}${count === 1 ? '' : 's'}`
}
