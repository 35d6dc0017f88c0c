const DAY_MS = 86_400_000

/** How long until a moment, in words: "within a day", "in 12 days". now: ms since the epoch. */
export function daysUntil(at: string, now: number): string {
  const days = Math.floor((new Date(at).getTime() - now) / DAY_MS)
  if (days < 1) return 'within a day'
  return days === 1 ? 'in 1 day' : `in ${days} days`
}
