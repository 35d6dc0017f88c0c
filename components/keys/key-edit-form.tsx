'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm, useWatch } from 'react-hook-form'
import { toast } from 'sonner'
import type { Called } from '@/components/api/call'
import { call } from '@/components/api/call'
import { Refusal, sentenceOf } from '@/components/api/refusal'
import { DialogActs } from '@/components/ui/dialog-acts'
import { TextField } from '@/components/ui/text-field'
import { dayOf, expiryInstant } from './expiry-choice'
import { ExpiryFields } from './expiry-fields'
import { KeyEditFields } from './key-fields'

interface KeyEditFormProps {
  readonly team: string
  /** The key as it was read, with its ETag. */
  readonly read: Called<'getKey'>
  readonly onDone: () => void
}

/** Label and expiry of a key. Somebody else's change in between is shown before it is written over. */
export function KeyEditForm({ team, read, onDone }: KeyEditFormProps) {
  const [seen, setSeen] = useState(read)
  const [failure, setFailure] = useState<string>()
  const { id, label, expiresAt } = read.body
  const { register, handleSubmit, control, formState } = useForm({
    resolver: zodResolver(KeyEditFields),
    defaultValues: {
      label,
      preset: expiresAt === undefined ? ('never' as const) : ('date' as const),
      date: expiresAt === undefined ? '' : dayOf(new Date(expiresAt)),
    },
  })
  const { errors, isSubmitting, dirtyFields } = formState
  const preset = useWatch({ control, name: 'preset' })
  const path = { team, key: id }

  const submit = handleSubmit(async (form) => {
    setFailure(undefined)
    const movesExpiry = dirtyFields.preset === true || dirtyFields.date === true
    const body = { label: form.label, ...(movesExpiry ? { expiresAt: expiryInstant(form.preset, form.date) } : {}) }
    try {
      await call('editKey', { path, body, ifMatch: seen.etag ?? '' })
    } catch (error) {
      if (!(error instanceof Refusal) || error.code !== 'stale') return setFailure(sentenceOf(error))
      const now = await call('getKey', { path }).catch(() => null)
      if (now !== null) setSeen(now)
      const until = now?.body.expiresAt === undefined ? 'does not expire' : `expires ${dayOf(new Date(now.body.expiresAt))}`
      return setFailure(now === null ? sentenceOf(error) : `Somebody changed it meanwhile: it is now “${now.body.label}” and ${until}. Save again to write over that.`)
    }
    toast('The key is changed.')
    onDone()
  })

  return (
    <form onSubmit={submit} noValidate className="space-y-4">
      <TextField label="Label" error={errors.label?.message} autoComplete="off" {...register('label')} />
      <ExpiryFields preset={register('preset')} date={register('date')} chosen={preset} error={errors.date?.message} />
      <DialogActs failure={failure} label="Save" busy={isSubmitting} busyLabel="Saving…" />
    </form>
  )
}
