export type Severity = 'error' | 'warning' | 'note'

/** One row of the table of rules: all that its page says. Plain text; `before` and `after` are pieces of a file. */
export interface Rule {
  readonly severity: Severity
  readonly title: string
  /** What is in the file. */
  readonly meaning: string
  /** What it does to the numbers, or to the import. */
  readonly effect: string
  readonly remedy: string
  readonly before: string
  readonly after: string
}
