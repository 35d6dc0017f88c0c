import type { Metadata } from 'next'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { FactTable } from '@/components/docs/fact-table'
import { Caution } from '@/components/shell/caution'
import { TextLink } from '@/components/ui/text-link'
import { KINEMATIC_OPERATIONS } from '@/lib/contract/kinematic-operations'
import { siteUrl } from '@/lib/env'
import { findVisitor } from '@/lib/http/visit'
import { listTeams } from '@/lib/teams/list-teams'
import { firstAnswer } from './first-answer'

export const metadata: Metadata = { title: { absolute: 'Start here · Docs · Elbowroom' } }

const ASKED = KINEMATIC_OPERATIONS.forwardKinematics.example

/** The team in the examples: the reader's own, or the one of the demonstration. */
async function exampleTeam(): Promise<string> {
  const visitor = await findVisitor()
  const [team] = visitor === null ? [] : await listTeams(visitor.userId)
  return team?.slug ?? 'tarnholm'
}

export default async function StartPage() {
  const team = await exampleTeam()
  const revision = `${siteUrl()}/api/v1/teams/${team}/models/skerry-7/revisions/1`
  const call = (extra = '') => `curl -sS ${revision}/forward-kinematics \\
  -H "Authorization: Bearer $ELBOWROOM_KEY" \\
  -H "Content-Type: application/json" \\${extra}
  -d '${JSON.stringify(ASKED)}'`

  return (
    <DocsPage href="/docs" title="Start here" lead="From a key to a pose in one request, and what to read next.">
      <h2>1. Have a key made</h2>
      <p>
        An administrator of your team makes a key on the page <em>Keys</em>. For computing it needs the scope <code>compute</code>; for reading the
        register, <code>catalog:read</code>. The key is shown once. Keep it where your gateway or script can read it, and nobody else.
      </p>
      <CodeBlock title="Shell" code="export ELBOWROOM_KEY=elb_…" />

      <h2>2. Ask where the tool is</h2>
      <p>
        The address names the team, the model and the revision. The body names the units and gives one configuration: the joint values of Skerry 7, base
        to tip. Many configurations can be asked in one request; the answer has as many results, in the same order.
      </p>
      <CodeBlock title="Request" code={call()} />
      <CodeBlock title="Answer" code={await firstAnswer(ASKED.configurations[0])} copy={false} />
      <p>
        The answer says which description it was computed from and in which order the joints stand. A program should check both instead of assuming
        them.
      </p>

      <h2>3. Insist on the model</h2>
      <p>
        Write <code>released</code> in place of the number to use whatever revision is in force, and send the fingerprint that you have approved. If
        somebody releases another model, the service refuses with <code>412</code> and computes nothing: your program holds until a person has looked.
      </p>
      <CodeBlock title="Request with a pinned fingerprint" code={call(`\n  -H 'If-Match: "<fingerprint, 64 digits>"' \\`)} />

      <h2>4. The questions</h2>
      <FactTable
        caption="Kinematics operations"
        heads={['Ends in', 'Answers']}
        rows={Object.values(KINEMATIC_OPERATIONS).map((operation) => [
          <code key="path">{operation.path.replace(/.*\//, '/')}</code>,
          `${operation.summary}. ${operation.description}`,
        ])}
      />

      <h2>5. Before it drives anything</h2>
      <ul>
        <li>
          Read the{' '}
          <TextLink inline href="/docs/conventions">
            conventions
          </TextLink>
          : frames, twist order and units are where two programs most often misunderstand each other.
        </li>
        <li>
          Every failure is a problem with its own page: the{' '}
          <TextLink inline href="/docs/errors">
            errors
          </TextLink>
          . No answer within your deadline is treated like a hold.
        </li>
        <li>
          Try requests by hand in the{' '}
          <TextLink inline href="/docs/reference">
            API reference
          </TextLink>
          .
        </li>
      </ul>
      <Caution className="mt-6" />
    </DocsPage>
  )
}
