'use client'
import clsx from 'clsx'
import { useId, type ComponentProps } from 'react'
import { FieldError, fieldAttributes, type FieldProps } from './field'

/** Yes or no, with its label on the right. */
export function CheckboxField({ label, hint, error, className, id, ...rest }: FieldProps & ComponentProps<'input'>) {
  const own = useId()
  const key = id ?? own
  return (
    <div className={clsx('grid grid-cols-[auto_1fr] gap-x-2', className)}>
      <input type="checkbox" {...rest} {...fieldAttributes(key, { hint, error })} className="mt-0.5 size-4 accent-blue pointer-coarse:size-6" />
      <label htmlFor={key} className="font-semibold pointer-coarse:pt-0.5">
        {label}
      </label>
      <div className="col-start-2">
        {hint ? (
          <p id={`${key}-hint`} className="label">
            {hint}
          </p>
        ) : null}
        <FieldError id={key} error={error} />
      </div>
    </div>
  )
}
