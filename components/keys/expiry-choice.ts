/** The expiries offered; `date` takes one from the calendar. */
export const EXPIRY_PRESETS = [
  { value: '30', label: 'in 30 days' },
  { value: '90', label: 'in 90 days' },
  { value: '365', label: 'in one year' },
  { value: 'date', label: 'on a date' },
  { value: 'never', label: 'never' },
] as const

export type ExpiryPreset = (typeof EXPIRY_PRESETS)[number]['value']

const DAY_MS = 86_400_000

/** The moment of a choice, RFC 3339; null for never. A date means the end of that day where the reader is. now: ms since the epoch. */
export function expiryInstant(preset: ExpiryPreset, date: string, now: number = Date.now()): string | null {
  if (preset === 'never') return null
  if (preset === 'date') return new Date(`${date}T23:59:59.999`).toISOString()
  return new Date(now + Number(preset) * DAY_MS).toISOString()
}

const two = (value: number): string => String(value).padStart(2, '0')

/** The day of a moment where the reader is, as a date field takes it. */
export function dayOf(at: Date): string {
  return `${at.getFullYear()}-${two(at.getMonth() + 1)}-${two(at.getDate())}`
}
