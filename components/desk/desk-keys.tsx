import { Mark } from '@/components/ui/marks'
import { Timestamp } from '@/components/ui/timestamp'
import { daysUntil } from './days-until'
import { DeskLine } from './desk-line'
import { DeskSection } from './desk-section'

interface DeskKeysProps {
  readonly team: string
  readonly keys: readonly { readonly id: string; readonly label: string; readonly expiresAt: string }[]
  /** ms since the epoch. */
  readonly now: number
}

/** Keys that stop soon, before a gateway notices. */
export function DeskKeys({ team, keys, now }: DeskKeysProps) {
  return (
    <DeskSection title="Keys that expire within 30 days" count={keys.length} empty="No key expires within 30 days.">
      {keys.map((key) => (
        <DeskLine
          key={key.id}
          href={`/teams/${team}/keys#${key.id}`}
          title={
            <>
              Renew <bdi>{key.label}</bdi>
            </>
          }
          aside={
            <span className="inline-flex items-center gap-1.5 font-semibold whitespace-nowrap text-amber">
              <Mark name="warning" />
              expires {daysUntil(key.expiresAt, now)}
            </span>
          }
        >
          It stops at <Timestamp at={key.expiresAt} />. Make another one, or move its date.
        </DeskLine>
      ))}
    </DeskSection>
  )
}
