import type { Metadata } from 'next'
import { CodeBlock } from '@/components/docs/code-block'
import { DocsPage } from '@/components/docs/docs-page'
import { ProblemList } from '@/components/docs/problem-list'

export const metadata: Metadata = { title: 'Errors' }

const EXAMPLE = `HTTP/1.1 422 Unprocessable Content
Content-Type: application/problem+json

{
  "type": "/docs/problems/length-mismatch",
  "title": "Lengths do not match",
  "status": 422,
  "detail": "Each configuration needs 7 values, one for each joint of the chain.",
  "instance": "/api/v1/teams/tarnholm/models/skerry-7/revisions/1/jacobian",
  "requestId": "…",
  "errors": [{ "pointer": "#/configurations/0", "detail": "…" }]
}`

export default function ErrorsPage() {
  return (
    <DocsPage href="/docs/errors" title="Errors" lead="Every failure says what is wrong, where, and what to do about it.">
      <p>
        A failure is answered as <code>application/problem+json</code> (RFC 9457). <code>type</code> is the address of a page below and never changes its
        meaning; let your program decide by it. <code>detail</code> is a sentence for a person and may be reworded. <code>errors</code> points at each
        fault with a JSON Pointer into the body. <code>requestId</code> finds the request in the log of the service; send your own in{' '}
        <code>X-Request-Id</code> if you like.
      </p>
      <CodeBlock title="A problem" code={EXAMPLE} copy={false} />
      <p>
        <code>400</code> means that the body could not be parsed, <code>422</code> that it was parsed and is wrong. Something of another team answers{' '}
        <code>404</code>, exactly as if it had never existed. A hard pose is no error: it is answered with <code>200</code> and a diagnosis. A gateway
        treats every failure, and every answer that is late, as a hold.
      </p>
      <h2>All problems</h2>
      <ProblemList />
    </DocsPage>
  )
}
