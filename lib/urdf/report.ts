import type { Finding } from '@/lib/urdf/description'
import { lineStartsOf, lineAt } from '@/lib/urdf/line-starts'
import { RULES, type RuleId } from '@/lib/urdf/rules'

/** More findings of one rule than this are counted in the last one, not listed: a broken file may repeat one fault 100 000 times. */
export const LISTED_PER_RULE = 5000

/** Collects findings by offset while a file is read; sorts them and gives them line and column at the end. */
export interface Report {
  /** at: offset in UTF-16 code units into the text. remedy: where something better than the rule's own can be said. */
  add(rule: RuleId, at: number, message: string, more?: { element?: string; remedy?: string }): void
  /** Line of an offset, counted from 1, for messages that point elsewhere. */
  lineAt(at: number): number
  hasErrors(): boolean
  /** All findings in the order of their places. */
  findings(): Finding[]
}

interface Entry {
  readonly rule: RuleId
  readonly at: number
  readonly message: string
  readonly remedy: string
  readonly element: string | undefined
}

/** A report on `text`, whose findings will carry lines and columns of that text. */
export function createReport(text: string): Report {
  const starts = lineStartsOf(text)
  const entries: Entry[] = []
  const counts = new Map<RuleId, number>()
  return {
    add(rule, at, message, more = {}) {
      const count = (counts.get(rule) ?? 0) + 1
      counts.set(rule, count)
      if (count <= LISTED_PER_RULE) entries.push({ rule, at, message, remedy: more.remedy ?? RULES[rule].remedy, element: more.element })
    },
    lineAt: (at) => lineAt(starts, at),
    hasErrors: () => [...counts.keys()].some((rule) => RULES[rule].severity === 'error'),
    findings() {
      const sorted = entries.toSorted((a, b) => a.at - b.at)
      const last = new Map(sorted.map(({ rule }, index) => [rule, index]))
      let from = { line: 0, at: 0, column: 1 }
      return sorted.map(({ rule, at, message, remedy, element }, index) => {
        const line = lineAt(starts, at)
        if (line !== from.line) from = { line, at: starts[line - 1]!, column: 1 }
        from = { line, at, column: from.column + countCharacters(text, from.at, at) }
        const unlisted = last.get(rule) === index ? counts.get(rule)! - LISTED_PER_RULE : 0
        const tail = unlisted > 0 ? ` The same holds at ${unlisted} further places, which are not listed.` : ''
        return { rule, severity: RULES[rule].severity, message: message + tail, remedy, line, column: from.column, ...(element === undefined ? {} : { element }) }
      })
    },
  }
}

/** Code points between two offsets. */
function countCharacters(text: string, from: number, to: number): number {
  let count = 0
  for (let at = from; at < to; at++) {
    const code = text.charCodeAt(at)
    if (code < 0xdc00 || code > 0xdfff) count++
  }
  return count
}
