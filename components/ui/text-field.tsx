'use client'
import { useId, type ComponentProps } from 'react'
import { controlLook, Field, fieldAttributes, type FieldProps } from './field'

/** One line of text. Takes what react-hook-form's register() gives: `<TextField label="Name" {...register('name')} />`. */
export function TextField({ label, hint, error, className, id, ...rest }: FieldProps & ComponentProps<'input'>) {
  const own = useId()
  const key = id ?? own
  return (
    <Field id={key} label={label} hint={hint} error={error} className={className}>
      <input {...rest} {...fieldAttributes(key, { hint, error })} className={controlLook(error)} />
    </Field>
  )
}
