import { Quantity } from '@/components/ui/quantity'
import { RowHead, Table, Td, Th } from '@/components/ui/table'
import { TextLink } from '@/components/ui/text-link'
import type { Comparison } from '@/lib/contract/comparison'

/** Addresses of the two sheets, drawn at one configuration. */
export interface Opened {
  readonly from: string
  readonly to: string
}

interface WorstConfigurationsProps {
  readonly comparison: Comparison
  readonly moves: Opened | null
  readonly turns: Opened | null
}

/** Where the tip moves and turns most: the joint values, and the way to both sheets drawn there. */
export function WorstConfigurations({ comparison: { from, to, chain, effect }, moves, turns }: WorstConfigurationsProps) {
  const columns = [
    { head: 'moves most', opened: moves, q: effect.translation.worst },
    { head: 'turns most', opened: turns, q: effect.rotation.worst },
  ].flatMap(({ head, opened, q }) => (opened === null || q === undefined ? [] : [{ head, opened, q }]))
  if (columns.length === 0) return null
  return (
    <section aria-labelledby="comparison-worst">
      <h2 id="comparison-worst">Worst configuration</h2>
      <Table caption="Worst configuration">
        <thead>
          <tr>
            <Th>Joint</Th>
            {columns.map(({ head }) => (
              <Th key={head} align="right">
                Where it {head}
              </Th>
            ))}
          </tr>
        </thead>
        <tbody>
          {chain.joints.map((joint, i) => (
            <tr key={joint}>
              <RowHead className="num break-words">
                <bdi>{joint}</bdi>
              </RowHead>
              {columns.map(({ head, q }) => (
                <Td key={head} align="right">
                  <Quantity value={q[i]} kind={chain.types[i] === 'prismatic' ? 'length' : 'angle'} withUnit />
                </Td>
              ))}
            </tr>
          ))}
          <tr data-screen-only>
            <RowHead>Open the sheet there</RowHead>
            {columns.map(({ head, opened }) => (
              <Td key={head} className="text-right">
                <span className="inline-flex flex-wrap justify-end gap-x-4">
                  {([['from', from], ['to', to]] as const).map(([side, { revision }]) => (
                    <TextLink key={side} href={opened[side]} aria-label={`Revision ${revision} where it ${head}`} className="py-1 whitespace-nowrap">
                      revision {revision}
                    </TextLink>
                  ))}
                </span>
              </Td>
            ))}
          </tr>
        </tbody>
      </Table>
    </section>
  )
}
