'use client'

import type { UseFormRegisterReturn } from 'react-hook-form'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { dayOf, EXPIRY_PRESETS } from './expiry-choice'

interface ExpiryFieldsProps {
  readonly preset: UseFormRegisterReturn
  readonly date: UseFormRegisterReturn
  /** What is chosen now. */
  readonly chosen: string
  readonly error: string | undefined
}

/** When a key stops: one of a few spans, a date, or never. */
export function ExpiryFields({ preset, date, chosen, error }: ExpiryFieldsProps) {
  return (
    <div className="grid gap-x-4 gap-y-3 tablet:grid-cols-2">
      <SelectField
        label="Expires"
        options={EXPIRY_PRESETS}
        hint={chosen === 'never' ? 'A key without an end is found by nobody when it leaks.' : undefined}
        {...preset}
      />
      <div hidden={chosen !== 'date'}>
        <TextField label="On" type="date" min={dayOf(new Date())} hint="It stops at the end of that day." error={error} {...date} />
      </div>
    </div>
  )
}
