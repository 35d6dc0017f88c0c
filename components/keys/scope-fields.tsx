'use client'

import { useId } from 'react'
import type { UseFormRegisterReturn } from 'react-hook-form'
import { CheckboxField } from '@/components/ui/checkbox-field'
import { FieldError } from '@/components/ui/field'
import { SCOPES } from '@/lib/contract/key-operations'
import { SCOPE_SENTENCES } from './scope-sentences'

/** What the key may do, a sentence for each scope. */
export function ScopeFields({ field, error }: { readonly field: UseFormRegisterReturn; readonly error: string | undefined }) {
  const id = useId()
  return (
    <fieldset aria-describedby={`${id}-error`}>
      <legend className="mb-1 font-semibold">It may</legend>
      <div className="space-y-2">
        {SCOPES.map((scope) => (
          <CheckboxField key={scope} label={scope} hint={SCOPE_SENTENCES[scope]} value={scope} {...field} />
        ))}
      </div>
      <FieldError id={id} error={error} />
    </fieldset>
  )
}
