import type { Metadata } from 'next'
import { DocsPage } from '@/components/docs/docs-page'
import { RuleList } from '@/components/docs/rule-list'
import { SeverityMark } from '@/components/ui/severity-mark'
import { RULES } from '@/lib/urdf/rules'

export const metadata: Metadata = { title: 'Findings of the importer' }

const SEVERITIES = [
  { severity: 'error', title: 'Errors', text: 'Errors refuse the import. Nothing is stored until the file is mended.' },
  { severity: 'warning', title: 'Warnings', text: 'The file is imported, but something was supplied, changed or ignored. Read each before you release.' },
  { severity: 'note', title: 'Notes', text: 'Worth knowing; it changes no number.' },
] as const

const LISTED = Object.entries(RULES).map(([slug, rule]) => ({ slug, severity: rule.severity, title: rule.title }))

export default function FindingsPage() {
  return (
    <DocsPage
      href="/docs/findings"
      title="Findings of the importer"
      lead="Whatever the importer refuses, supplies, changes or ignores in a file is a finding, with its line, its column and a remedy."
    >
      <p>
        A fault of the text ends the reading; everything else in a file is found in one pass. Of one rule 5000 places are listed, and the last of
        them says how many more there are. A file is read in a thread of its own and may take 20 seconds of it, so it holds up nobody else.
      </p>
      {SEVERITIES.map(({ severity, title, text }) => {
        const rules = LISTED.filter((rule) => rule.severity === severity)
        return rules.length === 0 ? null : (
          <section key={severity} className="wide prose">
            <h2>{title}</h2>
            <p>
              <SeverityMark severity={severity} className="mr-3" />
              {text}
            </p>
            <RuleList rules={rules} caption={title} />
          </section>
        )
      })}
    </DocsPage>
  )
}
