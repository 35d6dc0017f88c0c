import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { BackLink } from '@/components/docs/back-link'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { SeverityMark } from '@/components/ui/severity-mark'
import { RULES, type RuleId } from '@/lib/urdf/rules'

interface RulePageProps {
  readonly params: Promise<{ rule: string }>
}

const isRule = (slug: string): slug is RuleId => Object.hasOwn(RULES, slug)

export async function generateMetadata({ params }: RulePageProps): Promise<Metadata> {
  const { rule } = await params
  return { title: isRule(rule) ? `${RULES[rule].title} (${rule})` : 'No such rule' }
}

export default async function RulePage({ params }: RulePageProps) {
  const { rule: slug } = await params
  if (!isRule(slug)) notFound()
  const rule = RULES[slug]
  return (
    <DocsPage
      title={rule.title}
      above={<BackLink href="/docs/findings" label="Findings of the importer" />}
      lead={
        <span className="inline-flex gap-3">
          <SeverityMark severity={rule.severity} />
          <span className="num">{slug}</span>
        </span>
      }
    >
      <h2>What is in the file</h2>
      <p>{rule.meaning}</p>
      <h2>What follows from it</h2>
      <p>{rule.effect}</p>
      <h2>What to do</h2>
      <p>{rule.remedy}</p>
      <div className="wide mt-4 grid max-w-5xl gap-4 wide:grid-cols-2">
        <CodeBlock title="Before" code={rule.before} copy={false} />
        <CodeBlock title="After" code={rule.after} />
      </div>
    </DocsPage>
  )
}
