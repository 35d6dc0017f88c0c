import type { Finding } from '@/lib/contract/description'
import type { Place } from './place'

const GRAVITY = { error: 3, warning: 2, note: 1 } as const

/** The gravest severity met on each line, for the marks in the gutter. */
export function severityByLine(findings: readonly Finding[]): ReadonlyMap<number, Finding['severity']> {
  const met = new Map<number, Finding['severity']>()
  for (const { line, severity } of findings) {
    const known = met.get(line)
    if (known === undefined || GRAVITY[severity] > GRAVITY[known]) met.set(line, severity)
  }
  return met
}

/** How many findings there are of each severity. */
export function countFindings(findings: readonly Finding[]): Record<Finding['severity'], number> {
  const counts = { error: 0, warning: 0, note: 0 }
  for (const { severity } of findings) counts[severity]++
  return counts
}

const words = (count: number, one: string): string => `${count} ${one}${count === 1 ? '' : 's'}`

/** Counts in words: "0 errors · 1 warning · 2 notes". */
export const findingCountText = ({ error, warning, note }: Record<Finding['severity'], number>): string =>
  `${words(error, 'error')} · ${words(warning, 'warning')} · ${words(note, 'note')}`

/** What a line shows when it is chosen: the first finding on it with its place, or the start of the line. index: null when it has none. */
export function findingOfLine(findings: readonly Finding[], line: number): { readonly index: number | null; readonly place: Place } {
  const index = findings.findIndex((finding) => finding.line === line)
  return { index: index < 0 ? null : index, place: { line, column: findings[index]?.column ?? 1 } }
}
