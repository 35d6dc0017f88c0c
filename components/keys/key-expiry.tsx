import type { ReactNode } from 'react'
import { daysUntil } from '@/components/desk/days-until'
import { Mark } from '@/components/ui/marks'
import { Timestamp } from '@/components/ui/timestamp'
import type { Key } from '@/lib/contract/key-operations'

const NOTICE_MS = 30 * 86_400_000

/** Whether a key works, and until when. One that expires within 30 days says so in amber. now: ms since the epoch. */
export function KeyExpiry({ item: { state, expiresAt, revokedAt }, now }: { readonly item: Key; readonly now: number }) {
  if (state === 'revoked') {
    return (
      <Line word="revoked" colour="text-verm" mark="withdrawn">
        {revokedAt === undefined ? null : <Timestamp at={revokedAt} />}
      </Line>
    )
  }
  if (expiresAt === undefined) return <Line word="active">does not expire</Line>
  if (state === 'expired') {
    return (
      <Line word="expired" colour="text-verm" mark="withdrawn">
        <Timestamp at={expiresAt} />
      </Line>
    )
  }
  const isSoon = new Date(expiresAt).getTime() - now < NOTICE_MS
  return (
    <Line word={isSoon ? `expires ${daysUntil(expiresAt, now)}` : 'active'} colour={isSoon ? 'text-amber' : undefined} mark={isSoon ? 'warning' : undefined}>
      {isSoon ? null : 'until '}
      <Timestamp at={expiresAt} />
    </Line>
  )
}

interface LineProps {
  readonly word: string
  readonly colour?: string | undefined
  readonly mark?: 'warning' | 'withdrawn' | undefined
  readonly children: ReactNode
}

const Line = ({ word, colour, mark, children }: LineProps) => (
  <>
    <span className={`flex items-center gap-1.5 font-semibold whitespace-nowrap ${colour ?? ''}`}>
      {mark === undefined ? null : <Mark name={mark} />}
      {word}
    </span>
    <span className="block whitespace-nowrap text-soft">{children}</span>
  </>
)
