'use client'

import { zodResolver } from '@hookform/resolvers/zod'
import { useState } from 'react'
import { useForm, useWatch } from 'react-hook-form'
import type { Answer } from '@/components/api/ask'
import { call } from '@/components/api/call'
import { fieldOf, Refusal, sentenceOf } from '@/components/api/refusal'
import { DialogActs } from '@/components/ui/dialog-acts'
import { TextField } from '@/components/ui/text-field'
import type { Scope } from '@/lib/contract/key-operations'
import { expiryInstant } from './expiry-choice'
import { ExpiryFields } from './expiry-fields'
import { NewKeyFields } from './key-fields'
import { ScopeFields } from './scope-fields'

interface NewKeyFormProps {
  readonly team: string
  readonly onMade: (key: Answer<'createKey'>) => void
}

const USUAL_SCOPES: Scope[] = ['compute']

/** Label, scopes and expiry of a key to be made. */
export function NewKeyForm({ team, onMade }: NewKeyFormProps) {
  const [failure, setFailure] = useState<string>()
  const { register, handleSubmit, control, setError, formState } = useForm({
    resolver: zodResolver(NewKeyFields),
    defaultValues: { label: '', scopes: USUAL_SCOPES, preset: '365' as const, date: '' },
  })
  const { errors, isSubmitting } = formState
  const preset = useWatch({ control, name: 'preset' })

  const submit = handleSubmit(async ({ label, scopes, preset: chosen, date }) => {
    setFailure(undefined)
    const expiresAt = expiryInstant(chosen, date) ?? undefined
    try {
      onMade((await call('createKey', { path: { team }, body: { label, scopes, expiresAt } })).body)
    } catch (error) {
      const faults = error instanceof Refusal ? error.faults : []
      const place = { label: 'label', scopes: 'scopes', expiresAt: 'date' } as const
      for (const fault of faults) {
        const field = place[fieldOf(fault) as keyof typeof place]
        if (field !== undefined) setError(field, { message: fault.detail }, { shouldFocus: true })
      }
      setFailure(sentenceOf(error))
    }
  })

  return (
    <form onSubmit={submit} noValidate className="space-y-4">
      <TextField label="Label" hint="Where it is used, such as Cell 4 gateway." error={errors.label?.message} autoComplete="off" {...register('label')} />
      <ScopeFields field={register('scopes')} error={errors.scopes?.message} />
      <ExpiryFields preset={register('preset')} date={register('date')} chosen={preset} error={errors.date?.message} />
      <DialogActs failure={failure} label="Make the key" busy={isSubmitting} busyLabel="Making…" />
    </form>
  )
}
