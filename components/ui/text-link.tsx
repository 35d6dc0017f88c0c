import clsx from 'clsx'
import Link from 'next/link'
import type { ComponentProps } from 'react'

/** A link. inline: inside running text, where colour alone would not set it apart. */
export function TextLink({ inline = false, className, ...rest }: ComponentProps<typeof Link> & { readonly inline?: boolean }) {
  return <Link {...rest} className={clsx(inline ? 'link-inline' : 'link', className)} />
}
