import { RowHead, Table, Td, Th } from '@/components/ui/table'
import type { Change, Comparison } from '@/lib/contract/comparison'
import { ChangeValue } from './change-value'
import { EffectQuantity } from './effect-quantity'

/** How a change is put into words. */
const WORDS: Partial<Record<Change['what'], string>> = {
  mimic: 'follows',
  name: 'name of the robot',
  version: 'URDF version',
  root: 'root link',
}

function wordsOf({ what, distance, angle }: Change): string {
  if (what !== 'origin') return WORDS[what] ?? what
  const parts = [...(distance === 0 ? [] : ['x, y, z']), ...(angle === 0 ? [] : ['roll, pitch, yaw'])]
  return `origin ${parts.join(' and ')}`.trim()
}

/** Every other difference between the two descriptions, element by element. */
export function ChangeTable({ comparison: { changes, leftOut } }: { readonly comparison: Pick<Comparison, 'changes' | 'leftOut'> }) {
  return (
    <section aria-labelledby="comparison-changes">
      <h2 id="comparison-changes">Elements</h2>
      {changes.length === 0 ? (
        <p className="py-1.5 text-soft">Nothing else differs.</p>
      ) : (
        <Table caption="Elements that differ">
          <thead>
            <tr>
              <Th>Element</Th>
              <Th>What</Th>
              <Th align="right">By</Th>
              <Th align="right">From</Th>
              <Th align="right">To</Th>
            </tr>
          </thead>
          <tbody>
            {changes.map((change, i) => (
              <tr key={i}>
                <RowHead className="num min-w-32 break-words">
                  <bdi>{change.element}</bdi>
                </RowHead>
                <Td className="min-w-28">{wordsOf(change)}</Td>
                <Td align="right">
                  <span className="flex flex-col items-end">
                    {change.distance === undefined || change.distance === 0 ? null : <EffectQuantity value={change.distance} kind="length" />}
                    {change.angle === undefined || change.angle === 0 ? null : <EffectQuantity value={change.angle} kind="angle" />}
                  </span>
                </Td>
                <Td className="text-right">
                  <ChangeValue change={change} side="from" />
                </Td>
                <Td className="text-right">
                  <ChangeValue change={change} side="to" />
                </Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {leftOut === undefined ? null : <p className="label mt-1">{leftOut} further differences are not listed.</p>}
    </section>
  )
}
