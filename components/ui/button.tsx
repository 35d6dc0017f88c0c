import type { ComponentProps, MouseEvent } from 'react'
import { buttonLook, type ButtonVariant } from './button-look'

interface ButtonProps extends ComponentProps<'button'> {
  readonly variant?: ButtonVariant
  /** While true the button keeps its place and its focus, says what is going on, and does nothing when pressed. */
  readonly busy?: boolean
  /** Said in place of the label while busy, such as "Storing…". */
  readonly busyLabel?: string
}

/** A button. It submits a form only when told so with type="submit". */
export function Button({ variant = 'plain', busy = false, busyLabel, className, children, onClick, type = 'button', ...rest }: ButtonProps) {
  const ignore = (event: MouseEvent<HTMLButtonElement>) => event.preventDefault()
  const handler = busy ? { onClick: ignore } : onClick === undefined ? {} : { onClick }
  return (
    <button {...rest} {...handler} type={type} className={buttonLook(variant, className)} aria-disabled={busy || undefined} aria-busy={busy || undefined}>
      {busyLabel === undefined ? (
        children
      ) : (
        <span className="grid [&>*]:[grid-area:1/1]">
          <span className={busy ? 'invisible' : undefined}>{children}</span>
          <span className={busy ? undefined : 'invisible'} aria-hidden={!busy}>
            {busyLabel}
          </span>
        </span>
      )}
    </button>
  )
}
