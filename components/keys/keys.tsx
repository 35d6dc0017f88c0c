'use client'

import { useState } from 'react'
import { sentenceOf } from '@/components/api/refusal'
import { Notice } from '@/components/shell/notice'
import { Button } from '@/components/ui/button'
import { CheckboxField } from '@/components/ui/checkbox-field'
import { EmptyState } from '@/components/ui/empty-state'
import type { Key } from '@/lib/contract/key-operations'
import { KeysTable } from './keys-table'
import { useKeys } from './use-keys'

interface KeysProps {
  readonly team: string
  /** What the server read; undefined when there are more than one page. */
  readonly initial: readonly Key[] | undefined
  /** ms since the epoch, so that the server and the browser count the same days. */
  readonly now: number
}

/** The team's keys: those that work first; what was revoked or has run out on demand. */
export function Keys({ team, initial, now }: KeysProps) {
  const { data: keys = [], error, refetch, isPending } = useKeys(team, initial)
  const [showsEnded, setShowsEnded] = useState(false)
  const ended = keys.filter((key) => key.state !== 'active').length
  const shown = showsEnded ? keys : keys.filter((key) => key.state === 'active')
  return (
    <div className="space-y-4">
      {error === null ? null : (
        <Notice title="The keys could not be read" tone="error" actions={<Button onClick={() => void refetch()}>Try again</Button>}>
          {sentenceOf(error)} What stands here may be out of date.
        </Notice>
      )}
      {ended === 0 ? null : (
        <CheckboxField
          label={`Show the ${ended === 1 ? 'one that has' : `${ended} that have`} ended`}
          hint="Revoked or expired; kept so that a prefix in a log can be told."
          checked={showsEnded}
          onChange={(event) => setShowsEnded(event.target.checked)}
        />
      )}
      {shown.length > 0 ? (
        <KeysTable team={team} keys={shown} now={now} />
      ) : isPending ? null : (
        <EmptyState title={keys.length === 0 ? 'No key yet' : 'No key works now'}>
          A gateway or a script calls the service with a key. Make one with “New key”: give it a label, the scopes it needs and a date on which it ends.
        </EmptyState>
      )}
    </div>
  )
}
