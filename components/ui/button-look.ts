import clsx from 'clsx'

export type ButtonVariant = 'plain' | 'primary' | 'danger' | 'quiet'

const LOOKS: Record<ButtonVariant, string> = {
  plain: 'border-ink bg-transparent text-ink hover:bg-wash',
  primary: 'border-blue bg-blue text-sheet hover:underline underline-offset-3',
  danger: 'border-verm bg-transparent text-verm hover:bg-wash',
  quiet: 'border-transparent bg-transparent text-blue hover:underline underline-offset-3 px-1',
}

/** The classes of everything that looks like a button, so that a link and a button are drawn alike. */
export function buttonLook(variant: ButtonVariant, className?: string): string {
  return clsx(
    'inline-flex min-h-8 items-center justify-center gap-2 rounded-control border px-3 py-1 text-13 font-semibold whitespace-nowrap',
    'no-underline pointer-coarse:min-h-11 disabled:border-hair disabled:bg-transparent disabled:text-soft disabled:no-underline',
    LOOKS[variant],
    className,
  )
}
