'use client'

import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { Answer } from '@/components/api/ask'
import { Button } from '@/components/ui/button'
import { Dialog } from '@/components/ui/dialog'
import { firstRequest } from './first-request'
import type { TrialModel } from './first-request'
import { NewKeyForm } from './new-key-form'
import { ShownKey } from './shown-key'
import { keysQueryKey } from './use-keys'

interface NewKeyDialogProps {
  readonly team: string
  readonly site: string
  readonly trialModel: TrialModel | null
}

/** Makes a key and shows it once. While it is shown, only the button closes the dialog: a slip would lose the key. */
export function NewKeyDialog({ team, site, trialModel }: NewKeyDialogProps) {
  const client = useQueryClient()
  const [open, setOpen] = useState(false)
  const [made, setMade] = useState<Answer<'createKey'> | null>(null)
  const close = () => {
    setOpen(false)
    setMade(null)
  }
  return (
    <Dialog
      title={made === null ? 'New key' : `Key “${made.label}” is made`}
      description={made === null ? 'For a gateway or a script; it belongs to this team and acts within its scopes.' : undefined}
      open={open}
      onOpenChange={(next) => {
        if (made === null) setOpen(next)
      }}
      trigger={<Button variant="primary">New key</Button>}
    >
      {made === null ? (
        <NewKeyForm
          team={team}
          onMade={(key) => {
            setMade(key)
            void client.invalidateQueries({ queryKey: keysQueryKey(team) })
          }}
        />
      ) : (
        <ShownKey text={made.key} request={firstRequest({ site, team, key: made.key, scopes: made.scopes, model: trialModel })} onKept={close} />
      )}
    </Dialog>
  )
}
