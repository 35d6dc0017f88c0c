import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { TextLink } from '@/components/ui/text-link'
import { PROBLEMS } from '@/lib/errors'

/** Every problem of the one table, in its order. */
export function ProblemList() {
  return (
    <div className="wide mt-3">
      <Table caption="Problems" className="mt-0 text-13 leading-5">
        <thead>
          <tr>
            <Th align="right" className="w-16">Status</Th>
            <Th className="w-60">Problem</Th>
            <Th>What it says</Th>
          </tr>
        </thead>
        <tbody>
          {Object.entries(PROBLEMS).map(([slug, problem]) => (
            <tr key={slug}>
              <Td align="right">{problem.status}</Td>
              <RowHead>
                <TextLink href={`/docs/problems/${slug}`} className="num whitespace-nowrap">
                  {slug}
                </TextLink>
              </RowHead>
              <Td>{problem.title}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  )
}
