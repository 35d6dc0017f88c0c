import { TextLink } from '@/components/ui/text-link'

/** The way from one entry back to its list. */
export function BackLink({ href, label }: { readonly href: string; readonly label: string }) {
  return (
    <p data-screen-only className="mb-1">
      <TextLink href={href}>
        <span aria-hidden>← </span>
        {label}
      </TextLink>
    </p>
  )
}
