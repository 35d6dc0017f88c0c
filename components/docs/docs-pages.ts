export interface DocsPageEntry {
  readonly href: string
  readonly title: string
  /** Also current on the pages below this address. */
  readonly covers?: string
}

/** The pages of the docs in reading order. */
export const DOCS_PAGES: readonly DocsPageEntry[] = [
  { href: '/docs', title: 'Start here' },
  { href: '/docs/conventions', title: 'Conventions' },
  { href: '/docs/archives', title: 'Archives and export' },
  { href: '/docs/evidence', title: 'Evidence' },
  { href: '/docs/reference', title: 'API reference' },
  { href: '/docs/formats', title: 'Formats of an answer' },
  { href: '/docs/errors', title: 'Errors', covers: '/docs/problems/' },
  { href: '/docs/findings', title: 'Findings of the importer', covers: '/docs/findings/' },
  { href: '/docs/methods', title: 'Methods and sources' },
  { href: '/docs/cautions', title: 'Cautions' },
]
