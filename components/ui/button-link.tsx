import Link from 'next/link'
import type { ComponentProps } from 'react'
import { buttonLook, type ButtonVariant } from './button-look'

/** A link that leads to the next step and is drawn as a button. */
export function ButtonLink({ variant = 'plain', className, ...rest }: ComponentProps<typeof Link> & { readonly variant?: ButtonVariant }) {
  return <Link {...rest} className={buttonLook(variant, className)} />
}
