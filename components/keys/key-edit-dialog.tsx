'use client'

import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { Called } from '@/components/api/call'
import { call } from '@/components/api/call'
import { sentenceOf } from '@/components/api/refusal'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { Skeleton } from '@/components/ui/skeleton'
import type { Key } from '@/lib/contract/key-operations'
import { KeyEditForm } from './key-edit-form'
import { keysQueryKey } from './use-keys'

/** Changes label or expiry of a key, from the state that it has now. */
export function KeyEditDialog({ team, item }: { readonly team: string; readonly item: Key }) {
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [read, setRead] = useState<Called<'getKey'> | null>(null)
  const [failure, setFailure] = useState<string>()

  const change = (next: boolean) => {
    setOpen(next)
    setRead(null)
    setFailure(undefined)
    if (!next) return
    call('getKey', { path: { team, key: item.id } }).then(setRead, (error: unknown) => setFailure(sentenceOf(error)))
  }
  return (
    <Dialog
      title={`Edit “${item.label}”`}
      description="The key itself and its scopes stay as they are."
      open={open}
      onOpenChange={change}
      trigger={
        <Button>
          Edit<span className="sr-only"> {item.label}</span>
        </Button>
      }
    >
      <p role="alert" className="font-medium text-verm empty:hidden">
        {failure}
      </p>
      {read === null ? (
        <Skeleton className="h-40 w-full" />
      ) : (
        <KeyEditForm
          team={team}
          read={read}
          onDone={() => {
            setOpen(false)
            void client.invalidateQueries({ queryKey: keysQueryKey(team) })
          }}
        />
      )}
    </Dialog>
  )
}
