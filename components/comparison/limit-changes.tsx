import { Quantity } from '@/components/ui/quantity'
import { RowHead, Table, Td, Th } from '@/components/ui/table'
import type { LimitChange } from '@/lib/contract/comparison'
import { formatSignificant } from '@/components/ui/format-number'

/** Limits that differ: what a program that runs today may find closed tomorrow. */
export function LimitChanges({ limits }: { readonly limits: readonly LimitChange[] }) {
  return (
    <section aria-labelledby="comparison-limits">
      <h2 id="comparison-limits">Limits</h2>
      {limits.length === 0 ? (
        <p className="py-1.5 text-soft">No limit differs.</p>
      ) : (
        <Table caption="Limits that differ">
          <thead>
            <tr>
              <Th>Joint</Th>
              <Th>Limit</Th>
              <Th>Range</Th>
              <Th align="right">From</Th>
              <Th align="right">To</Th>
            </tr>
          </thead>
          <tbody>
            {limits.map(({ joint, limit, from, to, change, quantity }) => (
              <tr key={`${joint} ${limit}`}>
                <RowHead className="num break-words">
                  <bdi>{joint}</bdi>
                </RowHead>
                <Td>{limit}</Td>
                <Td className={change === 'narrowed' ? 'font-semibold text-amber' : undefined}>{change}</Td>
                {[from, to].map((value, i) => (
                  <Td key={i} align="right">
                    {value === null ? <span className="label">none</span> : quantity === undefined ? formatSignificant(value, 4) : <Quantity value={value} kind={quantity} withUnit />}
                  </Td>
                ))}
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </section>
  )
}
