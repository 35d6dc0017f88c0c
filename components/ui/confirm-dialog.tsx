'use client'
import { useState, type FormEvent, type ReactNode } from 'react'
import { Button } from './button'
import { Dialog, DialogClose } from './dialog'
import { TextField } from './text-field'

interface ConfirmDialogProps {
  readonly trigger: ReactNode
  readonly title: string
  /** What the act destroys or stops, and what it leaves. */
  readonly destroys: ReactNode
  /** What has to be typed, letter by letter. */
  readonly name: string
  /** The word on the button, such as "Revoke". */
  readonly action: string
  readonly busyLabel?: string
  /** Does it. A returned sentence says why it was not done and keeps the dialog open. */
  readonly onConfirm: () => Promise<string | void>
}

/** A destructive act: says what it destroys, and is confirmed by typing the name. */
export function ConfirmDialog({ trigger, title, destroys, name, action, busyLabel, onConfirm }: ConfirmDialogProps) {
  const [open, setOpen] = useState(false)
  const [typed, setTyped] = useState('')
  const [error, setError] = useState<string>()
  const [busy, setBusy] = useState(false)

  const change = (next: boolean) => {
    if (busy) return
    setOpen(next)
    setTyped('')
    setError(undefined)
  }
  const submit = async (event: FormEvent) => {
    event.preventDefault()
    if (busy) return
    if (typed.trim() !== name) {
      setError(`Type ${name} exactly as it stands there.`)
      return
    }
    setBusy(true)
    try {
      const refusal = await onConfirm()
      if (refusal) setError(refusal)
      else setOpen(false)
    } catch {
      setError('It was not done: the service did not answer. Try again.')
    } finally {
      setBusy(false)
    }
  }

  return (
    <Dialog title={title} description={destroys} trigger={trigger} open={open} onOpenChange={change}>
      <form onSubmit={submit} noValidate>
        <TextField
          label={`Type ${name} to confirm`}
          value={typed}
          error={error}
          autoComplete="off"
          spellCheck={false}
          onChange={(event) => {
            setTyped(event.target.value)
            setError(undefined)
          }}
        />
        <div className="mt-4 flex justify-end gap-3">
          <DialogClose>
            <Button>Keep it</Button>
          </DialogClose>
          <Button type="submit" variant="danger" busy={busy} busyLabel={busyLabel ?? `${action}…`}>
            {action}
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
