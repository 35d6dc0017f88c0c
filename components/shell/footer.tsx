import { TextLink } from '@/components/ui/text-link'

const LINKS = [
  { href: '/docs', label: 'Docs' },
  { href: '/docs/reference', label: 'API reference' },
  { href: '/docs/cautions', label: 'Cautions' },
] as const

/** The line at the foot of every page. */
export function Footer() {
  return (
    <footer data-screen-only className="mt-auto border-t border-hair px-4 py-4 desk:px-6">
      <div className="flex flex-wrap items-center gap-x-6 gap-y-2">
        <span className="label">Elbowroom. One description in force, and the numbers that follow from exactly that one.</span>
        <span className="grow" />
        {LINKS.map((link) => (
          <TextLink key={link.href} href={link.href} className="label inline-flex min-h-6 min-w-6 items-center text-blue pointer-coarse:min-h-11">
            {link.label}
          </TextLink>
        ))}
      </div>
    </footer>
  )
}
