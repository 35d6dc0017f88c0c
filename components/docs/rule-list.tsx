import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { TextLink } from '@/components/ui/text-link'

export interface ListedRule {
  readonly slug: string
  readonly title: string
}

/** Rules of the importer, of one severity. */
export function RuleList({ rules, caption }: { readonly rules: readonly ListedRule[]; readonly caption: string }) {
  return (
    <div className="wide mt-3">
      <Table caption={caption} className="mt-0 text-13 leading-5">
        <thead>
          <tr>
            <Th className="w-60">Rule</Th>
            <Th>What it says</Th>
          </tr>
        </thead>
        <tbody>
          {rules.map((rule) => (
            <tr key={rule.slug}>
              <RowHead>
                <TextLink href={`/docs/findings/${rule.slug}`} className="num whitespace-nowrap">
                  {rule.slug}
                </TextLink>
              </RowHead>
              <Td>{rule.title}</Td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  )
}
