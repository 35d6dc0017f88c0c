import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { BackLink } from '@/components/docs/back-link'
import { DocsPage } from '@/components/docs/docs-page'
import { PROBLEMS, type ProblemCode } from '@/lib/errors'

interface ProblemPageProps {
  readonly params: Promise<{ slug: string }>
}

const isProblem = (slug: string): slug is ProblemCode => Object.hasOwn(PROBLEMS, slug)

export async function generateMetadata({ params }: ProblemPageProps): Promise<Metadata> {
  const { slug } = await params
  return { title: isProblem(slug) ? PROBLEMS[slug].title : 'No such problem' }
}

export default async function ProblemPage({ params }: ProblemPageProps) {
  const { slug } = await params
  if (!isProblem(slug)) notFound()
  const problem = PROBLEMS[slug]
  return (
    <DocsPage
      title={problem.title}
      above={<BackLink href="/docs/errors" label="Errors" />}
      lead={
        <>
          Status <span className="num">{problem.status}</span>, type <span className="num">/docs/problems/{slug}</span>
        </>
      }
    >
      <h2>What has happened</h2>
      <p>{problem.meaning}</p>
      <h2>What to do</h2>
      <p>{problem.remedy}</p>
    </DocsPage>
  )
}
