'use client'

import { useQueryClient } from '@tanstack/react-query'
import { toast } from 'sonner'
import { call } from '@/components/api/call'
import { sentenceOf } from '@/components/api/refusal'
import { Button } from '@/components/ui/button'
import { ConfirmDialog } from '@/components/ui/confirm-dialog'
import type { Key } from '@/lib/contract/key-operations'
import { keysQueryKey } from './use-keys'

/** Revokes a key: says what stops, and is confirmed by typing its label. */
export function KeyRevokeDialog({ team, item }: { readonly team: string; readonly item: Key }) {
  const client = useQueryClient()
  const revoke = async () => {
    try {
      await call('revokeKey', { path: { team, key: item.id } })
    } catch (error) {
      return sentenceOf(error)
    }
    toast(`The key “${item.label}” is revoked.`)
    await client.invalidateQueries({ queryKey: keysQueryKey(team) })
  }
  return (
    <ConfirmDialog
      title={`Revoke “${item.label}”`}
      destroys={
        <>
          Every gateway and script that uses <code>{item.prefix}…</code> is refused from now on and has to hold. {lastUse(item)} A revoked key cannot be
          brought back.
        </>
      }
      name={item.label}
      action="Revoke"
      busyLabel="Revoking…"
      onConfirm={revoke}
      trigger={
        <Button variant="danger">
          Revoke<span className="sr-only"> {item.label}</span>
        </Button>
      }
    />
  )
}

const lastUse = ({ lastUsedAt }: Key): string =>
  lastUsedAt === undefined ? 'It was never used.' : `It was last used at ${lastUsedAt.slice(0, 16).replace('T', ' ')} UTC.`
