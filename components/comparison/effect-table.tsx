import { RowHead, Table, Td, Th } from '@/components/ui/table'
import type { Comparison } from '@/lib/contract/comparison'
import { EffectQuantity } from './effect-quantity'

const MEASURES = [
  { key: 'max', head: 'Largest' },
  { key: 'p95', head: '95 % are within' },
  { key: 'mean', head: 'Mean' },
] as const

const ROWS = [
  { key: 'translation', name: 'Moves', kind: 'length' },
  { key: 'rotation', name: 'Turns', kind: 'angle' },
] as const

/** What happens at the tip, over all configurations compared. */
export function EffectTable({ effect }: { readonly effect: Comparison['effect'] }) {
  return (
    <Table caption="Effect at the tip">
      <thead>
        <tr>
          <Th>The tip</Th>
          {MEASURES.map(({ key, head }) => (
            <Th key={key} align="right">
              {head}
            </Th>
          ))}
        </tr>
      </thead>
      <tbody>
        {ROWS.map(({ key, name, kind }) => (
          <tr key={key}>
            <RowHead>{name}</RowHead>
            {MEASURES.map((measure) => (
              <Td key={measure.key} align="right">
                <EffectQuantity value={effect[key][measure.key]} kind={kind} />
              </Td>
            ))}
          </tr>
        ))}
      </tbody>
    </Table>
  )
}
