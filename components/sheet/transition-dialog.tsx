'use client'

import '@/components/api/quiet-zod'
import { zodResolver } from '@hookform/resolvers/zod'
import { useRouter } from 'next/navigation'
import { useState, type ReactNode } from 'react'
import { useForm } from 'react-hook-form'
import { toast } from 'sonner'
import { z } from 'zod'
import { call } from '@/components/api/call'
import { sentenceOf } from '@/components/api/refusal'
import { Dialog } from '@/components/ui/dialog'
import { DialogActs } from '@/components/ui/dialog-acts'
import { TextAreaField } from '@/components/ui/text-area-field'
import { TextField } from '@/components/ui/text-field'
import { TransitionQuestion } from '@/lib/contract/model'
import { TRANSITION_LOOKS } from './transition-looks'
import type { TransitionTo } from './transition-looks'

interface TransitionDialogProps {
  readonly path: { readonly team: string; readonly model: string; readonly revision: number }
  readonly to: TransitionTo
  /** Has to be typed before the act; for what cannot be undone. */
  readonly confirmName?: string
  /** Said before the act, such as why it will be refused. */
  readonly caution?: string | undefined
  readonly trigger: ReactNode
}

/** Asks for a comment, says what follows, and changes the status of a revision. What was typed stays when it is refused. */
export function TransitionDialog({ path, to, confirmName, caution, trigger }: TransitionDialogProps) {
  const look = TRANSITION_LOOKS[to]
  const router = useRouter()
  const [open, setOpen] = useState(false)
  const [failure, setFailure] = useState<string>()
  const typed = confirmName === undefined ? z.string() : z.string().refine((text) => text.trim() === confirmName.trim(), `Type ${confirmName} exactly as it stands there.`)
  const { register, handleSubmit, formState, reset } = useForm({
    resolver: zodResolver(TransitionQuestion.pick({ comment: true }).extend({ typed })),
    defaultValues: { comment: '', typed: '' },
  })
  const { errors, isSubmitting } = formState

  const submit = handleSubmit(async ({ comment }) => {
    setFailure(undefined)
    try {
      await call('transitionRevision', { path, body: { to, ...(comment ? { comment } : {}) } })
    } catch (error) {
      return setFailure(sentenceOf(error))
    }
    toast(look.done)
    setOpen(false)
    reset()
    router.refresh()
  })
  const change = (next: boolean) => {
    if (isSubmitting) return
    setOpen(next)
    setFailure(undefined)
  }

  return (
    <Dialog title={look.title} description={look.effect} trigger={trigger} open={open} onOpenChange={change}>
      <form onSubmit={submit} noValidate className="space-y-4">
        {caution === undefined ? null : <p className="border-l-2 border-amber pl-3 font-medium text-amber">{caution}</p>}
        <TextAreaField label="Comment" hint="Stands in the history of the revision. May be empty." error={errors.comment?.message} {...register('comment')} />
        {confirmName === undefined ? null : (
          <TextField label={`Type ${confirmName} to confirm`} error={errors.typed?.message} autoComplete="off" spellCheck={false} {...register('typed')} />
        )}
        <DialogActs failure={failure} label={look.label} busy={isSubmitting} busyLabel={look.busy} variant={to === 'withdrawn' ? 'danger' : 'primary'} />
      </form>
    </Dialog>
  )
}
