'use client'
import { useId, type ComponentProps } from 'react'
import { controlLook, Field, fieldAttributes, type FieldProps } from './field'

interface SelectFieldProps extends FieldProps, Omit<ComponentProps<'select'>, keyof FieldProps> {
  readonly options: readonly { readonly value: string; readonly label: string }[]
}

/** One of a few words: the browser's own list, which works with every keyboard and every glove. */
export function SelectField({ label, hint, error, className, id, options, ...rest }: SelectFieldProps) {
  const own = useId()
  const key = id ?? own
  return (
    <Field id={key} label={label} hint={hint} error={error} className={className}>
      <select {...rest} {...fieldAttributes(key, { hint, error })} className={controlLook(error, 'pr-6')}>
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </Field>
  )
}
