import clsx from 'clsx'
import type { ReactNode } from 'react'

export interface FieldProps {
  readonly label: string
  /** What to type, before anything went wrong. */
  readonly hint?: ReactNode
  /** What is wrong and what to do; announced when it appears. */
  readonly error?: string | undefined
  readonly className?: string
}

/** The control's own attributes: what describes it and whether it is at fault. */
export function fieldAttributes(id: string, { hint, error }: Pick<FieldProps, 'hint' | 'error'>) {
  const described = [error ? `${id}-error` : '', hint ? `${id}-hint` : ''].filter(Boolean).join(' ')
  return { id, 'aria-invalid': error ? true : undefined, 'aria-describedby': described || undefined } as const
}

/** The look of a control that takes text: a line of secondary ink, vermilion when at fault. */
export const controlLook = (error: string | undefined, className?: string): string =>
  clsx(
    'block min-h-8 w-full rounded-control border bg-sheet px-2 py-1 text-13 text-ink pointer-coarse:min-h-11 pointer-coarse:text-[1rem]',
    error ? 'border-verm' : 'border-soft',
    className,
  )

/** Label, control, hint and error of one field. The error's place is always there, so that its text is announced. */
export function Field({ id, label, hint, error, className, children }: FieldProps & { readonly id: string; readonly children: ReactNode }) {
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block font-semibold">
        {label}
      </label>
      {children}
      <FieldError id={id} error={error} />
      {hint ? (
        <p id={`${id}-hint`} className="label mt-1">
          {hint}
        </p>
      ) : null}
    </div>
  )
}

/** The error of a field, in a region that speaks when it fills. */
export function FieldError({ id, error }: { readonly id: string; readonly error: string | undefined }) {
  return (
    <p id={`${id}-error`} aria-live="polite" className={clsx('font-medium text-verm first-letter:uppercase', error && 'mt-1')}>
      {error ?? ''}
    </p>
  )
}
