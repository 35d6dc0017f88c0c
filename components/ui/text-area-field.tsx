'use client'
import { useId, type ComponentProps } from 'react'
import { controlLook, Field, fieldAttributes, type FieldProps } from './field'

/** Several lines of text. */
export function TextAreaField({ label, hint, error, className, id, rows = 3, ...rest }: FieldProps & ComponentProps<'textarea'>) {
  const own = useId()
  const key = id ?? own
  return (
    <Field id={key} label={label} hint={hint} error={error} className={className}>
      <textarea rows={rows} {...rest} {...fieldAttributes(key, { hint, error })} className={controlLook(error, 'resize-y')} />
    </Field>
  )
}
